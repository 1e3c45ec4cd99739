import type { RelationSymbol } from './types';

// Symbols that many entries share; an entry writes out one that means something else in it.

export const a: RelationSymbol = { symbol: 'a', quantity: 'inner over outer diameter of the gap', unit: '1' };
export const al: RelationSymbol = { symbol: 'al', quantity: 'void fraction', unit: '1' };
export const alpha: RelationSymbol = { symbol: 'alpha', quantity: 'thermal diffusivity', unit: 'm^2/s' };
export const b: RelationSymbol = { symbol: 'b', quantity: 'longitudinal pitch ratio S_L/D', unit: '1' };
export const beta: RelationSymbol = {
  symbol: 'beta',
  quantity: 'chevron angle measured from the flow direction',
  unit: 'rad',
};
export const Bi: RelationSymbol = { symbol: 'Bi', quantity: 'Biot number', unit: '1' };
export const C_D: RelationSymbol = { symbol: 'C_D', quantity: 'drag coefficient', unit: '1' };
export const C_f: RelationSymbol = { symbol: 'C_f', quantity: 'friction coefficient', unit: '1' };
export const cp: RelationSymbol = { symbol: 'cp', quantity: 'specific heat capacity', unit: 'J/(kg K)' };
export const cp_l: RelationSymbol = { symbol: 'cp_l', quantity: 'liquid specific heat', unit: 'J/(kg K)' };
export const Cr: RelationSymbol = { symbol: 'Cr', quantity: 'smaller over larger capacity rate', unit: '1' };
export const D: RelationSymbol = { symbol: 'D', quantity: 'diameter', unit: 'm' };
export const D2: RelationSymbol = { symbol: 'D2', quantity: 'downstream diameter', unit: 'm' };
export const D_c: RelationSymbol = { symbol: 'D_c', quantity: 'coil diameter, centre to centre', unit: 'm' };
export const D_h: RelationSymbol = { symbol: 'D_h', quantity: 'hydraulic diameter', unit: 'm' };
export const D_i: RelationSymbol = { symbol: 'D_i', quantity: 'tube inner diameter', unit: 'm' };
export const dP: RelationSymbol = { symbol: 'dP', quantity: 'pressure difference', unit: 'Pa' };
export const dp: RelationSymbol = { symbol: 'dp', quantity: 'particle diameter', unit: 'm' };
export const dPdL: RelationSymbol = { symbol: 'dPdL', quantity: 'frictional pressure gradient', unit: 'Pa/m' };
export const dT: RelationSymbol = {
  symbol: 'dT',
  quantity: 'temperature difference',
  unit: 'K',
  temperature: 'difference',
};
export const e1: RelationSymbol = { symbol: 'e1', quantity: 'emissivity of surface 1', unit: '1' };
export const e2: RelationSymbol = { symbol: 'e2', quantity: 'emissivity of surface 2', unit: '1' };
export const eD: RelationSymbol = { symbol: 'eD', quantity: 'relative roughness', unit: '1' };
export const eff: RelationSymbol = { symbol: 'eff', quantity: 'effectiveness', unit: '1' };
export const eps: RelationSymbol = { symbol: 'eps', quantity: 'void fraction of bed', unit: '1' };
export const eta: RelationSymbol = { symbol: 'eta', quantity: 'fin efficiency', unit: '1' };
export const F: RelationSymbol = { symbol: 'F', quantity: 'factor on the Nusselt number', unit: '1' };
export const f: RelationSymbol = { symbol: 'f', quantity: 'Darcy friction factor', unit: '1' };
export const f_lo: RelationSymbol = {
  symbol: 'f_lo',
  quantity: 'Darcy friction factor with all mass as liquid',
  unit: '1',
};
export const Fo: RelationSymbol = { symbol: 'Fo', quantity: 'Fourier number', unit: '1' };
export const fRe: RelationSymbol = { symbol: 'fRe', quantity: 'Fanning friction factor times Re', unit: '1' };
export const g: RelationSymbol = { symbol: 'g', quantity: 'gravitational acceleration', unit: 'm/s^2' };
export const gam: RelationSymbol = { symbol: 'gam', quantity: 'ratio of specific heats', unit: '1' };
export const Gr: RelationSymbol = { symbol: 'Gr', quantity: 'Grashof number', unit: '1' };
export const H: RelationSymbol = { symbol: 'H', quantity: 'height', unit: 'm' };
export const h: RelationSymbol = { symbol: 'h', quantity: 'heat transfer coefficient', unit: 'W/(m^2 K)' };
export const h_fg: RelationSymbol = { symbol: 'h_fg', quantity: 'latent heat', unit: 'J/kg' };
export const h_o: RelationSymbol = { symbol: 'h_o', quantity: 'outside coefficient', unit: 'W/(m^2 K)' };
export const j: RelationSymbol = { symbol: 'j', quantity: 'Colburn j factor', unit: '1' };
export const K: RelationSymbol = { symbol: 'K', quantity: 'loss coefficient', unit: '1' };
export const k: RelationSymbol = { symbol: 'k', quantity: 'thermal conductivity', unit: 'W/(m K)' };
export const k_f: RelationSymbol = { symbol: 'k_f', quantity: 'fin conductivity', unit: 'W/(m K)' };
export const k_l: RelationSymbol = { symbol: 'k_l', quantity: 'liquid conductivity', unit: 'W/(m K)' };
export const L: RelationSymbol = { symbol: 'L', quantity: 'length', unit: 'm' };
export const L_f: RelationSymbol = { symbol: 'L_f', quantity: 'fin height', unit: 'm' };
export const Le: RelationSymbol = { symbol: 'Le', quantity: 'entry length', unit: 'm' };
export const m_dot: RelationSymbol = { symbol: 'm_dot', quantity: 'mass flow', unit: 'kg/s' };
export const mu: RelationSymbol = { symbol: 'mu', quantity: 'dynamic viscosity at bulk temperature', unit: 'Pa s' };
export const mu_g: RelationSymbol = { symbol: 'mu_g', quantity: 'vapour viscosity', unit: 'Pa s' };
export const mu_l: RelationSymbol = { symbol: 'mu_l', quantity: 'liquid viscosity', unit: 'Pa s' };
export const mu_w: RelationSymbol = { symbol: 'mu_w', quantity: 'dynamic viscosity at wall temperature', unit: 'Pa s' };
export const N_L: RelationSymbol = { symbol: 'N_L', quantity: 'number of tube rows', unit: '1' };
export const NTU: RelationSymbol = { symbol: 'NTU', quantity: 'number of transfer units', unit: '1' };
export const Nu: RelationSymbol = { symbol: 'Nu', quantity: 'Nusselt number', unit: '1' };
export const P: RelationSymbol = { symbol: 'P', quantity: 'pressure', unit: 'Pa' };
export const P_c: RelationSymbol = { symbol: 'P_c', quantity: 'critical pressure', unit: 'Pa' };
export const Pe: RelationSymbol = { symbol: 'Pe', quantity: 'Peclet number', unit: '1' };
export const Pr: RelationSymbol = { symbol: 'Pr', quantity: 'Prandtl number', unit: '1' };
export const pr: RelationSymbol = { symbol: 'pr', quantity: 'pitch ratio P_t/D_o', unit: '1' };
export const Pr_w: RelationSymbol = { symbol: 'Pr_w', quantity: 'Prandtl number at wall temperature', unit: '1' };
export const Q: RelationSymbol = { symbol: 'Q', quantity: 'heat rate', unit: 'W' };
export const q: RelationSymbol = { symbol: 'q', quantity: 'heat flux', unit: 'W/m^2' };
export const R: RelationSymbol = { symbol: 'R', quantity: 'thermal resistance', unit: 'K/W' };
export const Ra: RelationSymbol = { symbol: 'Ra', quantity: 'Rayleigh number', unit: '1' };
export const Re: RelationSymbol = { symbol: 'Re', quantity: 'Reynolds number', unit: '1' };
export const rho: RelationSymbol = { symbol: 'rho', quantity: 'density', unit: 'kg/m^3' };
export const rho_g: RelationSymbol = { symbol: 'rho_g', quantity: 'saturated vapour density', unit: 'kg/m^3' };
export const rho_l: RelationSymbol = { symbol: 'rho_l', quantity: 'saturated liquid density', unit: 'kg/m^3' };
export const S: RelationSymbol = { symbol: 'S', quantity: 'shape factor', unit: 'm' };
export const sigma: RelationSymbol = { symbol: 'sigma', quantity: 'surface tension', unit: 'N/m' };
export const t: RelationSymbol = { symbol: 't', quantity: 'fin thickness', unit: 'm' };
export const T1: RelationSymbol = { symbol: 'T1', quantity: 'absolute temperature 1', unit: 'K', temperature: 'level' };
export const T2: RelationSymbol = { symbol: 'T2', quantity: 'absolute temperature 2', unit: 'K', temperature: 'level' };
export const T_b: RelationSymbol = { symbol: 'T_b', quantity: 'bulk temperature', unit: 'K', temperature: 'level' };
export const T_inf: RelationSymbol = {
  symbol: 'T_inf',
  quantity: 'free-stream or ambient temperature',
  unit: 'K',
  temperature: 'level',
};
export const T_s: RelationSymbol = { symbol: 'T_s', quantity: 'surface temperature', unit: 'K', temperature: 'level' };
export const th: RelationSymbol = { symbol: 'th', quantity: 'dimensionless temperature', unit: '1' };
export const V: RelationSymbol = { symbol: 'V', quantity: 'velocity', unit: 'm/s' };
export const X: RelationSymbol = { symbol: 'X', quantity: 'Rayleigh number on the spacing times S/L', unit: '1' };
export const x: RelationSymbol = { symbol: 'x', quantity: 'distance from the start', unit: 'm' };
export const xq: RelationSymbol = { symbol: 'xq', quantity: 'vapour quality', unit: '1' };
