import type { CellResult, LineResult } from '#engine';
import type { Remark, RevisionDetail } from '#contract';
import type { ListRow, NumberedCell, ReportBlock } from './reportBlocks';

function linesOf(result: CellResult | undefined): LineResult[] {
  return [...(result?.relation?.formula ?? []), ...(result?.lines ?? [])];
}

/** Relations and formulations used, each once, in the order of their first use. */
function sources(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): ListRow[] {
  const found = new Map<string, string[]>();
  for (const { cell, number } of cells) {
    const result = results.get(cell.id);
    const cited = [
      ...(result?.fluid?.sources ?? []),
      ...(result?.relation === undefined ? [] : [result.relation.source]),
    ];
    for (const source of cited) found.set(source, [...(found.get(source) ?? []), number]);
  }
  return [...found].map(([source, numbers], index) => ({
    key: source,
    label: String(index + 1),
    text: source,
    note: `cell ${numbers.join(', ')}`,
  }));
}

/** Every symbol with its value and the cell that defines it. */
function nomenclature(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): ListRow[] {
  return cells.flatMap(({ cell, number }) =>
    (results.get(cell.id)?.lines ?? [])
      .filter((line) => line.name !== undefined)
      .map((line) => ({
        key: line.name ?? '',
        label: line.name ?? '',
        labelLatex: line.symbolLatex,
        text: line.value === undefined ? 'no result' : `${line.value.text} ${line.value.unit}`.trim(),
        note: [line.note, `cell ${number}`].filter(Boolean).join(' · '),
      })),
  );
}

function requirementRows(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): ListRow[] {
  return cells.flatMap(({ cell, number }) =>
    linesOf(results.get(cell.id))
      .filter((line) => line.kind === 'require')
      .map((line, index) => ({
        key: `${cell.id}-${index}`,
        label: number,
        labelLatex: line.formulaLatex,
        text: verdict(line),
        note: line.note,
      })),
  );
}

/** `holds`, `does not hold`, or `not evaluated`: an error upstream is never a pass. */
export function verdict(line: LineResult): string {
  if (line.satisfied === undefined) return 'not evaluated';
  return line.satisfied ? 'holds' : 'does not hold';
}

function remarkRows(remarks: readonly Remark[], numbers: ReadonlyMap<string, string>): ListRow[] {
  return remarks.map((remark) => ({
    key: remark.id,
    label: `R${remark.number}`,
    text: [
      `${remark.author.name}: ${remark.text}`,
      ...remark.answers.map((answer) => `${answer.author.name}: ${answer.text}`),
    ].join(' — '),
    note: `cell ${numbers.get(remark.cellId) ?? 'taken out'}, ${remark.state}`,
  }));
}

function list(heading: string, rows: ListRow[]): ReportBlock[] {
  return rows.map((row, index) => ({
    type: 'list',
    key: `${heading}-${index}`,
    number: '',
    heading: index === 0 ? heading : '',
    rows: [row],
  }));
}

export interface BackMatterInput {
  detail: RevisionDetail;
  cells: readonly NumberedCell[];
  results: ReadonlyMap<string, CellResult>;
  remarks: readonly Remark[];
  withRemarks: boolean;
}

/** What follows the cells: requirements, items to be verified, reasons, sources, nomenclature, remarks, caution. */
export function backMatterBlocks({ detail, cells, results, remarks, withRemarks }: BackMatterInput): ReportBlock[] {
  const numbers = new Map(cells.map(({ cell, number }) => [cell.id, number]));
  const tbv = cells
    .filter(({ cell }) => (cell.settings.tbv ?? '') !== '')
    .map(({ cell, number }, index) => ({
      key: cell.id,
      label: `TBV ${index + 1}`,
      text: cell.settings.tbv ?? '',
      note: `cell ${number}`,
    }));
  const reasons = detail.reasons.map((entry, index) => ({
    key: String(index),
    label: String(index + 1),
    text: entry.reason,
    note: entry.about,
  }));
  return [
    ...list('Requirements', requirementRows(cells, results)),
    ...list('To be verified', tbv),
    ...list('Left open at the lock, with reasons', reasons),
    ...list('Sources', sources(cells, results)),
    ...list('Nomenclature', nomenclature(cells, results)),
    ...(withRemarks ? list('Remarks and answers', remarkRows(remarks, numbers)) : []),
  ];
}
