import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';

const folder = mkdtempSync(join(tmpdir(), 'wallflux-calculate-'));
afterAll(() => rmSync(folder, { recursive: true }));

function calculate(content: string) {
  const file = join(folder, 'calculation.json');
  writeFileSync(file, content);
  return spawnSync('node', ['--import', 'tsx', 'src-server/commands/calculate.ts', file], { encoding: 'utf8' });
}
const calculation = (cells: unknown[]) =>
  JSON.stringify({
    format: 'wallflux-calculation',
    version: 1,
    title: 'Flux',
    settings: { unitSystem: 'SI', significantDigits: 4, ambientPressure: 101325 },
    cells,
  });
const expressions = (id: string, source: string) => ({ id, kind: 'expressions', source, settings: {} });

describe('npm run -s calculate', () => {
  it('prints names, requirements and problems as JSON', () => {
    const { status, stdout } = calculate(
      calculation([
        expressions('a', 'Q = 2 kW\nA = 4 m^2\nq = Q/A'),
        expressions('b', 'require q < 400 W/m^2\nx = q + 2 m'),
      ]),
    );
    const printed = JSON.parse(stdout) as Record<string, unknown>;
    expect(status).toBe(0);
    expect(printed.names).toMatchObject({ q: { si: 500, unit: 'W/m^2', shown: '500.0 W/m²' }, x: null });
    expect(printed.requirements).toEqual([{ cell: 'b', line: 0, satisfied: false }]);
    expect(printed.diagnostics).toMatchObject([{ cell: 'b', line: 1, severity: 'error', code: 'UNITS_DISAGREE' }]);
  });

  it.each([
    ['no JSON', 'x = 2'],
    ['another format', '{"format":"something else"}'],
  ])('ends with 2 and a sentence for %s', (_, content) => {
    const { status, stdout, stderr } = calculate(content);
    expect(status).toBe(2);
    expect(stdout).toBe('');
    expect(stderr).toMatch(/could not be calculated: .+/);
  });

  it('ends with 2 for a file that is not there', () => {
    const { status, stderr } = spawnSync(
      'node',
      ['--import', 'tsx', 'src-server/commands/calculate.ts', '/none.json'],
      {
        encoding: 'utf8',
      },
    );
    expect(status).toBe(2);
    expect(stderr).toContain('/none.json');
  });
});
