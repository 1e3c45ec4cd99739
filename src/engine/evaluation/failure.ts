import type { Diagnostic } from '../errors/diagnostic';
import { evaluationDiagnostic } from '../errors/evaluation-errors';
import { formatExpression } from '../language/print';
import type { Expression } from '../language/tree';
import { literalOf, ungrouped } from '../language/walk';

/** Why a plan has no value for its inputs: what was computed, and from which values. */
export interface Failure {
  kind: 'division' | 'zero power' | 'negative power' | 'function' | 'overflow' | 'not given';
  /** The part of the expression that has no value. */
  node: Expression;
  /** Values of its operands, in their order. */
  values: readonly number[];
  /** Of functions, why; of `not given`, the name. */
  reason?: string;
}

/** Says a value of a part of an expression; the default knows no units. */
export type Show = (expression: Expression, value: number) => string;

function plainly(_: Expression, value: number): string {
  return String(Number(value.toPrecision(6))).replace('-', '−');
}

function operandsOf(node: Expression): readonly Expression[] {
  if (node.type === 'binary') return [node.left, node.right];
  if (node.type === 'call') return node.arguments;
  return node.type === 'unary' ? [node.operand] : [];
}

/** A value under its expression (`T_w - T_b is 0 K`), or by itself where it is only figures. */
function said(expression: Expression | undefined, value: number | undefined, show: Show): string {
  if (expression === undefined || value === undefined) return '';
  if (literalOf(expression) !== undefined) return show(expression, value);
  return `${formatExpression(ungrouped(expression))} is ${show(expression, value)}`;
}

/** The sentence for a failure, with the values that caused it. */
export function failureDiagnostic({ kind, node, values, reason }: Failure, show: Show = plainly): Diagnostic {
  const operands = operandsOf(node);
  const [x, y] = values;
  const first = said(operands[0], x, show);
  const second = said(operands[1], y, show);
  const all = operands.map((operand, index) => said(operand, values[index], show)).filter((text) => text !== '');
  switch (kind) {
    case 'division': {
      const divisor =
        operands[1] !== undefined && literalOf(operands[1]) !== undefined ? `the divisor is ${second}` : second;
      return evaluationDiagnostic('DIVISION_BY_ZERO', node.span, { divisor });
    }
    case 'zero power':
      return evaluationDiagnostic('ZERO_TO_NEGATIVE', node.span, { base: first, exponent: plainly(node, y ?? 0) });
    case 'negative power':
      return evaluationDiagnostic('NEGATIVE_POWER', node.span, {
        base: first,
        exponent: `exponent ${plainly(node, y ?? 0)}`,
      });
    case 'function':
      return evaluationDiagnostic('NO_VALUE', node.span, { reason: reason ?? '', arguments: all.join(', ') });
    case 'overflow':
      return evaluationDiagnostic('OVERFLOW', node.span, { from: all.length === 0 ? '' : `: ${all.join(', ')}` });
    case 'not given':
      return evaluationDiagnostic('UNKNOWN_NAME', node.span, { name: reason ?? '', hint: '' });
  }
}
