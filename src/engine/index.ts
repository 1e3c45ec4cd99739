// The door of the engine: named exports only.
export type { Diagnostic, Mend, Severity, Span } from './errors/diagnostic';
export { createEngine, defaultSettings, evaluateCalculation, limits, type Engine } from './calculation/engine';
export { sha256 } from './calculation/fingerprint';
export { twelveDigits } from './calculation/present';
export { evaluateRelation, rankRelations, validityOf, workThrough } from './calculation/relation-evaluation';
export type * from './calculation/types';
export { functionSignatures as listFunctions, type FunctionSignature } from './language/functions';
export {
  calculationParser,
  canonicalName,
  expressionLatex,
  readExpressionText,
  readLines,
  symbolLatex,
} from './language/index';
export type * from './language/tree';
export {
  findSubstance,
  listSubstances,
  propertiesVersion,
  propertyDefinitions,
  waterBackgroundConductivity,
  waterViscosity,
} from './properties/index';
export type * from './properties/types';
export {
  catalogueVersion,
  findRelation,
  listFamilies,
  listRelations,
  readRelation,
  worstGrade,
  type CatalogueEntry,
  type RankedRelation,
  type RankScope,
} from './relations/index';
export type * from './relations/types';
export { resolveUnit, unitNames as listUnits } from './units/index';

/** Changes with everything that may change a digit. */
export const engineVersion = '0.1.0';
