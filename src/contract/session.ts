import { z } from 'zod';

export const signInRequest = z.object({
  signInName: z.string().trim().min(1).max(100),
  password: z.string().min(1).max(200),
});
export type SignInRequest = z.infer<typeof signInRequest>;

export const person = z.object({
  id: z.uuid(),
  signInName: z.string(),
  /** As printed: `O. Varga`. */
  name: z.string(),
  initials: z.string(),
});
export type Person = z.infer<typeof person>;

export const account = person.extend({
  email: z.string(),
  administrator: z.boolean(),
  active: z.boolean(),
});
export type Account = z.infer<typeof account>;

/** Answer of `GET /api/session` and `POST /api/session`. */
export const session = z.object({ person: account });
export type Session = z.infer<typeof session>;

export const createPersonRequest = z.object({
  signInName: z
    .string()
    .trim()
    .min(2)
    .max(100)
    .regex(/^[a-z0-9._-]+$/, 'small letters, figures, dot, dash and underscore only'),
  name: z.string().trim().min(1).max(100),
  initials: z.string().trim().min(1).max(4),
  email: z.email().max(200),
  password: z.string().min(12, 'at least 12 characters').max(200),
  administrator: z.boolean().default(false),
});
export type CreatePersonRequest = z.input<typeof createPersonRequest>;

export const changePersonRequest = z
  .object({
    name: z.string().trim().min(1).max(100),
    initials: z.string().trim().min(1).max(4),
    email: z.email().max(200),
    password: z.string().min(12, 'at least 12 characters').max(200),
    administrator: z.boolean(),
    active: z.boolean(),
  })
  .partial();
export type ChangePersonRequest = z.infer<typeof changePersonRequest>;
