import type { ErrorCode } from '#contract';

const statusOf: Readonly<Record<ErrorCode, number>> = {
  INVALID_INPUT: 400,
  NOT_SIGNED_IN: 401,
  WRONG_PASSWORD: 401,
  TOO_MANY_TRIES: 429,
  FORBIDDEN: 403,
  WRONG_ORIGIN: 403,
  NOT_FOUND: 404,
  WRONG_STATE: 409,
  CONTENT_CHANGED: 409,
  CONDITIONS_OPEN: 409,
  NOT_INDEPENDENT: 403,
  NUMBER_TAKEN: 409,
  NAME_TAKEN: 409,
  TOO_LARGE: 413,
  STORE_FULL: 507,
  INTERNAL: 500,
};

/** An answer that is not the one asked for: code, status, and a sentence that says what to do. */
export class ApiError extends Error {
  readonly status: number;

  constructor(
    readonly code: ErrorCode,
    message: string,
    readonly fields?: Record<string, string>,
  ) {
    super(message);
    this.status = statusOf[code];
  }
}

export const notFound = (what: string): ApiError =>
  new ApiError('NOT_FOUND', `There is no such ${what}, or you are not a member of its project.`);
export const forbidden = (sentence: string): ApiError => new ApiError('FORBIDDEN', sentence);

/** PostgreSQL's code of an error (`23505`), when it has one. */
export function databaseCode(error: unknown): string | undefined {
  const code: unknown = typeof error === 'object' && error !== null ? Reflect.get(error, 'code') : undefined;
  return typeof code === 'string' ? code : undefined;
}

/** The violated constraint of a database error. */
export function violatedConstraint(error: unknown): string | undefined {
  const name: unknown = typeof error === 'object' && error !== null ? Reflect.get(error, 'constraint') : undefined;
  return typeof name === 'string' ? name : undefined;
}
