import { describe, expect, it } from 'vitest';
import {
  defaultSettings,
  evaluateCalculation,
  resolveUnit,
  type CalculationResult,
  type CellInput,
  type CellKind,
  type CellSettings,
} from '#engine';

/** A cell of the sheet: lines of expressions, or a relation with its bindings, or a fluid. */
export type ExampleCell = string | ({ lines: string } & CellSettings);

/** The printed answer with its unit (`998 W/m`), or that with a wider tolerance and the reason for it. */
export type Answer = string | { printed: string; within: number; because: string };

export interface WorkedExample {
  title: string;
  /** Book and example; the numbers are recalled from memory. */
  source: string;
  cells: readonly ExampleCell[];
  /** By the name on the sheet. */
  answers: Readonly<Record<string, Answer>>;
  /** Names of relation cells whose case lies outside or not clearly inside, with the grade they must have. */
  grades?: Readonly<Record<string, 'edge' | 'outside'>>;
}

function cellInput(cell: ExampleCell, index: number): CellInput {
  const { lines, ...settings } = typeof cell === 'string' ? { lines: cell } : cell;
  const kind: CellKind = 'relation' in settings ? 'relation' : 'substance' in settings ? 'fluid' : 'expressions';
  return { id: `c${index}`, kind, source: lines.trim(), settings };
}

export function evaluateExample({ cells }: WorkedExample): CalculationResult {
  return evaluateCalculation({ settings: defaultSettings, cells: cells.map(cellInput) });
}

/** Half a unit of the last printed figure, as a share of the value: `4.18` → 0.0012. */
function rounding(figure: string): number {
  const [mantissa = '', power = '0'] = figure.toLowerCase().split('e');
  const decimals = mantissa.split('.')[1]?.length ?? 0;
  const trailing = decimals > 0 ? 0 : (/0+$/.exec(mantissa)?.[0].length ?? 0);
  return (0.5 * 10 ** (trailing - decimals + Number(power))) / Math.abs(Number(figure));
}

function valueOf(result: CalculationResult, name: string): number | undefined {
  const [cellName = '', property] = name.split('.');
  const direct = result.names.find((one) => one.name === cellName)?.value?.si;
  if (property === undefined) return typeof direct === 'number' ? direct : undefined;
  const relations = Object.values(result.cells).flatMap(({ relation }) => (relation === undefined ? [] : [relation]));
  const own = relations.find(({ outputs }) => outputs[0]?.name.split('.')[0] === cellName);
  const line = own?.formula.find((one) => one.name === property)?.value?.si;
  return typeof line === 'number' ? line : undefined;
}

/** One test for each printed answer, one that the sheet has no problem, one for the fit of its relations. */
export function describeExample(example: WorkedExample): void {
  describe(`${example.title} (${example.source}, from memory)`, () => {
    const result = evaluateExample(example);

    it('has no problem on the sheet', () => {
      const errors = Object.values(result.cells).flatMap((cell) => cell.diagnostics);
      expect(errors.filter(({ severity }) => severity === 'error')).toEqual([]);
    });

    it.each(Object.entries(example.answers))('%s', (name, answer) => {
      const { printed, within } = typeof answer === 'string' ? { printed: answer, within: undefined } : answer;
      const [figure = '', ...rest] = printed.split(' ');
      const unit = resolveUnit(rest.join(' ') || '1');
      if (unit === undefined) throw new Error(`no unit in ${printed}`);
      const got = (valueOf(result, name) ?? NaN) - unit.offset;
      const apart = Math.abs(got / unit.factor / Number(figure) - 1);
      // A rounding shared with the figures before it needs a hair more than half a unit.
      expect(apart, `${got / unit.factor} against ${printed}`).toBeLessThanOrEqual(within ?? rounding(figure) * 1.0001);
    });

    it('grades the fit of its relations', () => {
      const graded = Object.values(result.cells).flatMap((cell) =>
        cell.relation === undefined ? [] : [[cell.relation.outputs[0]?.name.split('.')[0] ?? '', cell.relation.grade]],
      );
      const outside = graded.filter(([, grade]) => grade === 'outside').map(([name]) => name);
      const wanted = Object.entries(example.grades ?? {});
      expect(outside).toEqual(wanted.filter(([, grade]) => grade === 'outside').map(([name]) => name));
      for (const [name, grade] of wanted) expect(Object.fromEntries(graded)[name], name).toBe(grade);
    });
  });
}
