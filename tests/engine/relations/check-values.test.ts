import { describe, expect, it } from 'vitest';
import { listRelations } from '#engine';
import { checkRows, checkRowsOf, result } from '../../helpers/relations';

// Where each number is from stands in its row: published or printed values, independent programs
// and exact solutions; `regression` marks those without one, worked again outside the product.
const ids = listRelations().map(({ relation }) => relation.id);

describe('check values', () => {
  it('names a reference in every row, and no relation beside the catalogue', () => {
    for (const { id, reference } of checkRows) expect(reference.trim(), id).not.toBe('');
    expect(checkRows.map(({ id }) => id).filter((id) => !ids.includes(id))).toEqual([]);
  });

  it.each(ids)('%s', (id) => {
    const own = checkRowsOf(id);
    expect(own.length, 'rows').toBeGreaterThan(0);
    for (const { inputs, expected, tolerance, reference } of own) {
      const got = result(id, inputs);
      const apart = expected === 0 ? Math.abs(got) : Math.abs(got / expected - 1);
      expect(apart, `${JSON.stringify(inputs)} gives ${got}, not ${expected}: ${reference}`).toBeLessThanOrEqual(
        tolerance,
      );
    }
  });
});
