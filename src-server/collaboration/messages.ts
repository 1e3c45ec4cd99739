import { syncMessage } from '#contract';
import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import * as Y from 'yjs';

/** Message numbers of the y-websocket protocol. */
export const message = { sync: 0, awareness: 1, queryAwareness: 3 } as const;
const sync = { step1: 0, step2: 1, update: 2 } as const;

export type Incoming =
  | { kind: 'ask'; stateVector: Uint8Array }
  /** `first` for the answer to the server's own question: what was written before the line was there. */
  | { kind: 'update'; update: Uint8Array; first: boolean }
  | { kind: 'presence'; update: Uint8Array }
  | { kind: 'query presence' }
  | { kind: 'unknown' };

/** Reads a message; throws on one that is malformed. */
export function readMessage(data: Uint8Array): Incoming {
  const decoder = decoding.createDecoder(data);
  const kind = decoding.readVarUint(decoder);
  if (kind === message.queryAwareness) return { kind: 'query presence' };
  if (kind === message.awareness) return { kind: 'presence', update: decoding.readVarUint8Array(decoder) };
  if (kind !== message.sync) return { kind: 'unknown' };
  const step = decoding.readVarUint(decoder);
  const content = decoding.readVarUint8Array(decoder);
  if (step === sync.step1) {
    Y.decodeStateVector(content);
    return { kind: 'ask', stateVector: content };
  }
  if (step !== sync.step2 && step !== sync.update) return { kind: 'unknown' };
  return { kind: 'update', update: content, first: step === sync.step2 };
}

function write(...parts: ((encoder: encoding.Encoder) => void)[]): Uint8Array {
  const encoder = encoding.createEncoder();
  for (const part of parts) part(encoder);
  return encoding.toUint8Array(encoder);
}

const number = (value: number) => (encoder: encoding.Encoder) => encoding.writeVarUint(encoder, value);
const bytes = (value: Uint8Array) => (encoder: encoding.Encoder) => encoding.writeVarUint8Array(encoder, value);

export const askMessage = (doc: Y.Doc): Uint8Array =>
  write(number(message.sync), number(sync.step1), bytes(Y.encodeStateVector(doc)));
export const answerMessage = (doc: Y.Doc, stateVector: Uint8Array): Uint8Array =>
  write(number(message.sync), number(sync.step2), bytes(Y.encodeStateAsUpdate(doc, stateVector)));
export const updateMessage = (update: Uint8Array): Uint8Array =>
  write(number(message.sync), number(sync.update), bytes(update));
export const presenceMessage = (update: Uint8Array): Uint8Array => write(number(message.awareness), bytes(update));

/** How many updates of a connection are in the database, and whether its first answer is. */
export const keptMessage = (updates: number, first: boolean, at: number): Uint8Array =>
  write(number(syncMessage.kept), number(updates), number(first ? 1 : 0), (encoder) =>
    encoding.writeFloat64(encoder, at),
  );

export const refusedMessage = (reason: string): Uint8Array =>
  write(number(syncMessage.refused), (encoder) => encoding.writeVarString(encoder, reason));
