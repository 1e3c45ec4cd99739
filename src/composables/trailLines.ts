import type { TrailEntry } from '#contract';
import { longDay } from './dates';

export const trailFilters = ['all', 'states', 'remarks', 'ticks', 'writing', 'people'] as const;
export type TrailFilter = (typeof trailFilters)[number];

export const trailFilterWords: Readonly<Record<TrailFilter, string>> = {
  all: 'All',
  states: 'States',
  remarks: 'Remarks',
  ticks: 'Ticks',
  writing: 'Writing',
  people: 'Project and people',
};

/** First part of an act (`remark.ask`) → the choice under which it is shown. */
const kinds: Readonly<Record<string, TrailFilter>> = {
  revision: 'states',
  remark: 'remarks',
  tick: 'ticks',
  content: 'writing',
  calculation: 'writing',
  project: 'people',
  member: 'people',
  person: 'people',
};

export function kindOf(entry: TrailEntry): TrailFilter {
  return kinds[entry.act.split('.')[0] ?? ''] ?? 'writing';
}

/** `lock` reversed, `red` the checker's remarks, `green` ticks, else plain. */
export function toneOf(entry: TrailEntry): 'lock' | 'red' | 'green' | 'plain' {
  if (entry.act === 'revision.lock') return 'lock';
  const kind = kindOf(entry);
  if (kind === 'remarks') return 'red';
  return kind === 'ticks' ? 'green' : 'plain';
}

const text = (value: unknown): string =>
  typeof value === 'string' ? value : typeof value === 'number' ? String(value) : '';

/** What is worth a look in the particulars of an entry: before and after, a reason, a note, a fingerprint. */
export function particulars({ detail, sentence }: Pick<TrailEntry, 'detail' | 'sentence'>): string {
  const before = text(detail.before ?? detail.from);
  const after = text(detail.after ?? detail.to);
  const change = before !== '' && after !== '' ? `${before} → ${after}` : before || after;
  const said = ['changeNote', 'reason', 'note', 'text'].map((key) => text(detail[key])).filter((part) => part !== '');
  const print = text(detail.fingerprint ?? detail.contentFingerprint);
  return [change, ...said, print === '' ? '' : shortFingerprint(print)]
    .filter((part) => part !== '' && !sentence.includes(part))
    .join('; ');
}

/** `4f1c 9a07`: the beginning of a fingerprint, enough to compare by eye. */
export function shortFingerprint(hash: string, groups = 2): string {
  return (hash.slice(0, groups * 4).match(/.{1,4}/g) ?? []).join(' ');
}

/** One line of the ledger: an act, or several of the same kind in a row, of which `entry` is the newest. */
export interface TrailLine {
  entry: TrailEntry;
  /** All of the row, newest first; one where nothing is folded. */
  entries: TrailEntry[];
}

export interface TrailDay {
  day: string;
  count: number;
  lines: TrailLine[];
}

const foldable = ['tick.set', 'tick.remove', 'content.write'];
/** Acts further apart than this stand on lines of their own. */
const foldWithin = 15 * 60_000;

function foldsInto(line: TrailLine, entry: TrailEntry): boolean {
  const oldest = line.entries.at(-1) ?? line.entry;
  return (
    foldable.includes(entry.act) &&
    line.entry.act === entry.act &&
    line.entry.person?.id === entry.person?.id &&
    line.entry.calculation?.id === entry.calculation?.id &&
    line.entry.letter === entry.letter &&
    Date.parse(oldest.at) - Date.parse(entry.at) <= foldWithin
  );
}

/** Entries (newest first) under the day on which they were made; ticks in a row are folded into one line. */
export function trailDays(entries: readonly TrailEntry[]): TrailDay[] {
  const days: TrailDay[] = [];
  for (const entry of entries) {
    const day = longDay(entry.at);
    let last = days.at(-1);
    if (last?.day !== day) days.push((last = { day, count: 0, lines: [] }));
    last.count += 1;
    const line = last.lines.at(-1);
    if (line !== undefined && foldsInto(line, entry)) line.entries.push(entry);
    else last.lines.push({ entry, entries: [entry] });
  }
  return days;
}

/** `ticked a cell`, and of six in a row `ticked 6 cells`. */
export function lineSentence({ entry, entries }: TrailLine): string {
  if (entries.length === 1) return entry.sentence;
  if (entry.act === 'tick.set') return `ticked ${entries.length} cells`;
  if (entry.act === 'tick.remove') return `took back the ticks of ${entries.length} cells`;
  return `${entry.sentence}, ${entries.length} times`;
}

/** A field of a table in comma-separated form; a leading sign is kept from being taken for a formula. */
function csvField(value: string): string {
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\n\r]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** The trail as a table that other programs read. */
export function trailCsv(entries: readonly TrailEntry[]): string {
  const head = ['number', 'time (UTC)', 'who', 'what', 'calculation', 'revision', 'particulars', 'hash'];
  const rows = entries.map((entry) => [
    String(entry.id),
    entry.at,
    entry.person?.name ?? 'the sheet',
    entry.sentence,
    entry.calculation?.number ?? '',
    entry.letter ?? '',
    particulars(entry),
    entry.hash,
  ]);
  return [head, ...rows].map((row) => row.map(csvField).join(',')).join('\r\n');
}
