import type { FluidCellResult, FluidStateRow, PropertyValue } from '#engine';

/** What convection needs, in the order of the table; the rest stands under "all properties". */
const mainProperties = ['T', 'rho', 'cp', 'k', 'mu', 'Pr'];
const saturationProperties = ['T', 'p', 'rho', 'cp', 'k', 'mu', 'Pr'];

export interface FluidColumn {
  property: string;
  symbolLatex: string;
  unit: string;
}

export interface FluidFigure {
  property: string;
  /** Undefined where the state has no such property. */
  value: PropertyValue | undefined;
  /** Unit, only where it differs from the head of its column. */
  unit: string;
  reason: string;
}

export interface FluidTableRow {
  label: string;
  figures: FluidFigure[];
}

const rowWords: Readonly<Record<FluidStateRow['label'], string>> = {
  state: '',
  film: 'at film',
  bulk: 'at bulk',
  wall: 'at wall',
  liquid: 'liquid',
  vapour: 'vapour',
  saturation: 'saturated',
};

function columnOf(rows: readonly FluidStateRow[], property: string): FluidColumn[] {
  const first = rows.flatMap((row) => row.values).find((value) => value.property === property);
  return first === undefined ? [] : [{ property, symbolLatex: first.symbolLatex, unit: first.value.unit }];
}

/** Columns of the short table, and those of the rest in runs of as many. */
export function fluidColumns(fluid: FluidCellResult): { main: FluidColumn[]; rest: FluidColumn[][] } {
  const wanted = fluid.mode === 'saturation' ? saturationProperties : mainProperties;
  const all = [...new Set(fluid.rows.flatMap((row) => row.values.map((value) => value.property)))];
  const main = wanted.flatMap((property) => columnOf(fluid.rows, property)).slice(0, 6);
  const taken = new Set(main.map((column) => column.property));
  const others = all.filter((property) => !taken.has(property)).flatMap((property) => columnOf(fluid.rows, property));
  const rest: FluidColumn[][] = [];
  for (let at = 0; at < others.length; at += 6) rest.push(others.slice(at, at + 6));
  return { main, rest };
}

export function fluidRows(fluid: FluidCellResult, columns: readonly FluidColumn[]): FluidTableRow[] {
  return fluid.rows
    .map((row) => ({
      label: rowWords[row.label],
      figures: columns.map((column) => {
        const value = row.values.find((each) => each.property === column.property);
        return {
          property: column.property,
          value,
          unit: value === undefined || value.value.unit === column.unit ? '' : value.value.unit,
          reason: row.missing.find((each) => each.property === column.property)?.reason ?? '',
        };
      }),
    }))
    .filter((row) => row.figures.some((figure) => figure.value !== undefined || figure.reason !== ''));
}

/** `liquid`, or `liquid and vapour` where the rows differ. */
export function phaseWords(fluid: FluidCellResult): string {
  return [...new Set(fluid.rows.map((row) => row.phase))].filter((phase) => phase !== '').join(' and ');
}

export function formulationWords(fluid: FluidCellResult): string {
  return [...new Set(fluid.rows.map((row) => row.formulation))].filter((words) => words !== '').join('; ');
}

export function pressureWords(fluid: FluidCellResult): string {
  const pressure = fluid.rows.flatMap((row) => row.values).find((value) => value.property === 'p');
  return pressure === undefined ? '' : `${pressure.value.text} ${pressure.value.unit} abs`;
}
