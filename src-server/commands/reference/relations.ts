import { z } from 'zod';
import { evaluateRelation, findRelation } from '#engine';
import { readCsv } from './csv';
import { agrees, Skips, type Summary } from './summary';

const row = z.object({
  relation_id: z.string().min(1),
  inputs_json: z.string().transform((text) => z.record(z.string(), z.number()).parse(JSON.parse(text))),
  expected: z.coerce.number(),
  relative_tolerance: z.coerce.number(),
});

/**
 * Compares the relation catalogue with a CSV of check values: columns relation_id, inputs_json
 * (numbers by symbol, in the units of the symbols), expected, relative_tolerance.
 */
export function compareRelations(text: string): Summary {
  const summary: Summary = { passed: 0, failed: 0, skipped: 0, lines: [] };
  const skips = new Skips();
  for (const [index, record] of readCsv(text).entries()) {
    const { relation_id: id, inputs_json: inputs, expected, relative_tolerance: tolerance } = row.parse(record);
    const entry = findRelation(id);
    if (entry === undefined) {
      skips.add(`${id} is not in the catalogue`);
      continue;
    }
    const got = evaluateRelation(entry.relation, new Map(Object.entries(inputs)));
    if (got.ok && agrees(got.value, expected, tolerance)) summary.passed += 1;
    else {
      summary.failed += 1;
      summary.lines.push(
        `row ${index + 2} ${id}: got ${got.ok ? got.value : got.reason}, expected ${expected} within ${tolerance}`,
      );
    }
  }
  return { ...summary, skipped: skips.total, lines: [...summary.lines, ...skips.lines()] };
}
