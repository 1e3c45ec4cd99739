import { describeExample } from '../../helpers/worked-example';

const incropera = 'Incropera & DeWitt, Fundamentals of Heat and Mass Transfer';

const pan = (constants: string) => `${constants}
sigma = 0.0589 N/m
cp_l = 4217 J/(kg K)
h_fg = 2257 kJ/kg
D = 0.3 m
A = pi*D^2/4`;
const rohsenow = `rho_l = rho_l
rho_g = rho_v
mu_l = mu_l
k_l = cp_l*mu_l/Pr_l
cp_l = cp_l
h_fg = h_fg
sigma = sigma
n = 1`;

describeExample({
  title: 'Water boiling in a polished copper pan',
  source: `${incropera}, Example 10.1`,
  cells: [
    pan(`rho_l = 957.9 kg/m^3  # water at 100 degC
mu_l = 279e-6 Pa s
Pr_l = 1.76
rho_v = 0.5955 kg/m^3`),
    {
      name: 'pan',
      relation: 'rohsenow-1952',
      lines: `${rohsenow}\ndT = 118 degC - 100 degC\nCsf = 0.0128\ng = 9.8 m/s^2`,
    },
    {
      name: 'peak',
      relation: 'zuber-1959-chf',
      lines: 'C = 0.149\nh_fg = h_fg\nrho_g = rho_v\nsigma = sigma\nrho_l = rho_l\ng = 9.8 m/s^2',
    },
    `Q = pan.q*A
m_dot = Q/h_fg`,
  ],
  answers: {
    'pan.q': { printed: '836 kW/m^2', within: 6e-4, because: 'three printed figures' },
    Q: { printed: '59.1 kW', within: 9e-4, because: 'three printed figures' },
    m_dot: '0.0262 kg/s',
    'peak.q': '1.26 MW/m^2',
  },
});

describeExample({
  title: 'Nucleate boiling of water in a steel pan',
  source: 'Cengel, Heat and Mass Transfer, Example 10-1',
  cells: [
    pan(`rho_l = 957.9 kg/m^3  # water at 100 degC
mu_l = 0.282e-3 Pa s
Pr_l = 1.75
rho_v = 0.6 kg/m^3`),
    {
      name: 'pan',
      relation: 'rohsenow-1952',
      lines: `${rohsenow}\ndT = 108 degC - 100 degC\nCsf = 0.0130\ng = 9.8 m/s^2`,
    },
    `Q = pan.q*A
m_dot = Q/h_fg`,
  ],
  answers: {
    'pan.q': { printed: '7.20e4 W/m^2', within: 1.1e-3, because: 'three printed figures' },
    Q: { printed: '5093 W', within: 3e-4, because: 'the book goes on with 72.0 kW/m2 and 0.0707 m2' },
    m_dot: '2.26e-3 kg/s',
  },
});

describeExample({
  title: 'Film condensation outside a vertical tube',
  source: `${incropera}, Example 10.3`,
  cells: [
    `L = 1 m
D = 80 mm
T_sat = 100 degC
T_s = 50 degC`,
    `rho_l = 975 kg/m^3  # water at the film temperature 75 degC
mu_l = 375e-6 Pa s
k_l = 0.668 W/(m K)
cp_l = 4193 J/(kg K)
nu_l = mu_l/rho_l
rho_v = 0.596 kg/m^3
h_fg = 2257 kJ/kg
h_fgp = h_fg + 0.68*cp_l*(T_sat - T_s)
g = 9.8 m/s^2`,
    {
      name: 'laminar',
      relation: 'nusselt-1916-plate',
      lines: `g = g
theta = 90 deg
rho_l = rho_l
rho_g = rho_v
k_l = k_l
h_fgp = h_fgp
mu_l = mu_l
dT = T_sat - T_s
L = L`,
    },
    // The book solves the wavy-film relation with Re = 4*h*L*dT/(mu*h_fgp).
    `Re = 1177
h_Re = Re*mu_l*h_fgp/(4*L*(T_sat - T_s))  # what this Re stands for`,
    { name: 'wavy', relation: 'kutateladze-1963-wavy', lines: 'Re = Re\nPr = cp_l*mu_l/k_l' },
    `h = wavy.Nu*k_l/cbrt(nu_l^2/g)
Q = h*pi*D*L*(T_sat - T_s)
m_dot = Q/h_fgp`,
  ],
  answers: {
    'laminar.h': { printed: '4094 W/(m^2 K)', within: 2e-4, because: 'four printed figures' },
    h_Re: { printed: '5285 W/(m^2 K)', within: 3e-3, because: 'the root of the two, to the figures of the book' },
    h: { printed: '5285 W/(m^2 K)', within: 3e-3, because: 'the root of the two, to the figures of the book' },
    Q: { printed: '66.4 kW', within: 3e-3, because: 'as h' },
    m_dot: { printed: '0.0276 kg/s', within: 4e-3, because: 'as h' },
  },
  // Re about 1 200: the film is wavy, the laminar relation must say so.
  grades: { laminar: 'outside' },
});
