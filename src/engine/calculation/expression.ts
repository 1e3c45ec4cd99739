import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { compile, failureDiagnostic, run, type Failure, type Plan } from '../evaluation/index';
import { Inference, isPressure, type Inferred, type Lookup, type Reach } from '../language/inference';
import {
  partsOf,
  substitutedLatex,
  ungrouped,
  usesOf,
  type Expression,
  type MemberNode,
  type NameNode,
} from '../language/index';
import { resolveUnit } from '../units/index';
import type { Surroundings } from './node';
import { isTemperatureLevel, present, valueLatex, valueText } from './present';

export interface ExpressionOutcome {
  type?: Inferred | undefined;
  /** SI value, conditions as 1 and 0. */
  value?: number | undefined;
  diagnostics: Diagnostic[];
  /** Names without a value. */
  waitsFor: string[];
  substitution?: string | undefined;
}

/** A name as it is written: `Q`, `w.rho`. */
export function keyOf(use: NameNode | MemberNode): string {
  return use.type === 'name' ? use.name : `${use.object}.${use.property}`;
}

/** All that expressions use, each once: as written, and the names in front of the points. */
export function keysOf(expressions: Iterable<Expression | undefined>): { keys: string[]; uses: string[] } {
  const keys = new Set<string>();
  const uses = new Set<string>();
  for (const expression of expressions) {
    if (expression === undefined) continue;
    for (const use of usesOf(expression)) {
      keys.add(keyOf(use));
      uses.add(use.type === 'name' ? use.name : use.object);
    }
  }
  return { keys: [...keys], uses: [...uses] };
}

const plans = new WeakMap<Expression, { ambient: number; plan: Plan }>();

function planOf(expression: Expression, ambient: number): Plan {
  const kept = plans.get(expression);
  if (kept?.ambient === ambient) return kept.plan;
  const plan = compile(expression, ambient);
  plans.set(expression, { ambient, plan });
  return plan;
}

function inferenceIn(surroundings: Surroundings, report: (diagnostic: Diagnostic) => void): Inference {
  const reach: Reach = { names: () => surroundings.names(), keysOf: (name) => surroundings.keysOf(name) };
  return new Inference((name, property) => lookUp(name, property, surroundings), report, reach);
}

/** Infers, then evaluates one expression in the sheet's names. Never throws on what was typed. */
export function evaluateExpression(expression: Expression, surroundings: Surroundings): ExpressionOutcome {
  const diagnostics: Diagnostic[] = [];
  const inference = inferenceIn(surroundings, (diagnostic) => diagnostics.push(diagnostic));
  const inferred = inference.infer(expression);
  const type = inferred === undefined ? undefined : inference.finish(inferred, expression.span);
  const uses = usesOf(expression);
  const waitsFor = [...new Set(uses.filter((use) => isWaiting(use, surroundings)).map(keyOf))];
  const failed = type === undefined || diagnostics.some((diagnostic) => diagnostic.severity === 'error');
  if (failed || waitsFor.length > 0) return { type, diagnostics, waitsFor };

  const plan = planOf(expression, surroundings.settings.ambientPressure);
  const inputs = plan.inputs.map((key) => surroundings.symbol(key)?.value ?? NaN);
  const evaluated = run(plan, inputs);
  if (!evaluated.ok) {
    diagnostics.push(said(evaluated.failure, surroundings));
    return { type, diagnostics, waitsFor };
  }
  const impossible = impossibleLevel(type, evaluated.value, expression.span);
  if (impossible !== undefined) return { type, diagnostics: [...diagnostics, impossible], waitsFor };
  const substitution = uses.length === 0 ? undefined : substituted(expression, surroundings);
  return { type, value: evaluated.value, diagnostics, waitsFor, substitution };
}

/** A failure with the values behind it in their units. */
function said(failure: Failure, surroundings: Surroundings): Diagnostic {
  const inference = inferenceIn(surroundings, () => undefined);
  return failureDiagnostic(failure, (part, value) => {
    const type = inference.infer(part);
    // A level in a product or quotient counts from absolute zero.
    if (type === undefined || !Number.isFinite(value)) return String(value);
    return valueText(present(value, type.kind === 'number' ? { ...type, levels: 0 } : type, surroundings.settings));
  });
}

/** A temperature below absolute zero, a pressure below vacuum. */
export function impossibleLevel(type: Inferred, value: number, span: Diagnostic['span']): Diagnostic | undefined {
  if (type.levels !== 1 || value >= 0) return undefined;
  const figure = String(Number(value.toPrecision(4))).replace('-', '−');
  if (isTemperatureLevel(type)) return evaluationDiagnostic('BELOW_ABSOLUTE_ZERO', span, { value: figure });
  return isPressure(type.dimension) ? evaluationDiagnostic('BELOW_VACUUM', span, { value: figure }) : undefined;
}

/** Uses that stand as a factor, under a power or a root: a level counts from absolute zero there. */
function factorsOf(expression: Expression): (NameNode | MemberNode)[] {
  const parts = partsOf(expression);
  const multiplies =
    (expression.type === 'binary' && ['*', '/', '^'].includes(expression.operator)) ||
    (expression.type === 'call' && (expression.name === 'sqrt' || expression.name === 'cbrt'));
  const own = multiplies ? parts.map(ungrouped).filter((part) => part.type === 'name' || part.type === 'member') : [];
  return [...own, ...parts.flatMap(factorsOf)];
}

const pascal = resolveUnit('Pa');

/** The expression with the values of its names; levels that are factors stand absolute, in kelvin or pascal. */
function substituted(expression: Expression, surroundings: Surroundings): string {
  let factors: Set<NameNode | MemberNode> | undefined;
  return substitutedLatex(expression, (use) => {
    const symbol = surroundings.symbol(keyOf(use));
    if (symbol?.type?.levels !== 1 || symbol.value === undefined) return symbol?.shown;
    factors ??= new Set(factorsOf(expression));
    if (!factors.has(use)) return symbol.shown;
    const type: Inferred = { ...symbol.type, levels: 'any' };
    const wish = symbol.display?.level === 'pressure' && Math.abs(symbol.value) < 1000 ? { target: pascal } : {};
    return valueLatex(present(symbol.value, type, surroundings.settings, wish));
  });
}

function isWaiting(use: NameNode | MemberNode, surroundings: Surroundings): boolean {
  const symbol = surroundings.symbol(keyOf(use));
  if (symbol !== undefined) return symbol.value === undefined && symbol.several === undefined;
  return use.type === 'member' && surroundings.symbol(use.object)?.several === 'unknown';
}

function lookUp(name: string, property: string | undefined, surroundings: Surroundings): ReturnType<Lookup> {
  const symbol = surroundings.symbol(property === undefined ? name : `${name}.${property}`);
  if (symbol?.several !== undefined) return 'several';
  if (symbol !== undefined) return symbol.type ?? 'failed';
  // A cell of which it cannot be told what it would offer: that is not an unknown name.
  if (property !== undefined && surroundings.symbol(name)?.several === 'unknown') return 'failed';
  return 'unknown';
}
