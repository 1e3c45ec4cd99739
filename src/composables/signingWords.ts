import type { Condition } from '#contract';
import { nextLetter } from './useRevision';

export type SigningKind = 'handOver' | 'check' | 'lock';

export interface SigningWords {
  title: string;
  before: string;
  /** Caption beside the one who signs. */
  meaning: string;
  note: string;
  doesHead: string;
  does: string;
  action: string;
}

/**
 * Which conditions concern an act: one hands over what is not ticked yet; whether the checker is
 * independent was settled when the check was signed.
 */
export const signingConditions: Readonly<Record<SigningKind, readonly Condition['id'][]>> = {
  handOver: ['errors', 'requirements', 'ranges', 'tbv'],
  check: ['ticks', 'remarks', 'errors', 'requirements', 'ranges', 'tbv', 'recomputed', 'independence', 'signatures'],
  lock: ['ticks', 'remarks', 'errors', 'requirements', 'ranges', 'tbv', 'recomputed', 'signatures'],
};

/** What the three signing dialogs say. */
export function signingWords(kind: SigningKind, letter: string): SigningWords {
  switch (kind) {
    case 'handOver':
      return {
        title: `Hand over revision ${letter} for check`,
        before: 'As it stands',
        meaning: 'Prepares',
        note: 'A word to the checker',
        doesHead: 'What handing over does',
        does: 'You sign as the one who prepared it. The checker is told; what is corrected afterwards makes ticks fall.',
        action: 'Sign and hand over',
      };
    case 'check':
      return {
        title: `Sign the check of revision ${letter}`,
        before: 'Before signing',
        meaning: 'Checks',
        note: '',
        doesHead: 'What signing does',
        does: `You sign that every cell of revision ${letter} was checked. It can then be locked by the lead, and no longer be written.`,
        action: 'Sign the check',
      };
    case 'lock':
      return {
        title: `Lock revision ${letter}`,
        before: 'Before locking',
        meaning: 'Locks',
        note: 'What this revision is or changes, for the revision table',
        doesHead: 'What locking does',
        does: `Revision ${letter} can be read and printed, no longer written. A later change begins revision ${nextLetter(letter)}.`,
        action: `Sign and lock ${letter}`,
      };
  }
}
