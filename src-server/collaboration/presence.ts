import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import { z } from 'zod';
import type { Connection } from './connection';

/** A browser speaks for itself; a few more when it changed its number. */
const mostOfConnection = 4;
const mostInMessage = 1000;
const longestState = 4000;
/** How many of those who left are remembered, so that nobody takes over their number. */
const remembered = 1000;

const identifier = z.object({ client: z.number().int().min(0), clock: z.number().int().min(0) }).nullish();
const position = z.object({
  type: identifier,
  tname: z.string().max(100).nullish(),
  item: identifier,
  assoc: z.number().int().nullish(),
});
const tellable = z.object({
  cell: z.string().max(100).nullish().catch(undefined),
  writing: z.boolean().optional().catch(undefined),
  cursor: z.object({ anchor: position, head: position }).nullish().catch(undefined),
});

interface Entry {
  clientId: number;
  clock: number;
  /** JSON; `null` for gone. */
  state: string;
}

function readEntries(update: Uint8Array): Entry[] {
  const decoder = decoding.createDecoder(update);
  const count = decoding.readVarUint(decoder);
  if (count > mostInMessage) throw new Error('too many presences in one message');
  return Array.from({ length: count }, () => ({
    clientId: decoding.readVarUint(decoder),
    clock: decoding.readVarUint(decoder),
    state: decoding.readVarString(decoder),
  }));
}

/** In the form of y-protocols' awareness updates. */
function writeEntries(entries: readonly Entry[]): Uint8Array {
  const encoder = encoding.createEncoder();
  encoding.writeVarUint(encoder, entries.length);
  for (const { clientId, clock, state } of entries) {
    encoding.writeVarUint(encoder, clientId);
    encoding.writeVarUint(encoder, clock);
    encoding.writeVarString(encoder, state);
  }
  return encoding.toUint8Array(encoder);
}

/** Says nothing of anybody: a sign of life. */
export const noPresence = writeEntries([]);

/**
 * Who is at a document, in which cell, and where in it. A browser speaks for its own numbers only, and
 * under the name of its session, whatever it sends. Stock clients send back what they hear of others;
 * such parts are passed over.
 */
export class Presence {
  private readonly here = new Map<number, Entry & { owner: Connection }>();
  private readonly left = new Map<number, string>();

  /** Takes an awareness update; answers what to tell the others. Throws on one that is malformed. */
  take(connection: Connection, update: Uint8Array): Uint8Array | undefined {
    const told = readEntries(update).flatMap((entry) => this.takeEntry(connection, entry) ?? []);
    return told.length === 0 ? undefined : writeEntries(told);
  }

  private takeEntry(connection: Connection, { clientId, clock, state }: Entry): Entry | undefined {
    const before = this.here.get(clientId);
    const person = connection.account.id;
    // The line of somebody who came back may still be thought open: the same person takes over.
    const owner = before?.owner.account.id ?? this.left.get(clientId);
    if (owner !== undefined && owner !== person) return undefined;
    const parsed: unknown = state.length > longestState ? undefined : JSON.parse(state);
    if (parsed === null) {
      if (before?.owner !== connection) return undefined;
      this.forget(clientId);
      return { clientId, clock, state: 'null' };
    }
    const known = tellable.safeParse(parsed);
    if (!known.success || (before?.owner !== connection && this.of(connection).length >= mostOfConnection))
      return undefined;
    const { id, name, initials } = connection.account;
    const entry = { clientId, clock, state: JSON.stringify({ ...known.data, user: { id, name, initials } }) };
    this.left.delete(clientId);
    this.here.set(clientId, { ...entry, owner: connection });
    return entry;
  }

  private of(connection: Connection): Entry[] {
    return [...this.here.values()].filter(({ owner }) => owner === connection);
  }

  private forget(clientId: number): void {
    const entry = this.here.get(clientId);
    if (entry === undefined) return;
    this.here.delete(clientId);
    this.left.set(clientId, entry.owner.account.id);
    const [oldest] = this.left.keys();
    if (this.left.size > remembered && oldest !== undefined) this.left.delete(oldest);
  }

  /** Everybody here, for somebody who comes in; undefined when there is nobody. */
  all(): Uint8Array | undefined {
    return this.here.size === 0 ? undefined : writeEntries([...this.here.values()]);
  }

  /** Lets go of a browser; answers what to tell the others. */
  leave(connection: Connection): Uint8Array | undefined {
    const gone = this.of(connection);
    for (const { clientId } of gone) this.forget(clientId);
    return gone.length === 0 ? undefined : writeEntries(gone.map((entry) => ({ ...entry, state: 'null' })));
  }
}
