import type { ErrorCode } from '#contract';

/** An answer that is not 2xx, or no answer at all (`NO_LINE`). */
export class ApiError extends Error {
  override readonly name = 'ApiError';

  constructor(
    readonly code: ErrorCode | 'NO_LINE' | 'UNREADABLE',
    message: string,
    /** HTTP status; 0 when the server did not answer. */
    readonly status: number,
    /** Sentences by field, for INVALID_INPUT. */
    readonly fields: Readonly<Record<string, string>> = {},
  ) {
    super(message);
  }
}
