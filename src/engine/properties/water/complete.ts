import { propertyError, celsius } from '../../errors/property-errors';
import { nearCritical } from '../pure-fluid/near-critical';
import type { State } from '../types';
import { criticalPressure, criticalTemperature, type WaterState } from './regions';
import { boundaryPressure23 } from './saturation';
import { conductivity, viscosity } from './transport';

const transportEnd = 1173.15;

const uncertainty = {
  rho: '0.01 % liquid, 0.1 % steam',
  cp: '0.2 % liquid, 1 % steam',
  mu: '1 % liquid, 3 % steam',
  k: '2 %',
  Pr: '3 %',
};

function regionOf({ T, p }: WaterState, phase: State['phase']): number {
  if (T > 1073.15) return 5;
  if (T <= 623.15) return phase === 'liquid' ? 1 : 2;
  return T > 863.15 || p <= boundaryPressure23(T) ? 2 : 3;
}

/** A state of one phase with its transport properties, or with the reason why it has none. */
export function complete(state: WaterState, phase: State['phase'], saturated: boolean): State {
  const { T, p, rho, h, u, s, cp, cv, w, beta } = state;
  const values: State['values'] = { T, p, rho, v: 1 / rho, h, u, s, cp, cv, w, beta };
  const missing: State['missing'] = {};
  if (T <= transportEnd) {
    const mu = viscosity(T, rho);
    const k = conductivity(state, mu);
    Object.assign(values, { mu, k, nu: mu / rho, alpha: k / (rho * cp), Pr: (mu * cp) / k });
  } else {
    const reason = propertyError('TRANSPORT_OUT_OF_RANGE', {
      quantity: 'Viscosity and conductivity',
      equation: 'R12-08, R15-11',
      from: celsius(273.15),
      to: celsius(transportEnd),
      given: celsius(T),
      T,
      high: transportEnd,
    });
    for (const property of ['mu', 'k', 'nu', 'alpha', 'Pr'] as const) missing[property] = reason;
  }
  const region = `IAPWS R7-97 region ${regionOf(state, phase)}`;
  return {
    substance: 'water',
    phase,
    formulation: saturated ? `${region}, saturated` : region,
    values,
    missing,
    uncertainty,
    warnings: nearCritical(T, p, { T: criticalTemperature, p: criticalPressure }),
  };
}
