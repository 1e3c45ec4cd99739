import type { Account, Verification } from '#contract';
import { canonicalJson, type ExchangeCalculation } from '#document';
import type { Database } from '../db/index';
import { ApiError } from '../errors/index';
import { listRemarks, listTicks } from '../repositories/check';
import { listSignatures, type RevisionRow } from '../repositories/revisions';
import { authorizeRevision, type RevisionAccess } from './access';
import type { ServerContext } from './context';
import { computeContent, contentFingerprint, currentContent, figuresOf } from './documents';
import { canonicalRecord, currentVersions, fingerprintOf, type LockedRecord } from './locked-record';

/** A person may be called otherwise today than when the record was frozen: ids are compared, not names. */
function withoutNames(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(withoutNames);
  if (typeof value !== 'object' || value === null) return value;
  const isPerson = 'initials' in value;
  const entries = Object.entries(value).filter(([key]) => !isPerson || key === 'id');
  return Object.fromEntries(entries.map(([key, part]) => [key, withoutNames(part)]));
}

const same = (a: unknown, b: unknown): boolean => canonicalJson(withoutNames(a)) === canonicalJson(withoutNames(b));

/** The record put together anew from the rows as they are now. */
async function recordOfRows(db: Database, revision: RevisionRow): Promise<LockedRecord> {
  const signatures = (await listSignatures(db, [revision.id])).get(revision.id) ?? [];
  return {
    content: revision.content as ExchangeCalculation,
    results: revision.results as LockedRecord['results'],
    versions: revision.versions as LockedRecord['versions'],
    changeNote: revision.change_note,
    reasons: revision.reasons,
    remarks: await listRemarks(db, revision.id),
    ticks: await listTicks(db, revision.id),
    signatures: signatures.filter((signature) => signature.meaning !== 'approved'),
  };
}

const partWords: Readonly<Record<keyof LockedRecord, string>> = {
  content: 'the content',
  results: 'the results',
  versions: 'the versions',
  changeNote: 'the note of the change',
  reasons: 'the reasons',
  remarks: 'the remarks',
  ticks: 'the ticks',
  signatures: 'the signatures',
};

async function differencesOfRecord(db: Database, revision: RevisionRow): Promise<string[]> {
  const { canonical, fingerprint } = revision;
  if (canonical === null || fingerprint === null) return ['there is no frozen record'];
  const differences: string[] = [];
  if (fingerprintOf(canonical) !== fingerprint) differences.push('the record does not have the fingerprint any more');
  const signatures = (await listSignatures(db, [revision.id])).get(revision.id) ?? [];
  if (signatures.find((signature) => signature.meaning === 'approved')?.fingerprint !== fingerprint)
    differences.push('the signature of the lock belongs to another record');
  const now: unknown = JSON.parse(canonicalRecord(await recordOfRows(db, revision)));
  const then: unknown = JSON.parse(canonical);
  for (const [part, words] of Object.entries(partWords))
    if (!same(Reflect.get(now as object, part), Reflect.get(then as object, part)))
      differences.push(`other than what was signed: ${words}`);
  return differences;
}

/** Whether the shared document still says what the signatures were given for. */
async function differencesOfDocument(db: Database, { calculation, revision }: RevisionAccess): Promise<string[]> {
  const fingerprint = contentFingerprint(await currentContent(db, calculation, revision));
  const frozen = contentFingerprint(revision.content as ExchangeCalculation);
  return fingerprint === frozen ? [] : ['the document is not what was signed'];
}

/** Computes the frozen content anew, with the engine of today. */
function differencesOfResults(revision: RevisionRow): string[] {
  const frozen = revision.results as Record<string, string>;
  const today = figuresOf(computeContent(revision.content as ExchangeCalculation));
  const versions = same(revision.versions, currentVersions()) ? '' : ', with other versions than then';
  return [...new Set([...Object.keys(frozen), ...Object.keys(today)])]
    .filter((name) => frozen[name] !== today[name])
    .map((name) => `${name} was ${frozen[name] ?? 'not there'} and is ${today[name] ?? 'not there'}${versions}`);
}

/** Recomputes and compares a locked revision: what was signed against what is stored, and its figures against the engine. */
export async function verifyRevision(
  { db }: Pick<ServerContext, 'db'>,
  account: Account,
  revisionId: string,
): Promise<Verification> {
  const access = await authorizeRevision(db, account.id, revisionId, 'revision.read');
  const { revision } = access;
  if (revision.content === null)
    throw new ApiError('WRONG_STATE', `Revision ${revision.letter} is ${revision.state}: nothing of it is frozen yet.`);
  const differences = [
    ...(await differencesOfRecord(db, revision)),
    ...(await differencesOfDocument(db, access)),
    ...differencesOfResults(revision),
  ];
  return { sound: differences.length === 0, differences };
}
