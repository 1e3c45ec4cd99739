export { evaluateNumbers } from './numbers';
export { compile, type Plan } from './plan';
export { run, wholePower, type Evaluated, type Failure } from './run';
