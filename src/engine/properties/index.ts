import { air } from './data/air';
import { gasSubstance } from './helmholtz/substance';
import type { Substance } from './types';
import { water } from './water/index';

export { propertyDefinitions } from './definitions';
export { waterBackgroundConductivity, waterViscosity } from './water/index';
export type * from './types';

/** Changes with everything that may change a digit of a property. */
export const propertiesVersion = '2026.12.1';

const substances: readonly Substance[] = [water, gasSubstance(air)];

export function listSubstances(): readonly Substance[] {
  return substances;
}

/** By id, name or another word for it; case does not matter. */
export function findSubstance(name: string): Substance | undefined {
  const wanted = name.toLowerCase();
  return substances.find((substance) =>
    [substance.id, substance.name, ...substance.aliases].some((word) => word.toLowerCase() === wanted),
  );
}
