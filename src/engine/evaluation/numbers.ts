import type { Expression } from '../language/tree';
import { compile } from './compile';
import type { Plan } from './plan';
import { run, type Evaluated } from './run';

const plans = new WeakMap<Expression, Plan>();

/** Universal constants that formulas on plain numbers may use by name, in SI. */
const constants: ReadonlyMap<string, number> = new Map([['pi', Math.PI]]);

/**
 * Evaluates an expression on plain numbers, as relation formulas and their conditions are written.
 * Conditions answer 1 or 0. A symbol that is not in `values` is a failure that names it.
 */
export function evaluateNumbers(expression: Expression, values: ReadonlyMap<string, number>): Evaluated {
  let plan = plans.get(expression);
  if (plan === undefined) {
    plan = compile(expression, 0);
    plans.set(expression, plan);
  }
  const inputs = new Float64Array(plan.inputs.length);
  for (const [index, name] of plan.inputs.entries()) {
    const value = values.get(name) ?? constants.get(name);
    if (value === undefined)
      return { ok: false, failure: { kind: 'not given', node: expression, values: [], reason: name } };
    inputs[index] = value;
  }
  return run(plan, inputs);
}
