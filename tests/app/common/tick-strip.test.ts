import { describe, expect, it } from 'vitest';
import { stripMarks, stripMarkWidth } from 'src/components/common/tickStrip';

const count = (marks: string[], kind: string) => marks.filter((mark) => mark === kind).length;

describe('a strip of ticks', () => {
  it('has one mark a cell, in order', () => {
    expect(stripMarks(2, 1, 4)).toEqual(['ok', 'ok', 'changed', 'none']);
    expect(stripMarks(0, 0, 0)).toEqual([]);
  });

  it('never loses the one changed cell of a long sheet', () => {
    const marks = stripMarks(398, 1, 400);
    expect(count(marks, 'changed')).toBe(1);
    expect(count(marks, 'none')).toBe(1);
    expect(marks.length).toBeLessThanOrEqual(42);
  });

  it.each([1, 9, 17, 24, 40, 42])('%i marks fit into 116 px', (marks) => {
    const width = stripMarkWidth(marks, 116, 1);
    expect(width).toBeGreaterThanOrEqual(2);
    expect(marks * (width + 1) - 1).toBeLessThanOrEqual(marks > 39 ? 126 : 116);
  });
});
