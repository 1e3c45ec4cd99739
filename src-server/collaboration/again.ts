import { setTimeout as pause } from 'node:timers/promises';

const attempts = 4;
const firstPause = 10;

/** Transactions that met another one and may be tried again: serialization failure, deadlock. */
const passing: readonly unknown[] = ['40001', '40P01'];

/** Runs a transaction, and again when it only met another one on its way. */
export async function again<Result>(transaction: () => Promise<Result>): Promise<Result> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await transaction();
    } catch (error) {
      const code: unknown = error instanceof Error ? Reflect.get(error, 'code') : undefined;
      if (attempt >= attempts || !passing.includes(code)) throw error;
      await pause(firstPause * attempt);
    }
  }
}
