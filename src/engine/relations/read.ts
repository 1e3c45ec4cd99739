import { expressionLatex, readExpressionText, readLines, type Expression } from '../language/index';
import type { Relation } from './types';

/** A formula line, read: an assignment, or an unknown to be found between two ends. */
export type ReadFormulaLine =
  | { kind: 'assignment'; symbol: string; expression: Expression }
  | { kind: 'implicit'; symbol: string; low: Expression; high: Expression; equation: Expression };

export interface ReadCondition {
  text: string;
  latex: string;
  expression: Expression;
}

export interface ReadRelation {
  formula: readonly ReadFormulaLine[];
  validity: readonly ReadCondition[];
  /** Parts of the range with a stated accuracy of their own. */
  bands: readonly { when: Expression; relativeAccuracy: number }[];
}

function read(text: string, relation: Relation): Expression {
  const expression = readExpressionText(text);
  if (expression === undefined)
    throw new Error(`The catalogue entry ${relation.id} has a part that cannot be read: ${text}`);
  return expression;
}

const kept = new WeakMap<Relation, ReadRelation>();

/** The formula lines and conditions of an entry as trees. Throws for a faulty entry: that is the catalogue's mistake. */
export function readRelation(relation: Relation): ReadRelation {
  const before = kept.get(relation);
  if (before !== undefined) return before;
  const formula = relation.formula.map((line): ReadFormulaLine => {
    if (typeof line !== 'string') {
      const [low, high] = line.between;
      return {
        kind: 'implicit',
        symbol: line.solve,
        low: read(low, relation),
        high: read(high, relation),
        equation: read(line.equation, relation),
      };
    }
    const [assignment] = readLines(line);
    if (
      assignment?.kind !== 'assignment' ||
      assignment.name === undefined ||
      assignment.expression === undefined ||
      assignment.diagnostics.some((one) => one.severity === 'error')
    ) {
      throw new Error(`The catalogue entry ${relation.id} has a formula line that cannot be read: ${line}`);
    }
    return { kind: 'assignment', symbol: assignment.name, expression: assignment.expression };
  });
  const validity = relation.validity.map((text): ReadCondition => {
    const expression = read(text, relation);
    return { text, latex: expressionLatex(expression), expression };
  });
  const bands = (relation.accuracyBands ?? []).map(({ when, relativeAccuracy }) => ({
    when: read(when, relation),
    relativeAccuracy,
  }));
  const result = { formula, validity, bands };
  kept.set(relation, result);
  return result;
}
