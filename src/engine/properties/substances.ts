import { air } from './data/air';
import { ammonia } from './data/ammonia';
import { argon } from './data/argon';
import { biphenylDiphenylOxide } from './data/biphenyl-diphenyl-oxide';
import { buildingMaterials } from './data/building-materials';
import { carbonDioxide } from './data/carbon-dioxide';
import { ethyleneGlycolWater } from './data/ethylene-glycol-water';
import { handbookLiquids, handbookSolids } from './data/handbook-tables';
import { helium } from './data/helium';
import { hydrogen } from './data/hydrogen';
import { isobutane } from './data/isobutane';
import { leadBismuth } from './data/lead-bismuth';
import { metals } from './data/metals';
import { methane } from './data/methane';
import { modifiedTerphenylOil } from './data/modified-terphenyl-oil';
import { nButane } from './data/n-butane';
import { nitrogen } from './data/nitrogen';
import { oxygen } from './data/oxygen';
import { propane } from './data/propane';
import { propyleneGlycolWater } from './data/propylene-glycol-water';
import { r1234yf } from './data/r1234yf';
import { r134a } from './data/r134a';
import { r245fa } from './data/r245fa';
import { r32 } from './data/r32';
import { refractories } from './data/refractories';
import { seaWater } from './data/sea-water';
import { siliconeOil } from './data/silicone-oil';
import { sodium } from './data/sodium';
import { solarSalt } from './data/solar-salt';
import { helmholtzSubstance } from './helmholtz/substance';
import { liquidSubstance } from './liquids/substance';
import { moistAirSubstance } from './moist-air/substance';
import { tableSubstance } from './tables/substance';
import type { Substance } from './types';
import { water } from './water/index';

const gases = [nitrogen, oxygen, argon, carbonDioxide, helium, hydrogen, methane];
const refrigerants = [ammonia, propane, nButane, isobutane, r134a, r1234yf, r32, r245fa];
const mixtures = [ethyleneGlycolWater, propyleneGlycolWater, seaWater];
const heatCarriers = [modifiedTerphenylOil, biphenylDiphenylOxide, siliconeOil, solarSalt, sodium, leadBismuth];

const dryAir = helmholtzSubstance(air);

const substances: readonly Substance[] = [
  water,
  dryAir,
  moistAirSubstance(dryAir),
  ...[...gases, ...refrigerants].map(helmholtzSubstance),
  ...[...mixtures, ...heatCarriers].map(liquidSubstance),
  ...[...handbookLiquids, ...metals, ...handbookSolids, ...buildingMaterials, ...refractories].map(tableSubstance),
];

/** Every word under which a substance is found, in lower case; the first that claims a word keeps it. */
const byWord = new Map<string, Substance>();
for (const substance of substances)
  for (const word of [substance.id, substance.name, ...substance.aliases].map((each) => each.toLowerCase()))
    if (!byWord.has(word)) byWord.set(word, substance);

export function listSubstances(): readonly Substance[] {
  return substances;
}

/** By id, name or another word for it; case does not matter. */
export function findSubstance(name: string): Substance | undefined {
  return byWord.get(name.trim().toLowerCase());
}
