import { onScopeDispose, shallowRef } from 'vue';
import type { Awareness } from 'y-protocols/awareness';
import { z } from 'zod';
import type { PersonHere } from './sheetContext';

const state = z.object({
  user: z.object({ id: z.string(), name: z.string(), initials: z.string() }),
  cell: z.string().optional(),
  writing: z.boolean().optional(),
});

const hands = 4;

/** Which of the hand colours a person has: the same at every screen. */
export function handOf(personId: string): number {
  let sum = 0;
  for (const sign of personId) sum = (sum * 31 + sign.charCodeAt(0)) % 9973;
  return (sum % hands) + 1;
}

/** Who is at the sheet, one entry a person, oneself first. */
export function usePeopleHere(awareness: Awareness, me: { id: string }) {
  const people = shallowRef<readonly PersonHere[]>([]);
  const read = () => {
    const found = new Map<string, PersonHere>();
    for (const [clientId, given] of awareness.getStates()) {
      const parsed = state.safeParse(given);
      if (!parsed.success) continue;
      const { user, cell, writing = false } = parsed.data;
      const mine = user.id === me.id;
      const before = found.get(user.id);
      // Of several windows of a person the one in which something is written counts.
      if (before !== undefined && (before.writing || !writing) && clientId !== awareness.clientID) continue;
      found.set(user.id, {
        key: user.id,
        name: user.name,
        initials: user.initials,
        hand: mine ? 0 : handOf(user.id),
        me: mine,
        cellId: cell,
        writing,
      });
    }
    people.value = [...found.values()].sort((a, b) => Number(b.me) - Number(a.me) || a.name.localeCompare(b.name));
  };
  awareness.on('change', read);
  onScopeDispose(() => awareness.off('change', read));
  read();
  return people;
}
