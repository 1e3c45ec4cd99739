export { propertyDefinitions } from './definitions';
export { waterBackgroundConductivity, waterViscosity } from './water/index';
export type * from './types';

/** Changes with everything that may change a digit of a property. */
export const propertiesVersion = '2026.12.2';
export { findSubstance, listSubstances } from './substances';
