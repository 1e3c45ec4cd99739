import type { ValidityResult } from '#engine';

/** Where the parts of a validity gauge lie, in the units of its drawing. */
export interface GaugeDrawing {
  /** The stated range as a bar; absent when no limit is stated. */
  bar?: { x: number; width: number };
  segments: { x: number; width: number; upper: boolean }[];
  /** Ends with a limit; an open end has an arrow. */
  ends: number[];
  arrowLeft: boolean;
  arrowRight: boolean;
  /** Where the case lies; absent when it is not known. */
  point?: number;
  /** Between the nearest limit and a case outside the range. */
  hatch?: { x: number; width: number };
  labels: { x: number; text: string; anchor: 'start' | 'middle' | 'end' }[];
}

type Limits = Pick<ValidityResult, 'value' | 'low' | 'high' | 'scale' | 'grade'>;

/** Room at both ends of the axis. */
const margin = 8;
/** Labels nearer than this would run into each other. */
const labelRoom = 56;

/** A limit as it stands under the bar: `10 000`, `5·10⁶`, `0.7`. */
export function limitText(limit: number): string {
  const size = Math.abs(limit);
  if (size >= 1e6 || (size > 0 && size < 1e-3)) {
    const [mantissa = '1', power = '0'] = limit.toExponential().split('e');
    const raised = [...String(Number(power))].map((sign) => '⁻⁰¹²³⁴⁵⁶⁷⁸⁹'['-0123456789'.indexOf(sign)]).join('');
    return mantissa === '1' ? `10${raised}` : `${mantissa}·10${raised}`;
  }
  const [whole = '', decimals] = String(limit).replace('-', '−').split('.');
  const parted = whole.replace(/\B(?=(\d{3})+(?!\d))/g, '\u00a0');
  return decimals === undefined ? parted : `${parted}.${decimals}`;
}

interface Axis {
  from: number;
  to: number;
  at(value: number): number;
  steps(low: number, high: number): number[];
}

function spread(values: readonly number[], least: number): { from: number; to: number } {
  const low = Math.min(...values);
  const high = Math.max(...values);
  const room = Math.max((high - low) * 0.35, least);
  return { from: low - room, to: high + room };
}

/** Figures 1, 2, 5 of every decade; whole decades where that would be too fine. */
function logSteps(low: number, high: number): number[] {
  const decades = high - low;
  const figures = decades > 4 ? [1] : [1, 2, 5];
  const steps: number[] = [];
  for (let power = Math.floor(low) - 1; power <= Math.ceil(high); power += 1) {
    for (const figure of figures) steps.push(power + Math.log10(figure));
  }
  return steps;
}

function linearSteps(low: number, high: number): number[] {
  const raw = (high - low) / 6;
  if (!(raw > 0)) return [];
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 5, 10].map((figure) => figure * power).find((each) => each >= raw) ?? raw;
  const steps: number[] = [];
  // Counted, not added up: a step below the last bit of the ends would never reach the high one.
  const first = Math.ceil(low / step);
  for (let index = 0; index < 10 && (first + index) * step < high; index += 1) steps.push((first + index) * step);
  return steps;
}

function axisOf(values: readonly number[], log: boolean, width: number): Axis {
  const place = (value: number) => (log ? Math.log10(value) : value);
  const placed = values.map(place);
  const scale = Math.max(...placed.map(Math.abs), log ? 0 : 1e-12);
  const { from, to } = spread(placed, log ? 0.45 : scale * 0.2);
  const start = !log && Math.min(...values) >= 0 ? Math.max(0, from) : from;
  return {
    from: start,
    to,
    at: (value) => margin + ((place(value) - start) / (to - start)) * (width - 2 * margin),
    steps: (low, high) => (log ? logSteps(low, high) : linearSteps(low, high)),
  };
}

function checkers(axis: Axis, log: boolean, low: number, high: number, toX: (placed: number) => number) {
  const inner = axis.steps(low, high).filter((step) => step > low && step < high);
  const edges = [low, ...inner, high];
  return edges.slice(1).map((edge, index) => {
    const x = toX(edges[index] ?? low);
    return { x, width: toX(edge) - x, upper: index % 2 === 0 };
  });
}

function labelsOf(low: number | undefined, high: number | undefined, at: (value: number) => number) {
  const xLow = low === undefined ? undefined : at(low);
  const xHigh = high === undefined ? undefined : at(high);
  const near = xLow !== undefined && xHigh !== undefined && xHigh - xLow < labelRoom;
  const labels: GaugeDrawing['labels'] = [];
  if (low !== undefined && xLow !== undefined)
    labels.push({ x: xLow, text: limitText(low), anchor: near ? 'end' : 'middle' });
  if (high !== undefined && xHigh !== undefined)
    labels.push({ x: xHigh, text: limitText(high), anchor: near ? 'start' : 'middle' });
  return labels;
}

/** Lays the gauge on `width`: an alternating bar for the stated range, a pointer for the case. */
export function layGauge(limits: Limits, width: number): GaugeDrawing {
  const { low, high, value } = limits;
  const known = [low, high, value].filter((each): each is number => each !== undefined && Number.isFinite(each));
  const empty: GaugeDrawing = { segments: [], ends: [], arrowLeft: false, arrowRight: false, labels: [] };
  if (known.length === 0) return empty;
  const log = limits.scale === 'log' && known.every((each) => each > 0);
  const axis = axisOf(known, log, width);
  const toX = (placed: number) => margin + ((placed - axis.from) / (axis.to - axis.from)) * (width - 2 * margin);
  const point = value === undefined || !Number.isFinite(value) ? {} : { point: axis.at(value) };
  if (low === undefined && high === undefined) return { ...empty, ...point };
  const xLow = low === undefined ? margin : axis.at(low);
  const xHigh = high === undefined ? width - margin : axis.at(high);
  const placed = (limit: number | undefined, open: number) =>
    limit === undefined ? open : log ? Math.log10(limit) : limit;
  return {
    bar: { x: xLow, width: Math.max(xHigh - xLow, 1) },
    segments: checkers(axis, log, placed(low, axis.from), placed(high, axis.to), toX),
    ends: [...(low === undefined ? [] : [xLow]), ...(high === undefined ? [] : [xHigh])],
    arrowLeft: low === undefined,
    arrowRight: high === undefined,
    labels: labelsOf(low, high, axis.at),
    ...point,
    ...hatchOf(limits, axis.at),
  };
}

function hatchOf(
  { low, high, value }: Limits,
  at: (value: number) => number,
): { hatch?: { x: number; width: number } } {
  if (value === undefined || !Number.isFinite(value)) return {};
  if (low !== undefined && value < low) return { hatch: { x: at(value), width: at(low) - at(value) } };
  if (high !== undefined && value > high) return { hatch: { x: at(high), width: at(value) - at(high) } };
  return {};
}

/** `10 000 to 120 000`, `60 and over`, `up to 2 300`. */
export function rangeWords({ low, high, message }: Pick<ValidityResult, 'low' | 'high' | 'message'>): string {
  if (low === undefined && high === undefined) return message;
  if (low === undefined) return `up to ${limitText(high ?? 0)}`;
  return high === undefined ? `${limitText(low)} and over` : `${limitText(low)} to ${limitText(high)}`;
}

/** The gauge in a sentence, for readers' software. */
export function gaugeSentence(validity: ValidityResult): string {
  const { low, high, valueText, message, condition } = validity;
  if (low === undefined && high === undefined) return `${condition}: ${message}`;
  return `Case ${valueText ?? 'not known'}, stated range ${rangeWords(validity)}: ${message}`;
}
