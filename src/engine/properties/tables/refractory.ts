import { slug } from './slug';
import type { MaterialTable } from './types';

const nodes = [673.15, 873.15, 1073.15, 1273.15, 1473.15];
const sources = ['VDI Heat Atlas, 2nd edition, Springer (2010), refractories'];

/** A refractory: name, density, conductivities and heat capacities at the five temperatures of the table. */
export function refractory([name, rho, k, cp]: readonly [
  string,
  number,
  readonly number[],
  readonly number[],
]): MaterialTable {
  return {
    id: `refractory_${slug(name)}`,
    name: `Refractory, ${name}`,
    word: `the refractory ${name}`,
    aliases: [name],
    phase: 'solid',
    formulation: 'VDI Heat Atlas 2010',
    sources,
    range: '400 to 1200 °C',
    temperature: [673.15, 1473.15],
    columns: { rho: { T: [293.15], values: [rho] }, k: { T: nodes, values: k }, cp: { T: nodes, values: cp } },
    uncertainty: {},
  };
}
