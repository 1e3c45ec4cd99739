export * from './dimension';
export * from './display';
export { quantityName, shownUnit, siUnitText } from './quantities';
export { isUnitless, plainUnit, resolveUnit, scanUnit, underOneSolidus, unitWords, type ScannedUnit } from './resolve';
export { editDistance, nearestUnit, unitProblem, unitProblemAt, type UnitProblem } from './suggest';
export { findUnit, prefixes, unitNames, unitTable, type UnitDefinition } from './table';
export * from './types';
