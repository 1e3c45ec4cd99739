import { expressionLatex, readRelation, symbolLatex, type Relation } from '#engine';

export { formulaLatex } from './relationList';

export const symbolMaths = (symbol: string): string => symbolLatex(symbol);

/** The stated conditions as mathematics, beside their text. */
export function conditionMaths(relation: Relation): { text: string; latex: string }[] {
  return readRelation(relation).validity.map(({ text, expression }) => ({ text, latex: expressionLatex(expression) }));
}
