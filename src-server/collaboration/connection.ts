import type { WebSocket } from 'ws';
import type { Account } from '#contract';
import type { Guest, Writing } from './admission';
import { Allowance } from './allowance';

/** A person typing sends about ten messages a second; a stock client also sends back what it hears of others. */
const messages = { burst: 1000, perSecond: 300 } as const;
/** Room for what was written during a long time without a line, then for steady work. */
const bytes = { burst: 12_000_000, perSecond: 1_000_000 } as const;
/** A browser that takes in less than it is sent is let go; it comes back and asks for what it lacks. */
const mostUnsent = 16_000_000;

/** One browser at one document. */
export class Connection {
  alive = true;
  writing: Writing;
  /** Updates of this connection that are in the database, and whether its first answer is. */
  readonly kept = { updates: 0, first: false };
  private readonly messages = new Allowance(messages.burst, messages.perSecond);
  private readonly bytes = new Allowance(bytes.burst, bytes.perSecond);
  /** Messages that wait until it is decided what this person may do. */
  private inbox: Uint8Array[] = [];
  private decisions: Promise<void> = Promise.resolve();
  private deciding = 0;
  /** Called when messages that were held back can be dealt with. */
  onDecided: () => void = () => undefined;

  constructor(
    readonly socket: WebSocket,
    readonly guest: Guest,
  ) {
    this.writing = guest.writing;
  }

  get account(): Account {
    return this.guest.account;
  }

  send(data: Uint8Array): void {
    if (this.socket.readyState !== this.socket.OPEN) return;
    if (this.socket.bufferedAmount > mostUnsent) this.socket.terminate();
    else this.socket.send(data);
  }

  close(code: number, reason: string): void {
    this.inbox = [];
    this.socket.close(code, reason);
  }

  get open(): boolean {
    return this.socket.readyState === this.socket.OPEN;
  }

  /** Whether a message is within the allowance. */
  within(size: number): boolean {
    const [one, other] = [this.messages.take(1), this.bytes.take(size)];
    return one && other;
  }

  put(data: Uint8Array): void {
    this.inbox.push(data);
  }

  /** The messages to be dealt with now, in their order; none while something is being decided. */
  takeInbox(): readonly Uint8Array[] {
    if (this.deciding > 0) return [];
    const waiting = this.inbox;
    this.inbox = [];
    return waiting;
  }

  /** Holds messages back until `decide` is done; one decision after the other, so that the latest one stands. */
  async whileDeciding(decide: () => Promise<void>): Promise<void> {
    this.deciding += 1;
    this.decisions = this.decisions.then(decide).finally(() => {
      this.deciding -= 1;
      if (this.deciding === 0) this.onDecided();
    });
    await this.decisions;
  }
}
