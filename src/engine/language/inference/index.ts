export { describe, Inference, nearest } from './infer';
export type { Inferred, LevelCount, Lookup } from './types';
