import { describe, expect, it } from 'vitest';
import type { RegisterRow } from '#contract';
import {
  groupLetter,
  groupLetters,
  matches,
  passesFilter,
  registerLines,
  sortRows,
  stateSummary,
} from 'src/composables/registerLines';

let made = 0;
function row(change: Partial<RegisterRow> = {}): RegisterRow {
  made += 1;
  return {
    calculationId: `00000000-0000-4000-8000-${String(made).padStart(12, '0')}`,
    revisionId: '00000000-0000-4000-8000-000000000000',
    number: `2417-C-${String(made).padStart(3, '0')}`,
    title: 'Expansion tank',
    group: '',
    letter: 'A',
    state: 'draft',
    cells: 10,
    ticked: 0,
    changed: 0,
    openRemarks: 0,
    tbv: 0,
    outsideRange: 0,
    lastChange: '2026-03-01T10:00:00.000Z',
    lastChangeBy: 'O. Varga',
    prepares: ['OV'],
    checks: [],
    mine: false,
    ...change,
  };
}

describe('what a filter lets through', () => {
  const hanna = { initials: 'HQ', checks: true };
  it.each([
    ['handed to me', row({ state: 'for check', checks: ['HQ'] }), true],
    ['handed to another checker', row({ state: 'for check', checks: ['LM'] }), false],
    ['handed to nobody by name', row({ state: 'for check', checks: [] }), true],
    ['handed to nobody, but I wrote in it', row({ state: 'for check', checks: [], mine: true }), false],
    ['mine to check, but still a draft', row({ state: 'draft', checks: ['HQ'] }), false],
  ])('waiting for my check: %s', (_case, given, expected) => {
    expect(passesFilter(given, 'my check', hanna)).toBe(expected);
  });

  it('does not offer unassigned checks to those who are no checkers', () => {
    expect(passesFilter(row({ state: 'for check' }), 'my check', { initials: 'PL', checks: false })).toBe(false);
  });
});

describe('finding', () => {
  const given = row({ title: 'Sea-water main, pressure drop', group: 'Sea water', checks: ['HQ'], letter: 'C' });
  it.each([
    ['', true],
    ['PRESSURE sea', true],
    ['hq', true],
    ['rev c', true],
    ['pressure steam', false],
  ])('%j → %s', (sought, expected) => expect(matches(given, sought)).toBe(expected));
});

describe('order', () => {
  it('sorts numbers by their figures, not by their letters', () => {
    const rows = ['2417-C-10', '2417-C-9', '2417-C-100'].map((number) => row({ number }));
    const numbers = sortRows(rows, { column: 'number', descending: false }).map(({ number }) => number);
    expect(numbers).toEqual(['2417-C-9', '2417-C-10', '2417-C-100']);
  });

  it('keeps ties by number also when descending', () => {
    const rows = [row({ number: 'B', tbv: 1 }), row({ number: 'A', tbv: 1 }), row({ number: 'C', tbv: 2 })];
    expect(sortRows(rows, { column: 'tbv', descending: true }).map(({ number }) => number)).toEqual(['C', 'A', 'B']);
  });

  it('puts states in the order of a revision’s life', () => {
    const rows = (['locked', 'draft', 'checked', 'for check'] as const).map((state) => row({ state }));
    const states = sortRows(rows, { column: 'state', descending: false }).map(({ state }) => state);
    expect(states).toEqual(['draft', 'for check', 'checked', 'locked']);
  });
});

describe('groups', () => {
  it('counts on after Z as columns of a table do', () => {
    expect([0, 25, 26, 51, 52].map(groupLetter)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA']);
  });

  const rows = [
    row({ number: '1', group: 'Sea water' }),
    row({ number: '2', group: '' }),
    row({ number: '3', group: 'Lube oil' }),
    row({ number: '4', group: 'Sea water' }),
  ];
  const letters = groupLetters(rows);

  it('letters them by their first number, the nameless last', () => {
    expect([...letters]).toEqual([
      ['Sea water', 'A'],
      ['Lube oil', 'B'],
      ['', 'C'],
    ]);
  });

  it('stand as headings when sorted by number', () => {
    const lines = registerLines(rows, { column: 'number', descending: false }, letters);
    expect(lines.map((line) => (line.type === 'group' ? `${line.letter} ${line.count}` : line.row.number))).toEqual([
      'A 2',
      '1',
      '4',
      'B 1',
      '3',
      'C 1',
      '2',
    ]);
  });

  it('leave when sorted by anything else, so that one order runs through', () => {
    const lines = registerLines(rows, { column: 'title', descending: false }, letters);
    expect(lines.every((line) => line.type === 'row')).toBe(true);
    expect(lines).toHaveLength(4);
  });

  it('keep their letters when a filter leaves a group empty', () => {
    const lines = registerLines([rows[2] ?? row()], { column: 'number', descending: false }, letters);
    expect(lines[0]).toMatchObject({ type: 'group', letter: 'B', count: 1 });
  });
});

it('says the state of the register in words', () => {
  const rows = [row({ state: 'locked' }), row(), row()];
  expect(stateSummary(rows)).toBe('2 draft, 1 locked');
  expect(stateSummary([])).toBe('no calculation yet');
});
