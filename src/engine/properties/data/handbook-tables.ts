import type { MaterialTable } from '../tables/types';

const sources = [
  'Handbook table of the kind of Incropera, DeWitt, Bergman, Lavine, Fundamentals of Heat and Mass Transfer, appendix A; not compared with a second source',
];

/** Liquids of handbook tables. */
export const handbookLiquids: readonly MaterialTable[] = [
  {
    id: 'engine_oil_unused',
    name: 'Engine oil, unused',
    word: 'unused engine oil',
    aliases: ['engine oil', 'lubricating oil'],
    phase: 'liquid',
    formulation: 'handbook table',
    sources,
    range: '7 to 127 °C',
    temperature: [280, 400],
    columns: {
      rho: {
        T: [280, 290, 300, 310, 320, 330, 340, 350, 360, 370, 380, 390, 400],
        values: [895.3, 890, 884.1, 877.9, 871.8, 865.8, 859.9, 853.9, 847.8, 841.8, 836, 830.6, 825.1],
      },
      cp: {
        T: [280, 290, 300, 310, 320, 330, 340, 350, 360, 370, 380, 390, 400],
        values: [1827, 1868, 1909, 1951, 1993, 2035, 2076, 2118, 2161, 2206, 2250, 2294, 2337],
      },
      mu: {
        T: [280, 290, 300, 310, 320, 330, 340, 350, 360, 370, 380, 390, 400],
        values: [2.17, 0.999, 0.486, 0.253, 0.141, 0.0836, 0.0531, 0.0356, 0.0252, 0.0186, 0.0141, 0.011, 0.00874],
        logarithmic: true,
      },
      k: {
        T: [280, 290, 300, 310, 320, 330, 340, 350, 360, 370, 380, 390, 400],
        values: [0.144, 0.145, 0.145, 0.145, 0.143, 0.141, 0.139, 0.138, 0.138, 0.137, 0.136, 0.135, 0.134],
      },
    },
    uncertainty: { rho: '0.5 %', cp: '1 %', mu: '5 %, and more between oils', k: '2 %' },
  },
  {
    id: 'mercury',
    name: 'Mercury (liquid)',
    word: 'mercury',
    aliases: ['Hg'],
    phase: 'liquid',
    formulation: 'handbook table',
    sources,
    range: '0 to 327 °C',
    temperature: [273, 600],
    columns: {
      rho: {
        T: [273, 300, 350, 400, 450, 500, 550, 600],
        values: [13595, 13529, 13407, 13287, 13167, 13048, 12929, 12809],
      },
      cp: {
        T: [273, 300, 350, 400, 450, 500, 550, 600],
        values: [140.4, 139.3, 137.7, 136.5, 135.7, 135.3, 135.2, 135.5],
      },
      mu: {
        T: [273, 300, 350, 400, 450, 500, 550, 600],
        values: [0.001688, 0.001523, 0.001309, 0.001171, 0.001075, 0.001007, 0.000953, 0.000911],
        logarithmic: true,
      },
      k: { T: [273, 300, 350, 400, 450, 500, 550, 600], values: [8.18, 8.54, 9.18, 9.8, 10.4, 10.95, 11.45, 11.95] },
    },
    freezing: 234.32,
    uncertainty: { rho: '0.2 %', cp: '0.5 %', mu: '2 %', k: '2 %' },
  },
  {
    id: 'NaK_22_78',
    name: 'Sodium-potassium alloy, 22 % Na',
    word: 'sodium-potassium alloy of 22 % sodium',
    aliases: ['NaK eutectic', 'NaK-78', 'NaK'],
    phase: 'liquid',
    formulation: 'handbook table',
    sources,
    range: '93 to 399 °C',
    temperature: [366, 672],
    columns: {
      rho: { T: [366, 672], values: [849, 775.3] },
      cp: { T: [366, 672], values: [946, 879] },
      mu: { T: [366, 672], values: [0.0004922, 0.0002067], logarithmic: true },
      k: { T: [366, 672], values: [24.4, 26.7] },
    },
    uncertainty: { rho: '1 %', cp: '2 %', mu: '4 %', k: '4 %' },
  },
  {
    id: 'NaK_45_55',
    name: 'Sodium-potassium alloy, 45 % Na',
    word: 'sodium-potassium alloy of 45 % sodium',
    aliases: ['NaK-55'],
    phase: 'liquid',
    formulation: 'handbook table',
    sources,
    range: '93 to 704 °C',
    temperature: [366, 977],
    columns: {
      rho: { T: [366, 644, 977], values: [887.4, 821.7, 740.1] },
      cp: { T: [366, 644, 977], values: [1130, 1055, 1043] },
      mu: { T: [366, 644, 977], values: [0.0005788, 0.0002359, 0.0001609], logarithmic: true },
      k: { T: [366, 644, 977], values: [25.6, 27.5, 28.9] },
    },
    uncertainty: { rho: '1 %', cp: '2 %', mu: '4 %', k: '4 %' },
  },
];

/** Alloys and metals of handbook tables. */
export const handbookSolids: readonly MaterialTable[] = [
  {
    id: 'carbon_steel_plain',
    name: 'Carbon steel, plain',
    word: 'plain carbon steel',
    aliases: ['carbon steel'],
    phase: 'solid',
    formulation: 'handbook table',
    sources,
    range: '27 to 727 °C',
    temperature: [300, 1000],
    columns: {
      rho: { T: [300], values: [7854] },
      cp: { T: [300, 400, 600, 800, 1000], values: [434, 487, 559, 685, 1169] },
      k: { T: [300, 400, 600, 800, 1000], values: [60.5, 56.7, 48, 39.2, 30] },
    },
    uncertainty: { rho: '1 % at 300 K', cp: '3 %', k: '5 %' },
  },
  {
    id: 'stainless_304',
    name: 'Stainless steel AISI 304',
    word: 'stainless steel 304',
    aliases: ['AISI 304', '1.4301'],
    phase: 'solid',
    formulation: 'handbook table',
    sources,
    range: '27 to 927 °C',
    temperature: [300, 1200],
    columns: {
      rho: { T: [300], values: [7900] },
      cp: { T: [300, 400, 600, 800, 1000, 1200], values: [477, 515, 557, 582, 611, 640] },
      k: { T: [300, 400, 600, 800, 1000, 1200], values: [14.9, 16.6, 19.8, 22.6, 25.4, 28] },
    },
    uncertainty: { rho: '1 % at 300 K', cp: '3 %', k: '5 %' },
  },
  {
    id: 'stainless_316',
    name: 'Stainless steel AISI 316',
    word: 'stainless steel 316',
    aliases: ['AISI 316', '1.4401'],
    phase: 'solid',
    formulation: 'handbook table',
    sources,
    range: '27 to 727 °C',
    temperature: [300, 1000],
    columns: {
      rho: { T: [300], values: [8238] },
      cp: { T: [300, 400, 600, 800, 1000], values: [468, 504, 550, 576, 602] },
      k: { T: [300, 400, 600, 800, 1000], values: [13.4, 15.2, 18.3, 21.3, 24.2] },
    },
    uncertainty: { rho: '1 % at 300 K', cp: '3 %', k: '5 %' },
  },
  {
    id: 'titanium',
    name: 'Titanium, pure',
    word: 'pure titanium',
    aliases: ['Ti'],
    phase: 'solid',
    formulation: 'handbook table',
    sources,
    range: '27 to 727 °C',
    temperature: [300, 1000],
    columns: {
      rho: { T: [300], values: [4500] },
      cp: { T: [300, 400, 600, 800, 1000], values: [522, 551, 591, 633, 675] },
      k: { T: [300, 400, 600, 800, 1000], values: [21.9, 20.4, 19.4, 19.7, 20.7] },
    },
    uncertainty: { rho: '1 % at 300 K', cp: '3 %', k: '5 %' },
  },
];
