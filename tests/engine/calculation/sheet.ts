import {
  defaultSettings,
  evaluateCalculation,
  type CalculationResult,
  type CalculationSettings,
  type CellInput,
  type CellResult,
  type Diagnostic,
  type LineResult,
} from '#engine';

/** A cell of expressions. */
export function lines(id: string, source: string): CellInput {
  return { id, kind: 'expressions', source, settings: {} };
}

export function sheet(cells: readonly CellInput[], settings: Partial<CalculationSettings> = {}): CalculationResult {
  return evaluateCalculation({ settings: { ...defaultSettings, ...settings }, cells });
}

/** The result of one cell of expressions by itself. */
export function cellOf(source: string, settings: Partial<CalculationSettings> = {}): CellResult {
  const { cells } = sheet([lines('c', source)], settings);
  if (cells.c === undefined) throw new Error('no cell');
  return cells.c;
}

export function lineOf(cell: CellResult, name: string): LineResult {
  const line = cell.lines.find((one) => one.name === name);
  if (line === undefined) throw new Error(`no line ${name}`);
  return line;
}

/** The last line of a source, computed. */
export function last(source: string, settings: Partial<CalculationSettings> = {}): LineResult {
  const line = cellOf(source, settings).lines.at(-1);
  if (line === undefined) throw new Error('no line');
  return line;
}

/** SI value of the last line; throws with its problems when it has none. */
export function valueOf(source: string, settings: Partial<CalculationSettings> = {}): number {
  const line = last(source, settings);
  if (typeof line.value?.si !== 'number') throw new Error(`no value: ${JSON.stringify(line.diagnostics)}`);
  return line.value.si;
}

/** Figure and unit of the last line, as the sheet shows them. */
export function shownOf(source: string, settings: Partial<CalculationSettings> = {}): string {
  const { value } = last(source, settings);
  return value === undefined ? '' : `${value.text} ${value.unit}`.trim().replace(/\u00a0/g, ' ');
}

/** Problems of the last line. */
export function problems(source: string, settings: Partial<CalculationSettings> = {}): Diagnostic[] {
  return last(source, settings).diagnostics;
}

export function codes(source: string, settings: Partial<CalculationSettings> = {}): string[] {
  return problems(source, settings).map(({ code }) => code);
}

/** What the span of a problem covers. */
export function pointedAt(source: string, diagnostic: Diagnostic | undefined): string {
  return source.slice(diagnostic?.span?.from, diagnostic?.span?.to);
}
