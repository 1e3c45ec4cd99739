import type { PropertyDefinition, PropertyId } from './types';

const row = (id: PropertyId, quantity: string, unit: string, symbolLatex: string): [PropertyId, PropertyDefinition] => [
  id,
  { id, quantity, unit, symbolLatex },
];

/** Every property that a state may have, in the order in which tables show them. */
export const propertyDefinitions = Object.fromEntries([
  row('T', 'temperature', 'K', 'T'),
  row('p', 'pressure', 'Pa', 'p'),
  row('x', 'vapour quality', '1', 'x'),
  row('T_sat', 'saturation temperature', 'K', 'T_{\\mathrm{sat}}'),
  row('p_sat', 'saturation pressure', 'Pa', 'p_{\\mathrm{sat}}'),
  row('h_fg', 'enthalpy of vaporisation', 'J/kg', 'h_{\\mathrm{fg}}'),
  row('sigma', 'surface tension', 'N/m', '\\sigma'),
  row('rho', 'density', 'kg/m^3', '\\rho'),
  row('cp', 'specific heat capacity at constant pressure', 'J/(kg*K)', 'c_p'),
  row('k', 'thermal conductivity', 'W/(m*K)', 'k'),
  row('mu', 'dynamic viscosity', 'Pa*s', '\\mu'),
  row('nu', 'kinematic viscosity', 'm^2/s', '\\nu'),
  row('alpha', 'thermal diffusivity', 'm^2/s', '\\alpha'),
  row('Pr', 'Prandtl number', '1', '\\mathrm{Pr}'),
  row('beta', 'thermal expansion coefficient', '1/K', '\\beta'),
  row('h', 'specific enthalpy', 'J/kg', 'h'),
  row('s', 'specific entropy', 'J/(kg*K)', 's'),
  row('u', 'specific internal energy', 'J/kg', 'u'),
  row('v', 'specific volume', 'm^3/kg', 'v'),
  row('cv', 'specific heat capacity at constant volume', 'J/(kg*K)', 'c_v'),
  row('w', 'speed of sound', 'm/s', 'w'),
]) as Record<PropertyId, PropertyDefinition>;
