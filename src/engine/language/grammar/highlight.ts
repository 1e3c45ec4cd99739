import { styleTags, tags } from '@lezer/highlight';

/** Colours of the editor by meaning; which colour is the editor's theme's. */
export const highlighting = styleTags({
  Number: tags.number,
  Unit: tags.unit,
  'Definition/Name': tags.definition(tags.variableName),
  'NameUse/Name': tags.variableName,
  Member: tags.propertyName,
  'FunctionName/Name': tags.function(tags.variableName),
  'Require To NotSign AndSign OrSign': tags.keyword,
  Note: tags.lineComment,
  'Plus Minus Times Divide Caret PlusMinus Coverage': tags.arithmeticOperator,
  Compare: tags.compareOperator,
  Equals: tags.definitionOperator,
  '( )': tags.paren,
  ',': tags.separator,
  Raised: tags.arithmeticOperator,
});
