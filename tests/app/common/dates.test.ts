import { describe, expect, it } from 'vitest';
import { clockSeconds, longDay, shortDay, shortDayTime } from 'src/composables/dates';

/** Given in the reader's own time zone, so that the test says the same everywhere. */
const at = (year: number, month: number, day: number, hour = 0, minute = 0, second = 0) =>
  new Date(year, month - 1, day, hour, minute, second).toISOString();
const now = new Date(2026, 10, 12);

describe('days and times', () => {
  it('leave out the present year, and name another', () => {
    expect(shortDay(at(2026, 3, 12), now)).toBe('12 Mar');
    expect(shortDay(at(2025, 12, 31), now)).toBe('31 Dec 2025');
  });

  it('show minutes for this year only', () => {
    expect(shortDayTime(at(2026, 3, 9, 9, 5), now)).toBe('9 Mar 09:05');
    expect(shortDayTime(at(2025, 3, 9, 9, 5), now)).toBe('9 Mar 2025');
  });

  it('are written out in the ledger', () => {
    expect(longDay(at(2026, 3, 13, 23, 59))).toBe('13 March 2026');
    expect(clockSeconds(at(2026, 3, 13, 7, 8, 9))).toBe('07:08:09');
  });
});
