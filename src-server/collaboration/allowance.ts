/** Something that is used up and comes back with time: messages, bytes. */
export class Allowance {
  private left: number;

  constructor(
    private readonly burst: number,
    private readonly perSecond: number,
    private last = Date.now(),
  ) {
    this.left = burst;
  }

  /** Takes an amount; false when it is more than there is. */
  take(amount: number, now = Date.now()): boolean {
    this.left = Math.min(this.burst, this.left + (Math.max(0, now - this.last) / 1000) * this.perSecond);
    this.last = now;
    this.left -= amount;
    return this.left >= 0;
  }
}
