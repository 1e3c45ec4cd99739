import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { exchangeSchema } from '#document';
import { evaluateCalculation, twelveDigits } from '#engine';

const files = readdirSync('examples').filter((name) => name.endsWith('.json') && !name.endsWith('.results.json'));

/** Every name of a calculation with its figure to 12 digits: a change of the engine that moves one is seen here. */
describe.each(files)('examples/%s', (file) => {
  const { settings, cells } = exchangeSchema.parse(JSON.parse(readFileSync(`examples/${file}`, 'utf8')));
  const result = evaluateCalculation({ settings, cells });
  const results = Object.values(result.cells);

  it('computes what is stored beside it', () => {
    const stored: unknown = JSON.parse(readFileSync(`examples/${file.replace('.json', '.results.json')}`, 'utf8'));
    expect(Object.fromEntries(result.names.map(({ name, value }) => [name, twelveDigits(value)]))).toEqual(stored);
  });

  it('has no error, and every requirement holds', () => {
    expect(results.flatMap((cell) => cell.diagnostics).filter((one) => one.severity === 'error')).toEqual([]);
    const requirements = results.flatMap((cell) => cell.lines).filter((line) => line.kind === 'require');
    expect(requirements.map((line) => line.satisfied)).toEqual(requirements.map(() => true));
  });
});
