import { describeExample } from '../../helpers/worked-example';

const incropera = 'Incropera & DeWitt, Fundamentals of Heat and Mass Transfer';
const cengel = 'Cengel, Heat and Mass Transfer';

describeExample({
  title: 'Glass fire screen',
  source: `${incropera}, Example 9.2`,
  cells: [
    `H = 0.71 m
W = 1.02 m
T_s = 232 degC
T_inf = 23 degC`,
    `k = 33.8e-3 W/(m K)  # air at the film temperature 400 K
nu = 26.4e-6 m^2/s
alpha = 38.3e-6 m^2/s
Pr = 0.690
beta = 0.0025 1/K`,
    {
      name: 'group',
      relation: 'rayleigh-number',
      lines: 'g = 9.8 m/s^2\nbeta = beta\ndT = T_s - T_inf\nL = H\nnu = nu\nalpha = alpha',
    },
    { name: 'plate', relation: 'churchill-chu-1975-plate', lines: 'Ra = group.Ra\nPr = Pr' },
    `h = plate.Nu*k/H
Q = h*H*W*(T_s - T_inf)`,
  ],
  answers: {
    'group.Ra': '1.813e9',
    'plate.Nu': '147',
    h: { printed: '7.0 W/(m^2 K)', within: 1e-3, because: 'exact within 7.00' },
    Q: '1060 W',
  },
});

describeExample({
  title: 'Steam tube in a concentric radiation shield',
  source: `${incropera}, Example 9.5`,
  cells: [
    `D_i = 0.1 m
D_o = 0.12 m
T_i = 120 degC
T_o = 35 degC`,
    `k = 0.030 W/(m K)  # air at 350 K
nu = 20.92e-6 m^2/s
alpha = 29.9e-6 m^2/s
Pr = 0.70
beta = 0.00285 1/K
g = 9.8 m/s^2`,
    {
      name: 'gap',
      relation: 'raithby-hollands-1975-annulus',
      lines: 'RaL3 = g*beta*(T_i - T_o)/(nu*alpha)\nPr = Pr\nr_i = D_i/2\nr_o = D_o/2',
    },
    `k_eff = gap.keff*k
q_L = 2*pi*k_eff*(T_i - T_o)/ln(D_o/D_i)`,
  ],
  answers: {
    'gap.Rc': '171',
    k_eff: { printed: '0.0343 W/(m K)', within: 1e-3, because: 'three printed figures' },
    q_L: { printed: '100 W/m', within: 0.004, because: 'three printed figures of 100.4' },
  },
});

describeExample({
  title: 'Square plate in three positions',
  source: `${cengel}, Example 9-2`,
  cells: [
    `L = 0.6 m
T_s = 90 degC
T_inf = 30 degC
A = L^2
L_c = A/(4*L)  # area over perimeter`,
    `k = 0.02808 W/(m K)  # air at the film temperature 60 degC
Pr = 0.7202
nu = 1.896e-5 m^2/s
beta = 1/(333 K)
Ra = 9.81 m/s^2 * beta*(T_s - T_inf)*L^3/nu^2*Pr
Ra_h = Ra*(L_c/L)^3`,
    { name: 'wall', relation: 'churchill-chu-1975-plate', lines: 'Ra = Ra\nPr = Pr' },
    { name: 'up', relation: 'mcadams-horizontal-hot-up-laminar', lines: 'Ra = Ra_h\nPr = Pr' },
    { name: 'down', relation: 'mcadams-horizontal-hot-down', lines: 'Ra = Ra_h' },
    `h = wall.Nu*k/L
Q = h*A*(T_s - T_inf)
Q_up = up.Nu*k/L_c*A*(T_s - T_inf)
Q_down = down.Nu*k/L_c*A*(T_s - T_inf)`,
  ],
  answers: {
    Ra: { printed: '7.656e8', within: 1e-3, because: 'the book rounds beta' },
    'wall.Nu': { printed: '113.4', within: 6e-4, because: 'as Ra' },
    h: { printed: '5.306 W/(m^2 K)', within: 4e-4, because: 'as Ra' },
    Q: '115 W',
    Ra_h: { printed: '1.196e7', within: 1e-3, because: 'as Ra' },
    'up.Nu': { printed: '31.76', within: 4e-4, because: 'as Ra' },
    Q_up: '128 W',
    'down.Nu': { printed: '15.86', within: 1e-3, because: 'as Ra' },
    Q_down: '64.2 W',
  },
  // Ra 1.196e7 exceeds the stated 1e7 of the laminar form: the sheet must say so.
  grades: { up: 'outside' },
});

describeExample({
  title: 'Heat loss through a double-pane window',
  source: `${cengel}, Example 9-4`,
  cells: [
    `H = 0.8 m
W = 2 m
L = 2 cm
T_1 = 12 degC
T_2 = 2 degC`,
    `k = 0.02416 W/(m K)  # air at 7 degC
Pr = 0.7344
nu = 1.4e-5 m^2/s
Ra = 9.81 m/s^2 /(280 K)*(T_1 - T_2)*L^3/nu^2*Pr`,
    { name: 'gap', relation: 'macgregor-emery-1969-tall', lines: 'Ra = Ra\nPr = Pr\nH = H\nL = L' },
    `h = gap.Nu*k/L
Q = h*H*W*(T_1 - T_2)`,
  ],
  answers: {
    Ra: { printed: '1.050e4', within: 5e-4, because: 'four printed figures' },
    'gap.Nu': { printed: '1.40', within: 1e-3, because: 'three printed figures' },
    h: { printed: '1.69 W/(m^2 K)', within: 1.3e-3, because: 'the book goes on with Nu = 1.40' },
    Q: { printed: '27.1 W', within: 1.1e-3, because: 'as h' },
  },
  // Pr 0.73 where the relation has 1 to 20.
  grades: { gap: 'outside' },
});
