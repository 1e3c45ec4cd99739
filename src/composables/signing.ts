import { computed, ref, shallowRef } from 'vue';
import type { Condition, Conditions, RevisionDetail } from '#contract';
import { ApiError } from 'src/api/api-error';
import { getConditions } from 'src/api/revisions';

/** Groups of four, four to a line: `4f1c 9a07 e2d8 51b6`. */
export function fingerprintLines(fingerprint: string): string[] {
  const groups = fingerprint.replace(/^[a-z0-9-]+:/i, '').match(/.{1,4}/g) ?? [];
  const lines: string[] = [];
  for (let at = 0; at < groups.length; at += 4) lines.push(groups.slice(at, at + 4).join(' '));
  return lines;
}

/** The state of a dialog in which somebody signs: conditions, reasons, password, and what went wrong. */
export function useSigning(revisionId: () => string, concerned: () => readonly Condition['id'][]) {
  const conditions = shallowRef<Conditions>();
  const reasons = ref<Record<string, string>>({});
  const password = ref('');
  const passwordProblem = ref('');
  const problem = ref('');
  const busy = ref(false);

  async function begin(): Promise<void> {
    conditions.value = undefined;
    password.value = '';
    passwordProblem.value = '';
    problem.value = '';
    await fetch();
  }
  async function fetch(): Promise<void> {
    try {
      conditions.value = await getConditions(revisionId());
    } catch (error) {
      problem.value = error instanceof Error ? error.message : 'the conditions could not be fetched';
    }
  }

  const shown = computed(
    () => conditions.value?.conditions.filter((condition) => concerned().includes(condition.id)) ?? [],
  );
  const open = computed(() => shown.value.filter((condition) => !condition.met));
  /** Open conditions that no reason can leave behind. */
  const blocking = computed(() => open.value.filter((condition) => condition.items.length === 0));
  const unreasoned = computed(() =>
    open.value.flatMap((condition) => condition.items).filter((item) => (reasons.value[item.key] ?? '').trim() === ''),
  );

  /** Signs; answers the revision as it is then, or undefined when it was refused. */
  async function sign(act: (fingerprint: string) => Promise<RevisionDetail>): Promise<RevisionDetail | undefined> {
    if (conditions.value === undefined) return undefined;
    busy.value = true;
    problem.value = '';
    passwordProblem.value = '';
    try {
      return await act(conditions.value.contentFingerprint);
    } catch (error) {
      if (error instanceof ApiError && error.code === 'WRONG_PASSWORD') passwordProblem.value = error.message;
      else problem.value = error instanceof Error ? error.message : 'it could not be signed';
      if (error instanceof ApiError && error.status === 409) await fetch();
      return undefined;
    } finally {
      busy.value = false;
    }
  }
  return { conditions, shown, reasons, password, passwordProblem, problem, busy, blocking, unreasoned, begin, sign };
}
