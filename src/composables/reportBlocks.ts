import type { CellInput, CellResult, FluidCellResult, LineResult, RelationCellResult } from '#engine';

/** A stretch of the report that is never split across pages. */
export type ReportBlock =
  | { type: 'section'; key: string; number: string; title: string }
  | { type: 'text'; key: string; number: string; source: string; cell: CellResult | undefined; tbv: string }
  | { type: 'line'; key: string; number: string; line: LineResult; tbv: string }
  | { type: 'fluid'; key: string; number: string; name: string; fluid: FluidCellResult; tbv: string }
  | { type: 'relation'; key: string; number: string; relation: RelationCellResult; tbv: string }
  | { type: 'validity'; key: string; number: ''; relation: RelationCellResult }
  | { type: 'problem'; key: string; number: string; sentence: string }
  | { type: 'list'; key: string; number: ''; heading: string; rows: ListRow[] };

export interface ListRow {
  key: string;
  label: string;
  labelLatex?: string | undefined;
  text: string;
  note?: string | undefined;
}

export interface NumberedCell {
  cell: CellInput;
  /** `3` for a section, `3.2` for a cell in it. */
  number: string;
}

/** Numbers sections 1, 2, 3 and their cells 1.1, 1.2 …; cells before the first section are 0.1, 0.2 … */
export function numberCells(cells: readonly CellInput[]): NumberedCell[] {
  let section = 0;
  let within = 0;
  return cells.map((cell) => {
    if (cell.kind === 'section') {
      section += 1;
      within = 0;
      return { cell, number: String(section) };
    }
    within += 1;
    return { cell, number: `${section}.${within}` };
  });
}

function lineBlocks(id: string, number: string, lines: readonly LineResult[], tbv: string): ReportBlock[] {
  return lines.map((line, index) => ({
    type: 'line' as const,
    key: `${id}-line-${index}`,
    number: index === 0 ? number : '',
    line,
    tbv: index === 0 ? tbv : '',
  }));
}

function cellProblems(id: string, result: CellResult | undefined): ReportBlock[] {
  const ofLines = new Set(result?.lines.flatMap((line) => line.diagnostics.map((diagnostic) => diagnostic.message)));
  return (result?.diagnostics ?? [])
    .filter((diagnostic) => diagnostic.severity === 'error' && !ofLines.has(diagnostic.message))
    .map((diagnostic, index) => ({
      type: 'problem',
      key: `${id}-problem-${index}`,
      number: '',
      sentence: diagnostic.message,
    }));
}

function blocksOfCell({ cell, number }: NumberedCell, result: CellResult | undefined): ReportBlock[] {
  const tbv = cell.settings.tbv ?? '';
  const { id } = cell;
  switch (cell.kind) {
    case 'section':
      return [{ type: 'section', key: id, number, title: cell.source }];
    case 'text':
      return [{ type: 'text', key: id, number, source: cell.source, cell: result, tbv }];
    case 'expressions':
      return [...lineBlocks(id, number, result?.lines ?? [], tbv), ...cellProblems(id, result)];
    case 'fluid': {
      const fluid = result?.fluid;
      if (fluid === undefined || fluid.rows.length === 0) {
        return [
          { type: 'problem', key: id, number, sentence: `${cell.settings.name ?? 'Fluid state'}: no result` },
          ...cellProblems(id, result),
        ];
      }
      return [
        { type: 'fluid', key: id, number, name: cell.settings.name ?? '', fluid, tbv },
        ...cellProblems(id, result),
      ];
    }
    case 'relation': {
      const relation = result?.relation;
      if (relation === undefined) {
        return [
          { type: 'problem', key: id, number, sentence: `${cell.settings.name ?? 'Relation'}: no result` },
          ...cellProblems(id, result),
        ];
      }
      return [
        { type: 'relation', key: id, number, relation, tbv },
        ...lineBlocks(`${id}-formula`, '', relation.formula, ''),
        { type: 'validity', key: `${id}-validity`, number: '', relation },
        ...lineBlocks(`${id}-below`, '', result?.lines ?? [], ''),
        ...cellProblems(id, result),
      ];
    }
  }
}

/** The body of the report: every cell in order, cut into blocks that stay whole. */
export function bodyBlocks(cells: readonly NumberedCell[], results: ReadonlyMap<string, CellResult>): ReportBlock[] {
  return cells.flatMap((numbered) => blocksOfCell(numbered, results.get(numbered.cell.id)));
}
