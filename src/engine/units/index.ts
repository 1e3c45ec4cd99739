export * from './dimension';
export * from './display';
export { quantityName, shownUnit, siUnitText } from './quantities';
export { editDistance, isUnitless, nearestUnit, plainUnit, resolveUnit, scanUnit } from './resolve';
export { findUnit, prefixes, unitNames, unitTable } from './table';
export type { UnitDefinition } from './table';
export * from './types';
