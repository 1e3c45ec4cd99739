import type { Diagnostic } from '../../errors/diagnostic';
import { celsius, propertyError } from '../../errors/property-errors';
import type { Phase } from '../pure-fluid/index';
import { nearCritical } from '../pure-fluid/near-critical';
import type { PropertyId, State } from '../types';
import type { HelmholtzState } from './equation';
import type { HelmholtzFluid } from './types';

type Found = { ok: true; value: number } | { ok: false; error: Diagnostic };

function covered(
  quantity: string,
  fluid: HelmholtzFluid,
  T: number,
  equation: { temperature?: readonly [number, number] } | undefined,
): Diagnostic | undefined {
  if (equation === undefined)
    return propertyError('PROPERTY_NOT_AVAILABLE', {
      reason: `No published equation for the ${quantity} of ${fluid.word} is carried`,
    });
  const [low, high] = equation.temperature ?? [0, Infinity];
  if (T >= low && T <= high) return undefined;
  return propertyError('TRANSPORT_OUT_OF_RANGE', {
    quantity: quantity.charAt(0).toUpperCase() + quantity.slice(1),
    equation: fluid.name,
    from: celsius(low),
    to: celsius(high),
    given: celsius(T),
    T,
    low,
    high,
  });
}

function viscosityOf(fluid: HelmholtzFluid, state: HelmholtzState): Found {
  const error = covered('viscosity', fluid, state.T, fluid.viscosity);
  return error === undefined && fluid.viscosity !== undefined
    ? { ok: true, value: fluid.viscosity.value(state, fluid) }
    : { ok: false, error: error ?? propertyError('PROPERTY_NOT_AVAILABLE') };
}

function conductivityOf(fluid: HelmholtzFluid, state: HelmholtzState): Found {
  const error = covered('thermal conductivity', fluid, state.T, fluid.conductivity);
  // The critical enhancement needs a viscosity, if only as an estimate of its order.
  const mu = fluid.viscosity?.value(state, fluid) ?? NaN;
  return error === undefined && fluid.conductivity !== undefined
    ? { ok: true, value: fluid.conductivity.value(state, fluid, mu) }
    : { ok: false, error: error ?? propertyError('PROPERTY_NOT_AVAILABLE') };
}

function warningsOf(fluid: HelmholtzFluid, { T, p }: HelmholtzState): Diagnostic[] {
  const warnings = nearCritical(T, p, fluid.critical);
  if (fluid.dissociation !== undefined && T > fluid.dissociation)
    warnings.push(
      propertyError('WARN_HIGH_T_DISSOCIATION', { limit: celsius(fluid.dissociation), name: fluid.word, T }),
    );
  if (fluid.fitted !== undefined && T > fluid.fitted[1])
    warnings.push(
      propertyError('WARN_BEYOND_MEASUREMENTS', {
        formulation: fluid.formulation,
        limit: celsius(fluid.fitted[1]),
        given: celsius(T),
        T,
      }),
    );
  return warnings;
}

/** Makes a whole state of a thermodynamic one: transport properties, reasons for those missing, warnings. */
export function completer(fluid: HelmholtzFluid): (state: HelmholtzState, phase: Phase, saturated: boolean) => State {
  return (state, phase, saturated) => {
    const { T, p, rho, h, u, s, cp, cv, w, beta } = state;
    const values: State['values'] = { T, p, rho, v: 1 / rho, h, u, s, cp, cv, w, beta };
    const missing: Partial<Record<PropertyId, Diagnostic>> = {};
    const mu = viscosityOf(fluid, state);
    const k = conductivityOf(fluid, state);
    if (mu.ok) Object.assign(values, { mu: mu.value, nu: mu.value / rho });
    else Object.assign(missing, { mu: mu.error, nu: mu.error });
    if (k.ok) Object.assign(values, { k: k.value, alpha: k.value / (rho * cp) });
    else Object.assign(missing, { k: k.error, alpha: k.error });
    if (mu.ok && k.ok) values.Pr = (mu.value * cp) / k.value;
    else missing.Pr = mu.ok ? (k.ok ? propertyError('PROPERTY_NOT_AVAILABLE') : k.error) : mu.error;
    return {
      substance: fluid.id,
      phase,
      formulation: saturated ? `${fluid.formulation}, saturated` : fluid.formulation,
      values,
      missing,
      uncertainty: fluid.uncertainty,
      warnings: warningsOf(fluid, state),
    };
  };
}
