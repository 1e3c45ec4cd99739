import type { CellResult, LineResult } from '#engine';
import { verdict } from './reportBackMatter';
import type { NumberedCell } from './reportBlocks';

export interface CoverSummary {
  purpose: string;
  results: { key: string; symbolLatex: string; text: string; unit: string; note: string; outside: boolean }[];
  requirements: { key: string; latex: string; verdict: string; number: string }[];
  tbv: { index: number; number: string; text: string }[];
}

/** The cover has room for this many results; the body carries all of them. */
const resultsOnCover = 6;

/** Markdown of the first text cell as one plain paragraph, with values in place of `{{name}}`. */
function purposeOf(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): string {
  const first = cells.find(({ cell }) => cell.kind === 'text');
  if (first === undefined) return '';
  const inline = results.get(first.cell.id)?.inline ?? {};
  const paragraph = first.cell.source.split(/\n\s*\n/)[0] ?? '';
  return paragraph
    .replace(/\{\{\s*([^}]+?)\s*\}\}/g, (_, name: string) => {
      const value = inline[name];
      return value === undefined ? name : `${value.text} ${value.unit}`.trim();
    })
    .replace(/[*_`#]/g, '')
    .replace(/\s+/g, ' ');
}

function lastSection(cells: readonly NumberedCell[]): readonly NumberedCell[] {
  const start = cells.findLastIndex(({ cell }) => cell.kind === 'section');
  return cells.slice(start + 1);
}

function resultRows(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): CoverSummary['results'] {
  const lines: LineResult[] = lastSection(cells).flatMap(({ cell }) => results.get(cell.id)?.lines ?? []);
  return lines
    .filter((line) => line.kind === 'assignment' && line.value !== undefined && line.substitutionLatex !== undefined)
    .slice(-resultsOnCover)
    .map((line) => ({
      key: line.name ?? '',
      symbolLatex: line.symbolLatex ?? '',
      text: line.value?.text ?? '',
      unit: line.value?.unit ?? '',
      note: line.note ?? '',
      outside: line.outsideRange.length > 0,
    }));
}

/** Results up front: those of the last section, every requirement with its verdict, every open item. */
export function coverSummary(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): CoverSummary {
  const requirements = cells.flatMap(({ cell, number }) =>
    (results.get(cell.id)?.lines ?? [])
      .filter((line) => line.kind === 'require')
      .map((line, index) => ({
        key: `${cell.id}-${index}`,
        latex: line.formulaLatex ?? '',
        verdict: verdict(line),
        number,
      })),
  );
  const tbv = cells
    .filter(({ cell }) => (cell.settings.tbv ?? '') !== '')
    .map(({ cell, number }, index) => ({ index: index + 1, number, text: cell.settings.tbv ?? '' }));
  return { purpose: purposeOf(cells, results), results: resultRows(cells, results), requirements, tbv };
}
