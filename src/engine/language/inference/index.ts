export { describe, isPressure, isTemperature, levelWords } from './describe';
export { Inference } from './infer';
export { unknownName } from './names';
export { nearest } from './nearest';
export type { Inferred, LevelCount, Lookup, Reach } from './types';
