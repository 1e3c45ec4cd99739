export { compile } from './compile';
export { failureDiagnostic, type Failure, type Show } from './failure';
export { evaluateNumbers } from './numbers';
export type { Plan } from './plan';
export { run, wholePower, type Evaluated } from './run';
