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
  row('T_freeze', 'freezing temperature', 'K', 'T_{\\mathrm{freeze}}'),
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
  row('RH', 'relative humidity', '1', '\\varphi'),
  row('W', 'humidity ratio', '1', 'W'),
  row('W_sat', 'humidity ratio at saturation', '1', 'W_{\\mathrm{sat}}'),
  row('T_wb', 'wet-bulb temperature', 'K', 'T_{\\mathrm{wb}}'),
  row('T_dp', 'dew point', 'K', 'T_{\\mathrm{dp}}'),
  row('p_ws', 'saturation pressure of water vapour', 'Pa', 'p_{\\mathrm{ws}}'),
  row('h_da', 'enthalpy per mass of dry air', 'J/kg', 'h_{\\mathrm{da}}'),
  row('v_da', 'volume per mass of dry air', 'm^3/kg', 'v_{\\mathrm{da}}'),
]) as Record<PropertyId, PropertyDefinition>;
