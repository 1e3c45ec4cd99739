import { z } from 'zod';
import { acts, revisionStates } from './access';
import { person } from './session';

export const meanings = ['prepared', 'checked', 'approved'] as const;
export type Meaning = (typeof meanings)[number];

export const signature = z.object({
  meaning: z.enum(meanings),
  person,
  signedAt: z.iso.datetime(),
  fingerprint: z.string(),
});
export type Signature = z.infer<typeof signature>;

/** One row of the revision table. */
export const revisionEntry = z.object({
  id: z.uuid(),
  letter: z.string(),
  state: z.enum(revisionStates),
  /** What changed, as written when it was locked. */
  changeNote: z.string(),
  begunAt: z.iso.datetime(),
  lockedAt: z.iso.datetime().nullable(),
  signatures: z.array(signature),
  fingerprint: z.string().nullable(),
});
export type RevisionEntry = z.infer<typeof revisionEntry>;

/** `GET /api/revisions/:revisionId`, and the answer of every act on a revision. */
export const revisionDetail = z.object({
  revision: revisionEntry,
  calculation: z.object({ id: z.uuid(), number: z.string(), title: z.string(), group: z.string() }),
  project: z.object({
    id: z.uuid(),
    number: z.string(),
    title: z.string(),
    firm: z.string(),
    client: z.string(),
    place: z.string(),
  }),
  /** All revisions of the calculation, oldest first. */
  revisions: z.array(revisionEntry),
  /** Who wrote in this revision. */
  writers: z.array(person),
  /** Acts that the person who asks may do now, by role and state. */
  acts: z.array(z.enum(acts)),
  /** Reasons given at the lock for what was left open. */
  reasons: z.array(z.object({ about: z.string(), reason: z.string() })),
});
export type RevisionDetail = z.infer<typeof revisionDetail>;

const password = z.string().min(1).max(200);
/** The signer states which content was on the screen; 409 CONTENT_CHANGED when it differs. */
const contentFingerprint = z.string().max(100);

export const handOverRequest = z.object({
  password,
  contentFingerprint,
  checkerId: z.uuid().optional(),
  note: z.string().trim().max(2000).default(''),
});
export type HandOverRequest = z.input<typeof handOverRequest>;
export const returnRequest = z.object({ reason: z.string().trim().min(1).max(2000) });
export type ReturnRequest = z.infer<typeof returnRequest>;
export const checkRequest = z.object({ password, contentFingerprint });
export type CheckRequest = z.infer<typeof checkRequest>;
export const lockRequest = z.object({
  password,
  contentFingerprint,
  changeNote: z.string().trim().min(1, 'say in a sentence what this revision is or changes').max(2000),
  /** One reason for every condition that is left open: `tbv:<cell id>`, `requirement:<cell id>:<line>`, `range:<cell id>`. */
  reasons: z.record(z.string().max(200), z.string().trim().min(1).max(2000)).default({}),
});
export type LockRequest = z.input<typeof lockRequest>;

/** `GET /api/revisions/:revisionId/conditions`: what stands between this revision and the next act. */
export const condition = z.object({
  id: z.enum([
    'ticks',
    'remarks',
    'ranges',
    'recomputed',
    'tbv',
    'requirements',
    'errors',
    'independence',
    'signatures',
  ]),
  met: z.boolean(),
  sentence: z.string(),
  /** Items that may be left open with a reason. */
  items: z.array(z.object({ key: z.string(), cellId: z.string(), sentence: z.string() })),
});
export type Condition = z.infer<typeof condition>;
export const conditions = z.object({ contentFingerprint: z.string(), conditions: z.array(condition) });
export type Conditions = z.infer<typeof conditions>;

/** `GET /api/revisions/:revisionId/verification`: a locked revision recomputed and compared with what was signed. */
export const verification = z.object({ sound: z.boolean(), differences: z.array(z.string()) });
export type Verification = z.infer<typeof verification>;

export const answer = z.object({ id: z.uuid(), author: person, text: z.string(), at: z.iso.datetime() });
export const remark = z.object({
  id: z.uuid(),
  number: z.number().int(),
  cellId: z.string(),
  author: person,
  text: z.string(),
  at: z.iso.datetime(),
  state: z.enum(['open', 'answered', 'closed']),
  answers: z.array(answer),
});
export type Remark = z.infer<typeof remark>;
export const askRemarkRequest = z.object({
  cellId: z.string().min(1).max(100),
  text: z.string().trim().min(1).max(5000),
});
export type AskRemarkRequest = z.infer<typeof askRemarkRequest>;
export const answerRemarkRequest = z.object({ text: z.string().trim().min(1).max(5000) });
export type AnswerRemarkRequest = z.infer<typeof answerRemarkRequest>;

export const tick = z.object({
  cellId: z.string(),
  person,
  at: z.iso.datetime(),
  /** Of the cell when it was ticked; it has changed since when the cell's own differs now. */
  fingerprint: z.string(),
  dependsOn: z.record(z.string(), z.string()),
});
export type Tick = z.infer<typeof tick>;
/** The checker's screen says what it showed; 409 CONTENT_CHANGED when the server computes another. */
export const setTickRequest = z.object({ fingerprint: z.string().min(1).max(100) });
export type SetTickRequest = z.infer<typeof setTickRequest>;

export const trailEntry = z.object({
  id: z.number().int(),
  at: z.iso.datetime(),
  person: person.nullable(),
  calculation: z.object({ id: z.uuid(), number: z.string(), title: z.string() }).nullable(),
  letter: z.string().nullable(),
  act: z.string(),
  /** A sentence: `locked revision C`. */
  sentence: z.string(),
  detail: z.record(z.string(), z.unknown()),
  hash: z.string(),
});
export type TrailEntry = z.infer<typeof trailEntry>;
export const trailPage = z.object({ entries: z.array(trailEntry), more: z.boolean() });
export type TrailPage = z.infer<typeof trailPage>;
export const trailQuery = z.object({
  calculationId: z.uuid().optional(),
  before: z.coerce.number().int().optional(),
});
