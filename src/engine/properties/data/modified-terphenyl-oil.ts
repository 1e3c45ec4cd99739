// Coefficients of the source named below, read from the liquid data of CoolProp (MIT licence).
import { polynomial, vogel } from '../liquids/forms';
import type { Liquid } from '../liquids/types';

/** Heat-transfer oil of hydrogenated (modified) terphenyls. */
export const modifiedTerphenylOil: Liquid = {
  id: 'oil_modified_terphenyl',
  name: 'Heat-transfer oil, modified terphenyl',
  word: 'modified terphenyl oil',
  aliases: ['modified terphenyl', 'thermal oil', 'hydrogenated terphenyl'],
  formulation: "fit to a maker's data (2014)",
  sources: ['Polynomials fitted to data of a maker of hydrogenated terphenyl oil (2014)'],
  range: '0 to 380 °C',
  temperature: [273.15, 653.15],
  rho: polynomial({ T: 463.15, coefficients: [[892.4651], [-0.7182484], [-0.0003391502], [-7.434511e-7]] }),
  cp: polynomial({ T: 463.15, coefficients: [[2157.819], [3.630114], [0.0009171095], [1.004461e-6]] }),
  mu: vogel(653.8723, -206.0943, 9.556995),
  k: polynomial({ T: 463.15, coefficients: [[0.1065831], [-9.17879e-5], [-1.57373e-7], [1.361587e-11]] }),
  vapourPressure: { from: 343.15, value: vogel(-9020.703, 65.50192, -24.45722) },
  uncertainty: { rho: '0.1 %', cp: '0.1 %', mu: '1 %', k: '1 %', Pr: '2 %' },
};
