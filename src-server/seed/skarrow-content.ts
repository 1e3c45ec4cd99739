import type { CellInput } from '#engine';
import type { ExchangeCalculation } from '#document';

const section = (id: string, source: string): CellInput => ({ id, kind: 'section', source, settings: {} });
const text = (id: string, source: string): CellInput => ({ id, kind: 'text', source, settings: {} });
const lines = (id: string, ...source: string[]): CellInput => ({
  id,
  kind: 'expressions',
  source: source.join('\n'),
  settings: {},
});

const calculation = (title: string, cells: CellInput[]): ExchangeCalculation => ({
  format: 'wallflux-calculation',
  version: 1,
  title,
  settings: { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 },
  cells,
});

export const hotWaterRing = calculation('Hot-water ring, film coefficient in the heating coil', [
  section('s1', 'Purpose'),
  text(
    'c11',
    'The coil of vat 3 is fed from the hot-water ring. Shown is the film coefficient inside the coil tube, with {{T_w}} in the ring.',
  ),
  section('s2', 'Givens'),
  lines(
    'c21',
    'T_w = 82 degC  # ring, mean of feed and return',
    'D = 21.6 mm  # tube 25 x 1.7',
    'L = 18 m  # one length of the coil',
    'V_dot = 1.6 m^3/h  # balancing valve, setting 3',
  ),
  { id: 'c22', kind: 'fluid', source: 'T = T_w\np = 3 bar', settings: { name: 'w', substance: 'water' } },
  section('s3', 'Film coefficient'),
  lines('c31', 'u = 4*V_dot/(pi*D^2)', 'Re = w.rho*u*D/w.mu'),
  {
    id: 'c32',
    kind: 'relation',
    source: 'Re = Re\nPr = w.Pr\nL = L\nD = D\nh_i = tube.Nu*w.k/D',
    settings: { name: 'tube', relation: 'gnielinski-1976-tube' },
  },
  lines('c33', 'require u <= 2 m/s  # against noise in the dairy hall'),
]);

export const milkTank = calculation('Cold-milk tank, heat gain through the insulation', [
  section('s1', 'Purpose'),
  text(
    'c11',
    'Tank 2 holds milk over a weekend without cooling. Shown is its rise in temperature; the films are neglected against the insulation, which errs on the safe side.',
  ),
  section('s2', 'Givens'),
  lines(
    'c21',
    'A = 38 m^2  # shell and both heads, drawing SK-T2',
    's = 80 mm  # foam',
    'T_a = 27 degC  # hall, hottest day on record',
    'T_m = 4 degC  # milk, at the start',
    'm = 24600 kg',
    'c_p = 3.93 kJ/(kg K)  # whole milk',
  ),
  { ...lines('c22', 'k = 0.027 W/(m K)'), settings: { tbv: 'Conductivity of the aged foam, asked from the maker' } },
  section('s3', 'Rise over a weekend'),
  lines('c31', 'Q = k*A*(T_a - T_m)/s to W', 'dT = Q*60 h/(m*c_p)', 'require dT <= 1 K'),
]);

export const condensateCooler = calculation('Condensate cooler, duty and water flow', [
  section('s1', 'Givens'),
  lines(
    'c11',
    'm_c = 420 kg/h  # condensate of both evaporators',
    'T_1 = 96 degC',
    'T_2 = 45 degC  # limit of the drain',
    'T_in = 14 degC  # well water, summer',
    'T_out = 35 degC',
    'c_p = 4.19 kJ/(kg K)',
  ),
  section('s2', 'Duty'),
  lines('c21', 'Q = m_c*c_p*(T_1 - T_2) to kW', 'm_w = Q/(c_p*(T_out - T_in)) to kg/h', 'require m_w <= 1200 kg/h'),
]);
