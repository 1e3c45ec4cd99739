// Coefficients of the source named below, read from the liquid data of CoolProp (MIT licence).
import { polynomial, vogel } from '../liquids/forms';
import type { Liquid } from '../liquids/types';

/** Eutectic of biphenyl and diphenyl oxide. */
export const biphenylDiphenylOxide: Liquid = {
  id: 'oil_biphenyl_diphenyl_oxide',
  name: 'Heat-transfer oil, biphenyl and diphenyl oxide',
  word: 'biphenyl and diphenyl oxide',
  aliases: ['biphenyl diphenyl oxide', 'diphenyl oxide'],
  formulation: "fit to a maker's data (2014)",
  sources: ['Polynomials fitted to data of a maker of the biphenyl and diphenyl oxide eutectic (2014)'],
  range: '12 to 397 °C, under its vapour pressure or above',
  temperature: [285.15, 670.15],
  rho: polynomial({ T: 477.65, coefficients: [[909.4493], [-0.8926962], [-0.0006292874], [-1.931069e-6]] }),
  cp: polynomial({ T: 477.65, coefficients: [[2057.847], [2.640437], [8.488347e-5], [4.844177e-6]] }),
  mu: vogel(1073.926, -83.84143, 10.61685),
  k: polynomial({ T: 477.65, coefficients: [[0.1130679], [-0.0001579086], [-1.729844e-7], [3.523508e-12]] }),
  vapourPressure: { from: 285.15, value: vogel(-4313.871, -87.4314, -21.26625) },
  uncertainty: { rho: '0.4 %', cp: '0.3 %', mu: '1 %', k: '0.1 %', Pr: '2 %' },
};
