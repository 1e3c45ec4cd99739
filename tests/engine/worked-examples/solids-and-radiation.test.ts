import { describeExample } from '../../helpers/worked-example';

const incropera = 'Incropera & DeWitt, Fundamentals of Heat and Mass Transfer';

describeExample({
  title: 'Bare steam pipe',
  source: `${incropera}, Example 1.2`,
  cells: [
    `D = 70 mm
T_s = 200 degC
T_room = 25 degC
eps = 0.8
h = 15 W/(m^2 K)
sigma = 5.67e-8 W/(m^2 K^4)`,
    `E = eps*sigma*T_s^4
G = sigma*T_room^4`,
    { name: 'glow', relation: 'stefan-boltzmann-exchange', lines: 'e1 = eps\nT1 = T_s\nT2 = T_room' },
    'q_L = pi*D*(h*(T_s - T_room) + glow.q)',
  ],
  answers: {
    // The book takes 473 K and 298 K for 200 °C and 25 °C.
    E: { printed: '2270 W/m^2', within: 2e-3, because: '473 K for 473.15 K' },
    G: { printed: '447 W/m^2', within: 2.5e-3, because: '298 K for 298.15 K' },
    q_L: { printed: '998 W/m', within: 1e-3, because: 'as E' },
  },
});

describeExample({
  title: 'Thermocouple junction',
  source: `${incropera}, Example 5.1`,
  cells: [
    `k = 20 W/(m K)
c = 400 J/(kg K)
rho = 8500 kg/m^3
h = 400 W/(m^2 K)
D = 6*h*(1 s)/(rho*c)  # for a time constant of 1 s
A_s = pi*D^2
Vol = pi*D^3/6`,
    {
      name: 'lag',
      relation: 'lumped-time-constant',
      lines: 'rho = rho\nVol = Vol\ncp = c\nh = h\nA_s = A_s\nk = k',
    },
    't = lag.tau_t*ln((200 degC - 25 degC)/(200 degC - 199 degC))',
  ],
  answers: { D: '7.06e-4 m', 'lag.tau_t': '1 s', t: '5.2 s' },
});

describeExample({
  title: 'Hot oil admitted to a cold thick pipe',
  source: `${incropera}, Example 5.5`,
  cells: [
    `L = 40 mm
D = 1 m
T_i = -20 degC
T_inf = 60 degC
h = 500 W/(m^2 K)
t = 8 min`,
    `k = 63.9 W/(m K)  # steel at 300 K
alpha = 18.8e-6 m^2/s
rho = 7832 kg/m^3
c = 434 J/(kg K)`,
    { name: 'ratio', relation: 'biot-number', lines: 'h = h\nL = L\nk = k' },
    { name: 'time', relation: 'fourier-number', lines: 'alpha = alpha\nt = t\nL = L' },
    { name: 'outer', relation: 'plane-wall-one-term', lines: 'Bi = ratio.Bi\nFo = time.Fo\nx_L = 0' },
    { name: 'inner', relation: 'plane-wall-one-term', lines: 'Bi = ratio.Bi\nFo = time.Fo\nx_L = 1' },
    { name: 'share', relation: 'plane-wall-heat-fraction', lines: 'Bi = ratio.Bi\nFo = time.Fo' },
    `T_0 = T_inf + outer.th*(T_i - T_inf)
T_L = T_inf + inner.th*(T_i - T_inf)
q = h*(T_L - T_inf)
Q_L = share.Qr*rho*c*pi*D*L*(T_i - T_inf)`,
  ],
  answers: {
    'ratio.Bi': '0.313',
    'time.Fo': '5.64',
    'outer.th': { printed: '0.214', within: 0.0085, because: 'the book interpolates in its table' },
    T_0: { printed: '42.9 degC', within: 0.003, because: 'as the temperature ratio' },
    T_L: { printed: '45.2 degC', within: 0.004, because: 'as the temperature ratio' },
    q: { printed: '-7400 W/m^2', within: 0.0115, because: 'as the temperature ratio' },
    Q_L: { printed: '-2.73e7 J/m', within: 2e-3, because: 'three printed figures; heat taken up' },
  },
});

describeExample({
  title: 'Sphere cooled in air, then in water',
  source: `${incropera}, Example 5.6`,
  cells: [
    `r = 5 mm
k = 20 W/(m K)
rho = 3000 kg/m^3
c = 1000 J/(kg K)
alpha = 6.66e-6 m^2/s
t_a = rho*r*c/(3*(10 W/(m^2 K)))*ln((400 degC - 20 degC)/(335 degC - 20 degC))  # lumped, in air`,
    {
      name: 'water',
      relation: 'sphere-one-term',
      lines: 'Bi = 6000 W/(m^2 K)*r/k\nFo = 0.7936\nx_L = 0',
    },
    {
      name: 'skin',
      relation: 'sphere-one-term',
      lines: 'Bi = 6000 W/(m^2 K)*r/k\nFo = 0.7936\nx_L = 1',
    },
    `T_c = 20 degC + water.th*(335 degC - 20 degC)
T_s = 20 degC + skin.th*(335 degC - 20 degC)
t_w = 0.7936*r^2/alpha`,
  ],
  answers: {
    t_a: { printed: '94 s', within: 0.0025, because: 'two printed figures' },
    T_c: { printed: '50 degC', within: 1e-3, because: 'Fo is the root for 50 degC' },
    // The book interpolates zeta = 1.800 in its table; the root is 1.8366.
    t_w: { printed: '3.1 s', within: 0.04, because: 'zeta interpolated in the book' },
    T_s: { printed: '36 degC', within: 0.007, because: 'as zeta' },
  },
});

describeExample({
  title: 'Circular aluminium fins on a steam tube',
  source: 'Cengel, Heat and Mass Transfer, Example 3-12',
  cells: [
    `D_1 = 3 cm
D_2 = 6 cm
t = 2 mm
S = 3 mm
N = 200  # per metre
dT = 120 degC - 25 degC
h = 60 W/(m^2 K)
k = 180 W/(m K)`,
    {
      name: 'fin',
      relation: 'fin-annular-rectangular',
      lines: 'h = h\nk_f = k\nt = t\nr1 = D_1/2\nr2 = D_2/2 + t/2',
    },
    `A_fin = 2*pi*((D_2/2)^2 - (D_1/2)^2) + pi*D_2*t
Q_fin = fin.eta*h*A_fin*dT
Q_unfin = h*pi*D_1*S*dT
Q_L = N*(Q_fin + Q_unfin)  # per metre
Q_nofin = h*pi*D_1*(1 m)*dT
gain = Q_L - Q_nofin`,
  ],
  answers: {
    'fin.eta': { printed: '0.95', within: 0.015, because: 'read from a chart; a later printing has 0.96' },
    Q_fin: { printed: '25.0 W', within: 0.015, because: 'as the efficiency' },
    Q_unfin: { printed: '1.6 W', within: 0.008, because: 'two printed figures' },
    Q_L: { printed: '5320 W', within: 0.015, because: 'as the efficiency' },
    Q_nofin: { printed: '537 W', within: 5e-4, because: 'three printed figures' },
    gain: { printed: '4783 W', within: 0.017, because: 'as the efficiency' },
  },
});

describeExample({
  title: 'Radiation shield around a cryogenic tube',
  source: `${incropera}, Example 13.4`,
  cells: [
    `D_1 = 20 mm
D_2 = 50 mm
D_3 = 35 mm
L = 1 m
sigma = 5.67e-8 W/(m^2 K^4)`,
    {
      name: 'bare',
      relation: 'radiation-concentric-cylinders',
      lines: 'A1 = pi*D_1*L\ne1 = 0.02\ne2 = 0.05\nr1 = D_1/2\nr2 = D_2/2\nT1 = 77 K\nT2 = 300 K',
    },
    `R = (1 - 0.02)/(0.02*pi*D_1*L) + 1/(pi*D_1*L) + 2*(1 - 0.02)/(0.02*pi*D_3*L) + 1/(pi*D_3*L) + (1 - 0.05)/(0.05*pi*D_2*L)
Q_shield = sigma*((77 K)^4 - (300 K)^4)/R
saved = 1 - Q_shield/bare.Q`,
  ],
  answers: {
    'bare.Q': { printed: '-0.50 W', within: 0.003, because: 'two printed figures' },
    Q_shield: { printed: '-0.25 W', within: 0.008, because: 'two printed figures' },
    saved: { printed: '0.49', within: 0.012, because: 'the book divides its rounded figures' },
  },
});
