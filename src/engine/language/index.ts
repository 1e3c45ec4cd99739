export { parser as calculationParser } from './grammar/parser';
export { canonicalName, greekLetters } from './names';
export { formatExpression } from './print';
export { deepestNesting, readExpressionText, readLines } from './read';
export type * from './tree';
export { expressionLatex, figuresLatex, substitutedLatex, type Piece } from './typeset/expression';
export { memberLatex, symbolLatex } from './typeset/symbol';
export { literalOf, partsOf, ungrouped, usesOf } from './walk';
