import { air } from './data/air';
import { carbonDioxide } from './data/carbon-dioxide';
import { helium } from './data/helium';
import { hydrogen } from './data/hydrogen';
import { methane } from './data/methane';
import { ammonia } from './data/ammonia';
import { r134a } from './data/r134a';
import { propane } from './data/propane';
import { nButane } from './data/n-butane';
import { isobutane } from './data/isobutane';
import { r32 } from './data/r32';
import { r1234yf } from './data/r1234yf';
import { r245fa } from './data/r245fa';
import { argon } from './data/argon';
import { nitrogen } from './data/nitrogen';
import { oxygen } from './data/oxygen';
import { helmholtzSubstance } from './helmholtz/substance';
import type { Substance } from './types';
import { water } from './water/index';

export { propertyDefinitions } from './definitions';
export { waterBackgroundConductivity, waterViscosity } from './water/index';
export type * from './types';

/** Changes with everything that may change a digit of a property. */
export const propertiesVersion = '2026.12.1';

const substances: readonly Substance[] = [water, ...[air, nitrogen, oxygen, argon, carbonDioxide, helium, hydrogen, methane, ammonia, r134a, propane, nButane, isobutane, r32, r1234yf, r245fa].map(helmholtzSubstance)];

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
