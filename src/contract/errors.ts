import { z } from 'zod';

export const errorCodes = [
  'INVALID_INPUT',
  'NOT_SIGNED_IN',
  'WRONG_PASSWORD',
  'TOO_MANY_TRIES',
  'FORBIDDEN',
  'WRONG_ORIGIN',
  'NOT_FOUND',
  'WRONG_STATE',
  'CONTENT_CHANGED',
  'CONDITIONS_OPEN',
  'NOT_INDEPENDENT',
  'NUMBER_TAKEN',
  'NAME_TAKEN',
  'TOO_LARGE',
  'STORE_FULL',
  'INTERNAL',
] as const;
export type ErrorCode = (typeof errorCodes)[number];

/** Body of every answer that is not 2xx. */
export const errorBody = z.object({
  error: z.object({
    code: z.enum(errorCodes),
    /** What is wrong and what to do. */
    message: z.string(),
    /** Which fields, for INVALID_INPUT: path → sentence. */
    fields: z.record(z.string(), z.string()).optional(),
  }),
});
export type ErrorBody = z.infer<typeof errorBody>;
