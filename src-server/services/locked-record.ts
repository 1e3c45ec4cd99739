import { createHash } from 'node:crypto';
import type { Person, Remark, Signature, Tick } from '#contract';
import { canonicalJson, type ExchangeCalculation } from '#document';
import { catalogueVersion, engineVersion, propertiesVersion } from '#engine';

/** What a locked revision is: everything that its fingerprint covers. */
export interface LockedRecord {
  content: ExchangeCalculation;
  /** Name → value to 12 significant digits with its SI unit. */
  results: Record<string, string>;
  versions: { engine: string; catalogue: string; properties: string };
  changeNote: string;
  /** Why something was left open. */
  reasons: { about: string; reason: string }[];
  remarks: Remark[];
  ticks: Tick[];
  /** As prepared and as checked; the one of the lock is bound to the fingerprint of this record. */
  signatures: Signature[];
}

export const currentVersions = (): LockedRecord['versions'] => ({
  engine: engineVersion,
  catalogue: catalogueVersion,
  properties: propertiesVersion,
});

/** People by their ids and the names they had. */
const named = ({ id, name, initials }: Person) => ({ id, name, initials });

/** The record as one text: sorted keys, numbers to 12 significant digits, ticks in the order of their cells' ids. */
export function canonicalRecord(record: LockedRecord): string {
  const ticks = [...record.ticks].sort((a, b) => (a.cellId < b.cellId ? -1 : 1));
  return canonicalJson({
    ...record,
    remarks: record.remarks.map((remark) => ({
      ...remark,
      author: named(remark.author),
      answers: remark.answers.map((answer) => ({ ...answer, author: named(answer.author) })),
    })),
    ticks: ticks.map((tick) => ({ ...tick, person: named(tick.person) })),
    signatures: record.signatures.map((signature) => ({ ...signature, person: named(signature.person) })),
  });
}

/** SHA-256 in hexadecimal. */
export const fingerprintOf = (canonical: string): string => createHash('sha256').update(canonical).digest('hex');
