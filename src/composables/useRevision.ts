import { computed, shallowRef, watch, type Ref } from 'vue';
import type { Act, RevisionDetail, RevisionEntry } from '#contract';
import type { CellInput } from '#engine';
import { getCalculation } from 'src/api/calculations';
import { getRevisionContent } from 'src/api/revisions';

export type Signing = 'handOver' | 'return' | 'check' | 'lock' | 'begin';

export interface NextAct {
  kind: Signing;
  word: string;
}

/** The letter after this one: A, B … Z, AA. */
export function nextLetter(letter: string): string {
  const last = letter.slice(-1);
  if (last === '') return 'A';
  if (last === 'Z') return `${nextLetter(letter.slice(0, -1))}A`;
  return letter.slice(0, -1) + String.fromCharCode(last.charCodeAt(0) + 1);
}

const sameCell = (a: CellInput, b: CellInput) =>
  a.kind === b.kind && a.source === b.source && JSON.stringify(settingsOf(a)) === JSON.stringify(settingsOf(b));

function settingsOf({ settings }: CellInput): [string, unknown][] {
  return Object.entries(settings)
    .filter(([, value]) => value !== undefined && value !== '')
    .sort(([a], [b]) => a.localeCompare(b));
}

/** Ids of cells that are new or say something else than in the revision before. */
export function changedCells(before: readonly CellInput[], now: readonly CellInput[]): Set<string> {
  const old = new Map(before.map((cell) => [cell.id, cell]));
  return new Set(
    now
      .filter((cell) => {
        const was = old.get(cell.id);
        return was === undefined || !sameCell(was, cell);
      })
      .map((cell) => cell.id),
  );
}

function previousOf(detail: RevisionDetail): RevisionEntry | undefined {
  const at = detail.revisions.findIndex((revision) => revision.id === detail.revision.id);
  return detail.revisions[at - 1];
}

/** A revision with its calculation and project, and what this person may do with it next. */
export function useRevision(calculationId: string, letter: Readonly<Ref<string | undefined>>) {
  const detail = shallowRef<RevisionDetail>();
  const failure = shallowRef<unknown>();
  const before = shallowRef<readonly CellInput[]>();

  async function load(): Promise<void> {
    try {
      detail.value = await getCalculation(calculationId, letter.value);
      failure.value = undefined;
    } catch (error) {
      failure.value = error;
    }
  }

  const revisionId = computed(() => detail.value?.revision.id);
  const acts = computed<ReadonlySet<Act>>(() => new Set(detail.value?.acts));
  const latest = computed(() => detail.value?.revisions.at(-1)?.letter ?? '');
  const isLatest = computed(() => latest.value === detail.value?.revision.letter);

  const inCheck = computed(() => detail.value?.revision.state === 'for check');
  /** What is corrected while it is checked voids the signature of those who prepared it. */
  const standsAsPrepared = computed(
    () => inCheck.value && (detail.value?.revision.signatures.some(({ meaning }) => meaning === 'prepared') ?? false),
  );

  /** The one next action of this person, if there is one. */
  const nextAct = computed<NextAct | undefined>(() => {
    const own = detail.value?.revision.letter ?? '';
    if (acts.value.has('revision.lock')) return { kind: 'lock', word: `Lock revision ${own}` };
    if (acts.value.has('revision.check')) return { kind: 'check', word: 'Sign the check' };
    if (acts.value.has('revision.handOver') && !standsAsPrepared.value)
      return { kind: 'handOver', word: inCheck.value ? 'Sign again as prepared' : 'Hand over for check' };
    if (acts.value.has('revision.begin') && isLatest.value)
      return { kind: 'begin', word: `Begin revision ${nextLetter(own)}` };
    return undefined;
  });
  const canReturn = computed(() => acts.value.has('revision.return'));

  async function loadBefore(): Promise<void> {
    const previous = detail.value === undefined ? undefined : previousOf(detail.value);
    if (previous === undefined) {
      before.value = undefined;
      return;
    }
    try {
      before.value = (await getRevisionContent(previous.id)).cells;
    } catch {
      // Without the earlier content the sheet works; only its triangles are missing.
      before.value = undefined;
    }
  }
  watch(revisionId, loadBefore);

  return { detail, failure, load, revisionId, acts, latest, isLatest, nextAct, canReturn, before };
}
