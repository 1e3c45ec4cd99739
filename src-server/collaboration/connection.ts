import type { Account } from '#contract';
import type { WebSocket } from 'ws';

/** Messages in a burst, and how many more a second: a person typing sends about ten. */
const burst = 400;
const refillPerSecond = 100;

/** One browser at one document. */
export class Connection {
  /** Awareness ids that this browser speaks for. */
  readonly awarenessIds = new Set<number>();
  alive = true;
  /** Updates of this connection that are in the database, and whether its first answer is. */
  kept = { updates: 0, first: false };
  private allowance = burst;
  private lastRefill = Date.now();

  constructor(
    readonly socket: WebSocket,
    readonly account: Account,
    readonly sessionId: string,
    public canWrite: boolean,
  ) {}

  send(data: Uint8Array): void {
    if (this.socket.readyState === this.socket.OPEN) this.socket.send(data);
  }

  close(code: number, reason: string): void {
    this.socket.close(code, reason);
  }

  /** Whether one more message is within the allowance. */
  withinRate(now = Date.now()): boolean {
    this.allowance = Math.min(burst, this.allowance + ((now - this.lastRefill) / 1000) * refillPerSecond);
    this.lastRefill = now;
    this.allowance -= 1;
    return this.allowance >= 0;
  }
}
