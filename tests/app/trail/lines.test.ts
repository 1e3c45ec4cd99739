import { describe, expect, it } from 'vitest';
import type { TrailEntry } from '#contract';
import { kindOf, lineSentence, particulars, toneOf, trailCsv, trailDays } from 'src/composables/trailLines';

let made = 0;
function entry(change: Partial<TrailEntry> = {}): TrailEntry {
  made += 1;
  return {
    id: made,
    // Noon, so that the day is the same in every time zone from -11 to +11.
    at: '2026-03-13T12:00:00.000Z',
    person: { id: '00000000-0000-4000-8000-000000000001', signInName: 'hanna.quaye', name: 'H. Quaye', initials: 'HQ' },
    calculation: { id: '00000000-0000-4000-8000-000000000002', number: '2417-C-031', title: 'Cooler' },
    letter: 'C',
    act: 'tick.set',
    sentence: 'ticked a cell',
    detail: {},
    hash: 'ab'.repeat(32),
    ...change,
  };
}

describe('the ledger', () => {
  it('puts entries under their days, newest first', () => {
    const days = trailDays([
      entry({ act: 'revision.lock' }),
      entry({ act: 'revision.check' }),
      entry({ at: '2026-03-12T12:00:00.000Z' }),
    ]);
    expect(days.map(({ day, count }) => `${day}: ${count}`)).toEqual(['13 March 2026: 2', '12 March 2026: 1']);
  });

  it('folds ticks in a row, and nothing is lost', () => {
    const ticks = [entry(), entry(), entry()];
    const [day] = trailDays(ticks);
    expect(day?.lines).toHaveLength(1);
    expect(day?.lines[0]?.entries).toEqual(ticks);
    expect(day?.lines[0] && lineSentence(day.lines[0])).toBe('ticked 3 cells');
  });

  it.each([
    ['another person', { person: null }],
    ['another calculation', { calculation: null }],
    ['another revision', { letter: 'B' }],
    ['another act', { act: 'tick.remove' }],
    ['an hour before', { at: '2026-03-13T11:00:00.000Z' }],
  ])('does not fold over %s', (_case, change) => {
    expect(trailDays([entry(), entry(change)])[0]?.lines).toHaveLength(2);
  });

  it('never folds signatures', () => {
    const signed = () => entry({ act: 'revision.check' });
    expect(trailDays([signed(), signed()])[0]?.lines).toHaveLength(2);
  });
});

describe('an entry', () => {
  it.each([
    ['revision.lock', 'states', 'lock'],
    ['revision.handOver', 'states', 'plain'],
    ['remark.ask', 'remarks', 'red'],
    ['tick.set', 'ticks', 'green'],
    ['member.set', 'people', 'plain'],
    ['calculation.rename', 'writing', 'plain'],
  ])('%s belongs to %s and is %s', (act, kind, tone) => {
    expect(kindOf(entry({ act }))).toBe(kind);
    expect(toneOf(entry({ act }))).toBe(tone);
  });

  it('shows before and after, reasons, and the beginning of a fingerprint', () => {
    const detail = { from: 'draft', to: 'for check', note: 'as agreed', fingerprint: '4f1c9a07e2d851b6' };
    expect(particulars({ detail, sentence: 'handed over' })).toBe('draft → for check; as agreed; 4f1c 9a07');
  });

  it('does not say twice what its sentence says', () => {
    expect(particulars({ detail: { reason: 'wrong pump' }, sentence: 'returned revision C: wrong pump' })).toBe('');
  });
});

describe('the trail as a table', () => {
  it('quotes what RFC 4180 asks to be quoted', () => {
    const table = trailCsv([entry({ sentence: 'said "no", twice', person: null })]);
    const [head, line] = table.split('\r\n');
    expect(head).toBe('number,time (UTC),who,what,calculation,revision,particulars,hash');
    expect(line).toContain(',the sheet,"said ""no"", twice",2417-C-031,C,,');
  });

  it.each(['=1+1', '+1', '-1', '@SUM(A1)'])('keeps %s from being taken for a formula', (text) => {
    expect(trailCsv([entry({ sentence: text })])).toContain(`,'${text},`);
  });
});
