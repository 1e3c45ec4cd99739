export { parser as calculationParser } from './grammar/parser';
export { goesOn, splitLines, type SourceLine } from './lines';
export { canonicalName, greekLetters } from './names';
export { formatExpression } from './print';
export { deepestNesting, longestLine, readExpressionText, readLines } from './read';
export type * from './tree';
export { conditionLatex, expressionLatex, figuresLatex, substitutedLatex, type Piece } from './typeset/expression';
export { memberLatex, symbolLatex } from './typeset/symbol';
export { literalOf, namesOf, partsOf, ungrouped, usesOf } from './walk';
