import type { Remark } from '#contract';
import type { CellResult } from '#engine';
import type { SheetCell, TickState } from './sheetContext';

export interface ContentsSection {
  id: string;
  number: string;
  title: string;
  /** One state a cell, in order. */
  states: TickState[];
  ticked: number;
}

/** Cells that a checker ticks: all but the heads of sections. */
export function tickable(cells: readonly SheetCell[]): SheetCell[] {
  return cells.filter((cell) => cell.kind !== 'section');
}

export function contentsSections(cells: readonly SheetCell[], stateOf: (id: string) => TickState): ContentsSection[] {
  const sections: ContentsSection[] = [];
  for (const cell of cells) {
    if (cell.kind === 'section') {
      sections.push({ id: cell.id, number: cell.number, title: cell.source.trim(), states: [], ticked: 0 });
      continue;
    }
    const last = sections.at(-1);
    if (last === undefined) continue;
    const state = stateOf(cell.id);
    last.states.push(state);
    if (state === 'ticked') last.ticked += 1;
  }
  return sections;
}

export interface ContentsItem {
  key: string;
  cellId: string;
  /** `R5`, `TBV 2`. */
  label: string;
  words: string;
  number: string;
  quiet: boolean;
}

const numberOf = (cells: readonly SheetCell[], id: string) => cells.find((cell) => cell.id === id)?.number ?? '';

export function remarkItems(remarks: readonly Remark[], cells: readonly SheetCell[]): ContentsItem[] {
  return [...remarks].reverse().map((remark) => ({
    key: remark.id,
    cellId: remark.cellId,
    label: `R${remark.number}`,
    words: remark.text,
    number: numberOf(cells, remark.cellId) || 'gone',
    quiet: remark.state === 'answered',
  }));
}

export function remarkCount(remarks: readonly Remark[]): string {
  const open = remarks.filter((remark) => remark.state === 'open').length;
  const answered = remarks.filter((remark) => remark.state === 'answered').length;
  return [open > 0 ? `${open} open` : '', answered > 0 ? `${answered} answered` : ''].filter(Boolean).join(', ');
}

export function verifyItems(cells: readonly SheetCell[]): ContentsItem[] {
  return cells
    .filter((cell) => cell.tbvNumber !== undefined)
    .map((cell) => ({
      key: cell.id,
      cellId: cell.id,
      label: `TBV ${cell.tbvNumber ?? ''}`,
      words: cell.settings.tbv ?? '',
      number: cell.number,
      quiet: false,
    }));
}

export function rangeItems(cells: readonly SheetCell[], results: ReadonlyMap<string, CellResult>): ContentsItem[] {
  return cells.flatMap((cell) => {
    const relation = results.get(cell.id)?.relation;
    if (relation?.grade !== 'outside') return [];
    const kept = (relation.keepReason ?? '') !== '';
    return [
      {
        key: cell.id,
        cellId: cell.id,
        label: '',
        words: kept ? `${relation.title}, kept` : relation.title,
        number: cell.number,
        quiet: kept,
      },
    ];
  });
}

export function errorItems(cells: readonly SheetCell[], results: ReadonlyMap<string, CellResult>): ContentsItem[] {
  return cells.flatMap((cell) => {
    const result = results.get(cell.id);
    const error = result?.diagnostics.find((diagnostic) => diagnostic.severity === 'error');
    const fails = result?.lines.some((line) => line.satisfied === false) ?? false;
    if (error === undefined && !fails) return [];
    return [
      {
        key: cell.id,
        cellId: cell.id,
        label: '',
        words: error?.message ?? 'A requirement does not hold',
        number: cell.number,
        quiet: false,
      },
    ];
  });
}

/** What N goes through: errors, open remarks, items to be verified, ranges, and for a checker what is not ticked. */
export function openItems(
  cells: readonly SheetCell[],
  results: ReadonlyMap<string, CellResult>,
  remarks: readonly Remark[],
  untickedToo: (id: string) => boolean,
): string[] {
  const wanted = new Set([
    ...errorItems(cells, results).map((item) => item.cellId),
    ...remarks.filter((remark) => remark.state !== 'closed').map((remark) => remark.cellId),
    ...verifyItems(cells).map((item) => item.cellId),
    ...rangeItems(cells, results)
      .filter((item) => !item.quiet)
      .map((item) => item.cellId),
    ...tickable(cells)
      .filter((cell) => untickedToo(cell.id))
      .map((cell) => cell.id),
  ]);
  return cells.filter((cell) => wanted.has(cell.id)).map((cell) => cell.id);
}
