import { z } from 'zod';
import { revisionStates, roles } from './access';
import { person } from './session';

export const member = z.object({ person, role: z.enum(roles) });
export type Member = z.infer<typeof member>;

export const project = z.object({
  id: z.uuid(),
  /** `2417`; part of the numbers of its calculations. */
  number: z.string(),
  title: z.string(),
  firm: z.string(),
  client: z.string(),
  place: z.string(),
  begun: z.iso.date(),
  /** Role of the person who asks; null for an administrator who is no member. */
  role: z.enum(roles).nullable(),
  members: z.array(member),
});
export type Project = z.infer<typeof project>;

export const createProjectRequest = z.object({
  number: z
    .string()
    .trim()
    .min(1)
    .max(20)
    .regex(/^[A-Za-z0-9._-]+$/, 'letters, figures, dot, dash and underscore only'),
  title: z.string().trim().min(1).max(200),
  firm: z.string().trim().max(200).default(''),
  client: z.string().trim().max(200).default(''),
  place: z.string().trim().max(200).default(''),
});
export type CreateProjectRequest = z.input<typeof createProjectRequest>;
export const changeProjectRequest = z
  .object({
    title: z.string().trim().min(1).max(200),
    firm: z.string().trim().max(200),
    client: z.string().trim().max(200),
    place: z.string().trim().max(200),
  })
  .partial();
export type ChangeProjectRequest = z.infer<typeof changeProjectRequest>;

export const setMemberRequest = z.object({ role: z.enum(roles) });
export type SetMemberRequest = z.infer<typeof setMemberRequest>;

/** One line of the register: a calculation at its latest revision. */
export const registerRow = z.object({
  calculationId: z.uuid(),
  revisionId: z.uuid(),
  number: z.string(),
  title: z.string(),
  /** Heading under which it stands in the register; may be empty. */
  group: z.string(),
  letter: z.string(),
  state: z.enum(revisionStates),
  cells: z.number().int(),
  ticked: z.number().int(),
  changed: z.number().int(),
  openRemarks: z.number().int(),
  tbv: z.number().int(),
  outsideRange: z.number().int(),
  lastChange: z.iso.datetime(),
  lastChangeBy: z.string().nullable(),
  /** Initials of those who wrote in it, and of the checker it was handed to or who ticked. */
  prepares: z.array(z.string()),
  checks: z.array(z.string()),
  /** Whether the person who asks wrote in it. */
  mine: z.boolean(),
});
export type RegisterRow = z.infer<typeof registerRow>;

export const createCalculationRequest = z.object({
  title: z.string().trim().min(1).max(200),
  group: z.string().trim().max(100).default(''),
  start: z.discriminatedUnion('from', [
    z.object({ from: z.literal('empty') }),
    z.object({ from: z.literal('example'), example: z.string().max(100) }),
    z.object({ from: z.literal('calculation'), calculationId: z.uuid() }),
  ]),
});
export type CreateCalculationRequest = z.input<typeof createCalculationRequest>;

export const changeCalculationRequest = z
  .object({
    title: z.string().trim().min(1).max(200),
    group: z.string().trim().max(100),
  })
  .partial();
export type ChangeCalculationRequest = z.infer<typeof changeCalculationRequest>;

export const exampleEntry = z.object({ id: z.string(), title: z.string(), purpose: z.string() });
export type ExampleEntry = z.infer<typeof exampleEntry>;
