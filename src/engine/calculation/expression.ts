import type { Diagnostic } from '../errors/diagnostic';
import { compile, run, type Plan } from '../evaluation/index';
import { Inference, type Inferred } from '../language/inference';
import {
  partsOf,
  substitutedLatex,
  ungrouped,
  usesOf,
  type Expression,
  type MemberNode,
  type NameNode,
} from '../language/index';
import { constants, type Symbol } from './symbols';
import type { Surroundings } from './node';
import { isTemperatureLevel, present, valueLatex } from './present';

export interface ExpressionOutcome {
  type?: Inferred | undefined;
  /** SI value, conditions as 1 and 0. */
  value?: number | undefined;
  diagnostics: Diagnostic[];
  /** Names without a value. */
  waitsFor: string[];
  substitution?: string | undefined;
}

export const keyOf = (use: NameNode | MemberNode): string =>
  use.type === 'name' ? use.name : `${use.object}.${use.property}`;
export const baseOf = (use: NameNode | MemberNode): string => (use.type === 'name' ? use.name : use.object);

/** Names on which an expression depends, each once; built-in constants among them. */
export function dependenciesOf(expression: Expression): string[] {
  return [...new Set(usesOf(expression).map(baseOf))];
}

function find(surroundings: Surroundings, key: string): Symbol | undefined {
  return surroundings.symbol(key) ?? constants.get(key);
}

const plans = new WeakMap<Expression, { ambient: number; plan: Plan }>();

function planOf(expression: Expression, ambient: number): Plan {
  const kept = plans.get(expression);
  if (kept?.ambient === ambient) return kept.plan;
  const plan = compile(expression, ambient);
  plans.set(expression, { ambient, plan });
  return plan;
}

/** Infers, then evaluates one expression in the sheet's names. Never throws on what was typed. */
export function evaluateExpression(expression: Expression, surroundings: Surroundings): ExpressionOutcome {
  const diagnostics: Diagnostic[] = [];
  const uses = usesOf(expression);
  const waitsFor = [...new Set(uses.filter((use) => isWaiting(use, surroundings)).map(keyOf))];
  const inference = new Inference(
    (name, property) => lookUp(name, property, surroundings),
    (diagnostic) => diagnostics.push(diagnostic),
    surroundings.namesInReach,
  );
  const inferred = inference.infer(expression);
  const type = inferred === undefined ? undefined : inference.finish(inferred, expression.span);
  const failed = type === undefined || diagnostics.some((diagnostic) => diagnostic.severity === 'error');
  if (failed || waitsFor.length > 0) return { type, diagnostics, waitsFor };

  const plan = planOf(expression, surroundings.settings.ambientPressure);
  const inputs = plan.inputs.map((key) => find(surroundings, key)?.value ?? NaN);
  const evaluated = run(plan, inputs);
  if (!evaluated.ok) {
    const { code, message, span } = evaluated.failure;
    diagnostics.push({ code, severity: 'error', message, span });
    return { type, diagnostics, waitsFor };
  }
  const substitution = uses.length === 0 ? undefined : substituted(expression, surroundings);
  return { type, value: evaluated.value, diagnostics, waitsFor, substitution };
}

/**
 * Names that stand as a factor or under a power: a temperature level counts from absolute zero there,
 * and its figure stands in kelvin.
 */
function factorsOf(expression: Expression): (NameNode | MemberNode)[] {
  const parts = partsOf(expression);
  const multiplies = expression.type === 'binary' && ['*', '/', '^'].includes(expression.operator);
  const own = multiplies ? parts.map(ungrouped).filter((part) => part.type === 'name' || part.type === 'member') : [];
  return [...own, ...parts.flatMap(factorsOf)];
}

function substituted(expression: Expression, surroundings: Surroundings): string {
  const factors = new Set(factorsOf(expression));
  return substitutedLatex(expression, (use) => {
    const symbol = find(surroundings, keyOf(use));
    if (
      symbol?.type === undefined ||
      symbol.value === undefined ||
      !factors.has(use) ||
      !isTemperatureLevel(symbol.type)
    )
      return symbol?.shown;
    return valueLatex(present(symbol.value, { ...symbol.type, levels: 'any' }, surroundings.settings));
  });
}

function isWaiting(use: NameNode | MemberNode, surroundings: Surroundings): boolean {
  const symbol = find(surroundings, keyOf(use));
  if (symbol !== undefined) return symbol.value === undefined;
  return (
    use.type === 'member' && surroundings.isObject(use.object) && surroundings.symbol(use.object)?.value === undefined
  );
}

function lookUp(
  name: string,
  property: string | undefined,
  surroundings: Surroundings,
): Inferred | 'failed' | 'unknown' {
  const symbol = find(surroundings, property === undefined ? name : `${name}.${property}`);
  if (symbol !== undefined) return symbol.type ?? 'failed';
  // A fluid state or relation that has no result yet: what it would offer is not an unknown name.
  if (property !== undefined && surroundings.isObject(name) && surroundings.symbol(name) !== undefined) return 'failed';
  return 'unknown';
}
