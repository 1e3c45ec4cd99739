import { describeExample } from '../../helpers/worked-example';

describeExample({
  title: 'Laminar water in a solar absorber tube with constant flux',
  source: 'Incropera & DeWitt, Fundamentals of Heat and Mass Transfer, Example 8.4',
  cells: [
    `D = 60 mm
m_dot = 0.01 kg/s
q = 2000 W/m^2
T_i = 20 degC
T_o = 80 degC`,
    `cp = 4181 J/(kg K)  # water at 323 K
mu = 352e-6 Pa s  # at 353 K
k = 0.670 W/(m K)
Pr = 2.2`,
    `L = m_dot*cp*(T_o - T_i)/(pi*D*q)
Re = 4*m_dot/(pi*D*mu)`,
    { name: 'tube', relation: 'laminar-tube-const-flux', lines: 'Re = Re\nPr = Pr\nL = L\nD = D' },
    `h = tube.Nu*k/D
T_s = T_o + q/h`,
  ],
  answers: {
    L: { printed: '6.65 m', within: 7e-4, because: 'three printed figures' },
    Re: '603',
    h: { printed: '48.7 W/(m^2 K)', within: 1e-3, because: 'three printed figures' },
    T_s: '121 degC',
  },
});

describeExample({
  title: 'Turbulent air in a tube with constant flux',
  source: 'Holman, Heat Transfer, Example 6-1',
  cells: [
    `D = 2.54 cm
V = 10 m/s
L = 3 m
dT_w = 20 K  # wall above air, everywhere`,
    `rho = 1.493 kg/m^3  # air at 2 atm and 200 degC
mu = 2.57e-5 Pa s
k = 0.0386 W/(m K)
Pr = 0.681
cp = 1025 J/(kg K)`,
    'Re = rho*V*D/mu',
    {
      name: 'tube',
      relation: 'dittus-boelter-heating',
      lines: 'Re = Re\nPr = Pr\nL = L\nD = D\nT_b = 200 degC\nT_s = 220 degC',
    },
    `h = tube.Nu*k/D
q_L = h*pi*D*dT_w
m_dot = rho*pi*D^2/4*V
dT_b = q_L*L/(m_dot*cp)`,
  ],
  answers: {
    Re: '14756',
    'tube.Nu': '42.67',
    h: '64.85 W/(m^2 K)',
    q_L: '103.5 W/m',
    dT_b: '40.04 K',
  },
});

describeExample({
  title: 'Laminar heating of water in a short tube',
  source: 'Holman, Heat Transfer, Example 6-2',
  cells: [
    `D = 2.54 cm
V = 2 cm/s
L = 3 m
T_i = 60 degC
T_w = 80 degC`,
    `rho = 985 kg/m^3  # water at 60 degC
cp = 4180 J/(kg K)
mu = 4.71e-4 Pa s
k = 0.651 W/(m K)
Pr = 3.02
mu_w = 3.55e-4 Pa s`,
    'Re = rho*V*D/mu',
    {
      name: 'tube',
      relation: 'sieder-tate-1936-laminar',
      lines: 'Re = Re\nPr = Pr\nD = D\nL = L\nmu = mu\nmu_w = mu_w',
    },
    `h = tube.Nu*k/D
m_dot = rho*pi*D^2/4*V
a = h*pi*D*L/(2*m_dot*cp)
T_e = T_w - (T_w - T_i)*(1 - a)/(1 + a)  # from the arithmetic mean difference`,
  ],
  answers: {
    Re: '1062',
    'tube.Nu': { printed: '5.816', within: 2e-4, because: 'the book goes on with Re = 1062' },
    h: { printed: '149.1 W/(m^2 K)', within: 4e-4, because: 'four printed figures' },
    m_dot: { printed: '9.982e-3 kg/s', within: 6e-5, because: 'four printed figures' },
    T_e: '71.98 degC',
  },
});

describeExample({
  title: 'Oil in an inclined cast-iron pipe',
  source: 'White, Fluid Mechanics, Example 6.8',
  cells: [
    `V_dot = 0.2 m^3/s
L = 500 m
D = 200 mm
eps = 0.26 mm
slope = 10 deg
rho = 900 kg/m^3
nu = 1e-5 m^2/s
g = 9.81 m/s^2`,
    `V = V_dot/(pi*D^2/4)
Re = V*D/nu`,
    { name: 'friction', relation: 'colebrook-1939', lines: 'Re = Re\neD = eps/D' },
    {
      name: 'drop',
      relation: 'darcy-weisbach',
      lines: 'f = friction.f\nL = L\nD = D\nrho = rho\nV = V',
    },
    `h_f = drop.dP/(rho*g)
dp = drop.dP - rho*g*L*sin(slope)`,
  ],
  answers: {
    V: { printed: '6.4 m/s', within: 0.0055, because: 'two printed figures' },
    Re: { printed: '128000', within: 0.0055, because: 'the book goes on with 6.4 m/s' },
    'friction.f': { printed: '0.0225', within: 0.0105, because: 'read from the chart' },
    h_f: { printed: '117 m', within: 0.0035, because: 'as f and V' },
    dp: { printed: '265000 Pa', within: 0.0175, because: 'a difference of numbers that are rounded as above' },
  },
});
