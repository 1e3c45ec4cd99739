import { describeExample } from '../../helpers/worked-example';

const incropera = 'Incropera & DeWitt, Fundamentals of Heat and Mass Transfer';
const cengel = 'Cengel, Heat and Mass Transfer';

describeExample({
  title: 'Finned-tube cross-flow exchanger',
  source: `${incropera}, Example 11.3`,
  cells: [
    `T_hi = 300 degC
T_ho = 100 degC
T_ci = 35 degC
T_co = 125 degC
C_c = 1 kg/s * 4197 J/(kg K)
U = 100 W/(m^2 K)`,
    `Q = C_c*(T_co - T_ci)
C_h = Q/(T_hi - T_ho)
eps = Q/(C_h*(T_hi - T_ci))
Cr = C_h/C_c
NTU = 2.1  # from the chart
A = NTU*C_h/U`,
    { name: 'exchanger', relation: 'eff-crossflow-unmixed', lines: 'NTU = NTU\nCr = Cr' },
  ],
  answers: {
    Q: { printed: '377.7 kW', within: 1e-4, because: 'four printed figures' },
    C_h: '1889 W/K',
    eps: { printed: '0.755', within: 5e-4, because: 'three printed figures' },
    Cr: '0.45',
    'exchanger.eff': { printed: '0.755', within: 0.02, because: 'NTU is read from a chart' },
    A: '39.7 m^2',
  },
});

describeExample({
  title: 'Steam condenser of a power plant',
  source: `${incropera}, Example 11.5`,
  cells: [
    `Q = 2e9 W
N = 30000
D = 25 mm
m_dot = 3e4 kg/s
T_i = 20 degC
T_sat = 50 degC
h_o = 11000 W/(m^2 K)`,
    `cp = 4179 J/(kg K)  # water at 300 K
mu = 855e-6 Pa s
k = 0.613 W/(m K)
Pr = 5.83`,
    `T_o = T_i + Q/(m_dot*cp)
Re = 4*(m_dot/N)/(pi*D*mu)`,
    {
      name: 'inside',
      relation: 'dittus-boelter-heating',
      lines: 'Re = Re\nPr = Pr\nL = 4.5 m\nD = D\nT_b = (T_i + T_o)/2\nT_s = 45 degC',
    },
    `h_i = inside.Nu*k/D
U = 1/(1/h_i + 1/h_o)`,
    { name: 'lm', relation: 'lmtd-counterflow', lines: 'T_hi = T_sat\nT_ho = T_sat\nT_ci = T_i\nT_co = T_o' },
    'L = Q/(U*N*2*pi*D*lm.dT)',
  ],
  answers: {
    T_o: '36.0 degC',
    Re: '59567',
    'inside.Nu': { printed: '308', within: 2e-3, because: 'three printed figures' },
    h_i: { printed: '7552 W/(m^2 K)', within: 2e-3, because: 'the book goes on with Nu = 308' },
    U: { printed: '4478 W/(m^2 K)', within: 1e-3, because: 'as h_i' },
    'lm.dT': '21 K',
    L: { printed: '4.51 m', within: 1.2e-3, because: 'three printed figures' },
  },
});

describeExample({
  title: 'Counter-flow heater with geothermal water',
  source: `${cengel}, Example 11-4`,
  cells: [
    `m_c = 1.2 kg/s
m_h = 2 kg/s
T_ci = 20 degC
T_co = 80 degC
T_hi = 160 degC
U = 640 W/(m^2 K)
D = 1.5 cm`,
    `Q = m_c*(4.18 kJ/(kg K))*(T_co - T_ci)
T_ho = T_hi - Q/(m_h*(4.31 kJ/(kg K)))`,
    { name: 'lm', relation: 'lmtd-counterflow', lines: 'T_hi = T_hi\nT_ho = T_ho\nT_ci = T_ci\nT_co = T_co' },
    `A = Q/(U*lm.dT)
L = A/(pi*D)`,
  ],
  answers: {
    Q: { printed: '301 kW', within: 2e-4, because: 'three printed figures' },
    T_ho: '125 degC',
    'lm.dT': { printed: '92.0 K', within: 5e-4, because: 'the book goes on with 125 degC' },
    A: { printed: '5.11 m^2', within: 1e-3, because: 'as the difference' },
    L: { printed: '108 m', within: 5e-3, because: 'three printed figures of 108.5' },
  },
});

describeExample({
  title: 'Oil cooler with one shell pass and eight tube passes',
  source: `${cengel}, Example 11-8`,
  cells: [
    `C_h = 0.3 kg/s * 2.13 kJ/(kg K)
C_c = 0.2 kg/s * 4.18 kJ/(kg K)
T_hi = 150 degC
T_ci = 20 degC
D = 1.4 cm
L = 5 m
U = 310 W/(m^2 K)`,
    `Q_max = C_h*(T_hi - T_ci)
A = 8*pi*D*L
NTU = U*A/C_h
Cr = C_h/C_c`,
    { name: 'cooler', relation: 'eff-shell-tube-1', lines: 'NTU = NTU\nCr = Cr' },
    `Q = cooler.eff*Q_max
T_co = T_ci + Q/C_c
T_ho = T_hi - Q/C_h`,
  ],
  answers: {
    Q_max: { printed: '83.1 kW', within: 6e-4, because: 'three printed figures' },
    A: '1.76 m^2',
    NTU: { printed: '0.854', within: 6e-4, because: 'the book goes on with 1.76 m2' },
    Cr: { printed: '0.764', within: 5e-4, because: 'three printed figures' },
    'cooler.eff': { printed: '0.47', within: 0.02, because: 'read from a chart' },
    Q: { printed: '39.1 kW', within: 0.02, because: 'as the effectiveness' },
    T_co: { printed: '66.8 degC', within: 0.015, because: 'as the effectiveness' },
    T_ho: { printed: '88.8 degC', within: 0.015, because: 'as the effectiveness' },
  },
});

describeExample({
  title: 'Automotive radiator',
  source: `${cengel}, Example 11-6`,
  cells: [
    `N = 40
D = 0.5 cm
L = 65 cm
m_dot = 0.6 kg/s
cp = 4195 J/(kg K)
F = 0.97  # from the chart`,
    `Q = m_dot*cp*(90 degC - 65 degC)
A = N*pi*D*L`,
    {
      name: 'lm',
      relation: 'lmtd-counterflow',
      lines: 'T_hi = 90 degC\nT_ho = 65 degC\nT_ci = 20 degC\nT_co = 40 degC',
    },
    'U = Q/(A*F*lm.dT)',
  ],
  answers: {
    Q: { printed: '62.93 kW', within: 1e-4, because: 'four printed figures' },
    A: { printed: '0.408 m^2', within: 1.1e-3, because: 'three printed figures' },
    'lm.dT': { printed: '47.5 K', within: 1e-3, because: 'three printed figures' },
    U: { printed: '3341 W/(m^2 K)', within: 2e-3, because: 'the book goes on with 0.408 m2 and 47.5 K' },
  },
});
