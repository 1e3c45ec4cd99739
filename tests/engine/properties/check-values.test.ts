import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { compareProperties } from '../../../src-server/commands/reference/properties';
import { readCsv } from '../../../src-server/commands/reference/csv';

const text = readFileSync(new URL('../../check-values/properties.csv', import.meta.url), 'utf8');
const [head = '', ...lines] = text.trim().split('\n');
const records = readCsv(text);

/** What each kind of row rests on, and how many there are at least: none may be lost unnoticed. */
const kinds: readonly (readonly [kind: string, source: string, least: number])[] = [
  ['a', 'verification tables of the IAPWS releases', 56],
  ['b', 'water and steam by an independent program (python3-iapws 1.5)', 267],
  ['c', 'gases and refrigerants by an independent program (CoolProp 6.6)', 245],
  ['c-pub', 'check values printed in the papers', 69],
  ['d', 'handbook tables', 171],
  ['e', 'ASHRAE Fundamentals 2017, tables', 8],
  ['e-comp', 'moist air by an independent program (psychrolib 2.5)', 16],
  ['f', 'liquids from published coefficients', 118],
  ['g', 'solids: EN 12524, VDI Heat Atlas, Ho et al. 1972', 33],
];

describe('properties against values from outside', () => {
  it.each(kinds)('%s: %s', (kind, _source, least) => {
    const rows = lines.filter((_, index) => records[index]?.kind === kind);
    const summary = compareProperties([head, ...rows].join('\n'));
    expect(summary.lines).toEqual([]);
    expect(summary.failed + summary.skipped).toBe(0);
    expect(summary.passed).toBe(rows.length);
    expect(rows.length).toBeGreaterThanOrEqual(least);
  });

  it('has no row of a kind that is not listed', () => {
    expect(new Set(records.map((record) => record.kind))).toEqual(new Set(kinds.map(([kind]) => kind)));
  });
});
