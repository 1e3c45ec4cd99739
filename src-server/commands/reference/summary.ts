/** What a comparison with a table of check values came to. */
export interface Summary {
  passed: number;
  failed: number;
  skipped: number;
  /** One line for each failing row, and one for each reason of skipping. */
  lines: string[];
}

/** Whether a computed value agrees with the expected one within a relative tolerance. */
export function agrees(got: number, expected: number, tolerance: number): boolean {
  if (expected === 0) return Math.abs(got) <= tolerance;
  return Math.abs(got / expected - 1) <= tolerance;
}

/** Counts reasons of skipping, for one line each. */
export class Skips {
  private readonly counts = new Map<string, number>();

  add(reason: string): void {
    this.counts.set(reason, (this.counts.get(reason) ?? 0) + 1);
  }

  get total(): number {
    return [...this.counts.values()].reduce((sum, count) => sum + count, 0);
  }

  lines(): string[] {
    return [...this.counts].map(([reason, count]) => `skipped ${count}: ${reason}`);
  }
}
