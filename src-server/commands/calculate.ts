// `npm run -s calculate -- FILE.json`: reads a calculation in the exchange format and prints every
// name's value in SI, its unit, all requirements and all diagnostics as JSON.
import { readFileSync } from 'node:fs';
import { evaluateCalculation, type CalculationResult, type CellInput } from '#engine';
import { exchangeSchema } from '#document';

function readCalculation(file: string) {
  const parsed = exchangeSchema.safeParse(JSON.parse(readFileSync(file, 'utf8')));
  if (parsed.success) return parsed.data;
  const [issue] = parsed.error.issues;
  throw new Error(
    `it is no calculation in the exchange format: ${issue?.path.join('.') ?? ''} ${issue?.message ?? ''}`,
  );
}

/** Zero-based number of the line in which an offset lies. */
function lineAt(source: string, offset: number): number {
  return source.slice(0, offset).split('\n').length - 1;
}

function report(cells: readonly CellInput[], result: CalculationResult) {
  const names = Object.fromEntries(
    result.names.map(({ name, value }) => [
      name,
      value === undefined ? null : { si: value.si, unit: value.siUnit, shown: `${value.text} ${value.unit}`.trim() },
    ]),
  );
  const results = cells.flatMap((cell) => result.cells[cell.id] ?? []);
  const requirements = results.flatMap((cell) =>
    cell.lines
      .filter((line) => line.kind === 'require')
      .map((line) => ({ cell: cell.id, line: line.line, satisfied: line.satisfied ?? null })),
  );
  const sources = new Map(cells.map(({ id, source }) => [id, source]));
  const diagnostics = results.flatMap((cell) =>
    cell.diagnostics.map(({ severity, code, message, span }) => {
      const line = span === undefined ? undefined : lineAt(sources.get(cell.id) ?? '', span.from);
      return { cell: cell.id, line, severity, code, message, span };
    }),
  );
  const outsideRange = results
    .filter((cell) => cell.outsideRange.length > 0)
    .map((cell) => ({ cell: cell.id, becauseOf: cell.outsideRange }));
  return { names, requirements, diagnostics, outsideRange };
}

function main([file = '']: readonly string[]): number {
  if (file === '') {
    console.error('usage: npm run -s calculate -- FILE.json');
    return 2;
  }
  try {
    const { settings, cells } = readCalculation(file);
    console.log(JSON.stringify(report(cells, evaluateCalculation({ settings, cells })), undefined, 2));
    return 0;
  } catch (error) {
    console.error(`${file} could not be calculated: ${error instanceof Error ? error.message : String(error)}`);
    return 2;
  }
}

process.exit(main(process.argv.slice(2)));
