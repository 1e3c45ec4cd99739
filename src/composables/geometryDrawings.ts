import type { Geometry } from '#engine';

/** Line drawings of geometry and flow on a ground of 120 by 70: outline, hatch, chain line, arrows. */
export interface GeometryLines {
  outline: string;
  circles?: readonly (readonly [x: number, y: number, r: number])[];
  hatch?: string;
  chain?: string;
  thin?: string;
  arrows?: readonly (readonly [from: number, to: number, y: number])[];
}

/** Section hatching of a horizontal wall between two heights. */
function hatched(from: number, to: number, top: number, bottom: number): string {
  const run = bottom - top;
  let path = '';
  for (let x = from; x < to; x += 5) {
    const end = Math.min(x + run, to);
    path += `M${x} ${bottom}L${end} ${bottom - (end - x)}`;
  }
  return path;
}

/** Section hatching of an upright wall between two sides. */
function hatchedUpright(left: number, right: number, from: number, to: number): string {
  let path = '';
  for (let y = from; y < to; y += 5) path += `M${left} ${y + 5}L${right} ${y}`;
  return path;
}

const axis = 'M4 35H116';
const along: GeometryLines['arrows'] = [
  [22, 52, 27],
  [22, 60, 35],
  [22, 52, 43],
];

const tube: GeometryLines = {
  outline: 'M14 14H106M14 19H106M14 51H106M14 56H106M14 14V19M14 51V56M106 14V19M106 51V56',
  hatch: hatched(14, 106, 14, 19) + hatched(14, 106, 51, 56),
  chain: axis,
  arrows: along,
};
const bank: GeometryLines = {
  outline: '',
  circles: [
    [40, 17, 6],
    [40, 35, 6],
    [40, 53, 6],
    [62, 26, 6],
    [62, 44, 6],
    [84, 17, 6],
    [84, 35, 6],
    [84, 53, 6],
  ],
  chain: 'M40 6V64M62 6V64M84 6V64',
  arrows: [
    [4, 26, 26],
    [4, 26, 44],
    [98, 118, 35],
  ],
};

export const geometryLines: Readonly<Record<Geometry, GeometryLines>> = {
  tube,
  annulus: {
    outline: 'M14 8H106M14 13H106M14 57H106M14 62H106M14 27H106M14 31H106M14 39H106M14 43H106',
    hatch: hatched(14, 106, 8, 13) + hatched(14, 106, 57, 62) + hatched(14, 106, 27, 31) + hatched(14, 106, 39, 43),
    chain: axis,
    arrows: [
      [24, 60, 20],
      [24, 60, 50],
    ],
  },
  duct: {
    outline: 'M14 12H106V18H14ZM14 52H106V58H14Z',
    hatch: hatched(14, 106, 12, 18) + hatched(14, 106, 52, 58),
    thin: 'M98 18V52M95.5 23 98 18 100.5 23M95.5 47 98 52 100.5 47',
    arrows: [
      [20, 54, 27],
      [20, 62, 35],
      [20, 54, 43],
    ],
  },
  plate: {
    outline: 'M20 48H110V54H20Z',
    hatch: hatched(20, 110, 48, 54),
    thin: 'M20 48C34 34 66 27 108 23',
    arrows: [
      [4, 34, 14],
      [4, 26, 26],
      [4, 18, 38],
    ],
  },
  cylinder: {
    outline: '',
    circles: [
      [62, 35, 14],
      [62, 35, 10.5],
    ],
    chain: 'M40 35H84M62 13V57',
    thin: 'M4 13C40 13 44 12 62 11 84 10 96 13 116 13M4 24C34 24 40 20 50 18 62 15 74 17 82 22 92 27 104 24 116 24M4 46C34 46 40 50 50 52 62 55 74 53 82 48 92 43 104 46 116 46M4 57C40 57 44 58 62 59 84 60 96 57 116 57',
  },
  sphere: {
    outline: '',
    circles: [[62, 35, 15]],
    chain: 'M47 35A15 5 0 0 1 77 35',
    thin: 'M47 35A15 5 0 0 0 77 35M4 12C40 12 46 11 62 11 82 11 96 12 116 13M4 58C40 58 46 59 62 59 82 59 96 58 116 57',
    arrows: [[4, 40, 35]],
  },
  'bluff body': {
    outline: 'M50 22H76V48H50Z',
    hatch: hatched(50, 76, 22, 48).replace(/M7[1-9] 48[^M]*/g, ''),
    thin: 'M4 10C40 10 44 8 62 8 84 8 96 12 116 12M4 60C40 60 44 62 62 62 84 62 96 58 116 58M82 26c8 -4 12 4 4 6M84 44c8 4 14 -2 6 -6',
    arrows: [[4, 40, 35]],
  },
  'tube bank': bank,
  'finned bank': {
    ...bank,
    outline: 'M32 8V62M48 8V62M54 8V62M70 8V62M76 8V62M92 8V62',
  },
  'packed bed': {
    outline: 'M20 12H100M20 58H100',
    circles: [
      [32, 20, 7],
      [47, 21, 7],
      [62, 20, 7],
      [77, 21, 7],
      [92, 20, 7],
      [39, 35, 7],
      [54, 35, 7],
      [69, 35, 7],
      [84, 35, 7],
      [32, 50, 7],
      [47, 49, 7],
      [62, 50, 7],
      [77, 49, 7],
      [92, 50, 7],
    ],
    arrows: [[2, 20, 35]],
  },
  jet: {
    outline: 'M10 56H110V62H10ZM52 4V20M68 4V20',
    hatch: hatched(10, 110, 56, 62),
    thin: 'M54 20C54 40 44 50 16 52M66 20C66 40 76 50 104 52M60 20V50M57 44 60 50 63 44',
  },
  coil: {
    outline:
      'M10 20H24C34 20 34 56 44 56S48 16 58 16 62 56 72 56 76 16 86 16 88 50 98 50H112M10 27H21C29 27 30 63 44 63S55 23 58 23 60 63 72 63 83 23 86 23 86 57 98 57H112',
    chain: 'M4 39H116',
    arrows: [[0, 14, 23.5]],
  },
  enclosure: {
    outline: 'M24 10H96V60H24ZM30 16H90V54H30Z',
    hatch: hatchedUpright(24, 30, 12, 56) + hatchedUpright(90, 96, 12, 56),
    thin: 'M40 46V24H80V46ZM37 32 40 25 43 32M77 38 80 45 83 38',
  },
  channel: {
    outline: 'M40 6V64M46 6V64M74 6V64M80 6V64',
    hatch: hatchedUpright(40, 46, 6, 60) + hatchedUpright(74, 80, 6, 60),
    thin: 'M54 60V30M51 37 54 30 57 37M60 60V20M57 27 60 20 63 27M66 60V30M63 37 66 30 69 37',
  },
  fin: {
    outline: 'M14 6H22V64H14ZM22 30H104V40H22Z',
    hatch: hatchedUpright(14, 22, 8, 60),
    thin: 'M22 18C50 20 70 24 106 25',
    chain: 'M10 35H114',
  },
  exchanger: {
    outline: 'M22 16H98V54H22ZM22 16C10 16 10 54 22 54M98 16C110 16 110 54 98 54',
    thin: 'M22 26H98M22 35H98M22 44H98M40 16V44M60 26V54M80 16V44M34 4V16M86 54V66',
    chain: 'M4 35H116',
  },
  wall: {
    outline: 'M46 6V64M74 6V64',
    hatch: hatchedUpright(46, 74, 6, 40) + 'M52 64L74 45M62 64L74 54',
    thin: 'M8 18H28C40 18 42 22 46 28L74 44C78 50 82 54 96 54H112',
  },
  surface: {
    outline: 'M10 50H110V56H10Z',
    hatch: hatched(10, 110, 50, 56),
    circles: [
      [36, 38, 5],
      [58, 30, 7],
      [80, 40, 4],
      [66, 44, 3],
    ],
    thin: 'M10 16C20 12 26 20 36 16S52 12 62 16 78 20 88 16 104 12 110 16',
  },
  fitting: {
    outline: 'M10 30H60C72 30 78 36 78 48V66M10 44H56C62 44 64 46 64 52V66',
    chain: 'M4 37H58C68 37 71 42 71 50V68',
    arrows: [[14, 44, 37]],
  },
  any: {
    outline: 'M20 50H100V56H20Z',
    hatch: hatched(20, 100, 50, 56),
    thin: 'M40 44V20M37 27 40 20 43 27M60 44V20M57 27 60 20 63 27M80 44V20M77 27 80 20 83 27',
  },
};
