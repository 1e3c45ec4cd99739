import type { RegisterRow, RevisionState } from '#contract';

export const registerFilters = ['all', 'mine', 'my check', 'remarks', 'tbv', 'range'] as const;
export type RegisterFilter = (typeof registerFilters)[number];

export const filterWords: Readonly<Record<RegisterFilter, string>> = {
  all: 'All',
  mine: 'Prepared by me',
  'my check': 'Waiting for my check',
  remarks: 'With open remarks',
  tbv: 'To be verified',
  range: 'Outside range',
};

export type RegisterColumn =
  | 'number'
  | 'title'
  | 'letter'
  | 'state'
  | 'ticks'
  | 'remarks'
  | 'tbv'
  | 'range'
  | 'lastChange'
  | 'prepares'
  | 'checks';
export interface RegisterSort {
  column: RegisterColumn;
  descending: boolean;
}

/** A line of the register on the screen: the heading of a group, or a calculation. */
export type RegisterLine =
  | { key: string; type: 'group'; letter: string; title: string; count: number }
  | { key: string; type: 'row'; row: RegisterRow };

/** Whether a calculation waits for the check of the person with these initials. */
function waitsForCheck(row: RegisterRow, initials: string, checks: boolean): boolean {
  if (row.state !== 'for check') return false;
  return row.checks.length > 0 ? row.checks.includes(initials) : checks && !row.mine;
}

/** `checks`: the person is a checker in this project, and may take up what nobody was named for. */
export function passesFilter(row: RegisterRow, filter: RegisterFilter, who: { initials: string; checks: boolean }) {
  switch (filter) {
    case 'all':
      return true;
    case 'mine':
      return row.mine;
    case 'my check':
      return waitsForCheck(row, who.initials, who.checks);
    case 'remarks':
      return row.openRemarks > 0;
    case 'tbv':
      return row.tbv > 0;
    case 'range':
      return row.outsideRange > 0;
  }
}

/** Every word must be found in number, title, group, state or a person's name or initials. */
export function matches(row: RegisterRow, sought: string): boolean {
  const heap = [
    row.number,
    row.title,
    row.group,
    row.state,
    `rev ${row.letter}`,
    row.lastChangeBy ?? '',
    ...row.prepares,
    ...row.checks,
  ]
    .join(' ')
    .toLowerCase();
  return sought
    .toLowerCase()
    .split(/\s+/)
    .every((word) => heap.includes(word));
}

const stateOrder: readonly RevisionState[] = ['draft', 'for check', 'checked', 'locked', 'superseded', 'withdrawn'];
const keys: Readonly<Record<RegisterColumn, (row: RegisterRow) => string | number>> = {
  number: (row) => row.number,
  title: (row) => row.title.toLowerCase(),
  letter: (row) => row.letter,
  state: (row) => stateOrder.indexOf(row.state),
  ticks: (row) => (row.cells === 0 ? -1 : row.ticked / row.cells),
  remarks: (row) => row.openRemarks,
  tbv: (row) => row.tbv,
  range: (row) => row.outsideRange,
  lastChange: (row) => row.lastChange,
  prepares: (row) => row.prepares.join(),
  checks: (row) => row.checks.join(),
};

function compare(a: string | number, b: string | number): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true });
}

/** A sorted copy; rows that tie stand by number. */
export function sortRows(rows: readonly RegisterRow[], { column, descending }: RegisterSort): RegisterRow[] {
  const key = keys[column];
  return [...rows].sort((a, b) => {
    const order = compare(key(a), key(b));
    return order === 0 ? compare(a.number, b.number) : descending ? -order : order;
  });
}

/** A, B, … Z, AA, … */
export function groupLetter(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : groupLetter(Math.floor(index / 26) - 1) + last;
}

/** Letters of all groups of the register, in the order of their first number; nameless ones last. */
export function groupLetters(rows: readonly RegisterRow[]): Map<string, string> {
  const names = [...new Set(sortRows(rows, { column: 'number', descending: false }).map((row) => row.group))];
  const ordered = [...names.filter((name) => name !== ''), ...names.filter((name) => name === '')];
  return new Map(ordered.map((name, index) => [name, groupLetter(index)]));
}

/** Sorted by number the calculations stand under the headings of their groups, else in one list. */
export function registerLines(
  rows: readonly RegisterRow[],
  sort: RegisterSort,
  letters: ReadonlyMap<string, string>,
): RegisterLine[] {
  const sorted = sortRows(rows, sort);
  const line = (row: RegisterRow): RegisterLine => ({ key: row.calculationId, type: 'row', row });
  if (sort.column !== 'number' || letters.size < 2) return sorted.map(line);
  return [...letters].flatMap(([title, letter]): RegisterLine[] => {
    const members = sorted.filter((row) => row.group === title);
    if (members.length === 0) return [];
    const heading: RegisterLine = {
      key: `group ${letter}`,
      type: 'group',
      letter,
      title: title === '' ? 'Without a group' : title,
      count: members.length,
    };
    return [heading, ...members.map(line)];
  });
}

/** `5 draft, 3 for check, 2 locked` */
export function stateSummary(rows: readonly RegisterRow[]): string {
  const counts = stateOrder.map((state) => ({ state, count: rows.filter((row) => row.state === state).length }));
  const parts = counts.filter(({ count }) => count > 0).map(({ state, count }) => `${count} ${state}`);
  return parts.length > 0 ? parts.join(', ') : 'no calculation yet';
}
