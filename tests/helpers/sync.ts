import * as decoding from 'lib0/decoding';
import * as encoding from 'lib0/encoding';
import { expect } from 'vitest';
import WebSocket from 'ws';
import { WebsocketProvider } from 'y-websocket';
import * as Y from 'yjs';
import { syncMessage } from '#contract';
import { openDocument, type CalculationDocument } from '#document';
import type { Client, TestServer } from './server';

export const addressOf = (origin: string, revisionId: string) => `${origin.replace('http', 'ws')}/sync/${revisionId}`;

/** A WebSocket class that brings a client's cookie, as a browser does. */
export function socketOf(client: Pick<Client, 'cookie' | 'origin'>): typeof globalThis.WebSocket {
  class SocketWithCookie extends WebSocket {
    constructor(address: string | URL) {
      super(address, { headers: { Cookie: client.cookie, Origin: client.origin } });
    }
  }
  return SocketWithCookie as never;
}

export interface Writer {
  doc: Y.Doc;
  document: CalculationDocument;
  provider: WebsocketProvider;
  /** Reasons that the server gave. */
  refused: string[];
  /** What the server last told of what it kept on the present line. */
  kept: { updates: number; first: boolean; times: number };
  end(): void;
}

let ids = 0;

/** A browser's side of the sync, with the stock client and a session cookie. */
export function join(client: Client, revisionId: string, doc = new Y.Doc()): Writer {
  const provider = new WebsocketProvider(`${client.origin.replace('http', 'ws')}/sync`, revisionId, doc, {
    WebSocketPolyfill: socketOf(client),
    disableBc: true,
    maxBackoffTime: 200,
  });
  const writer: Writer = {
    doc,
    document: openDocument(doc, { newId: () => `new${(ids += 1)}` }),
    provider,
    refused: [],
    kept: { updates: 0, first: false, times: 0 },
    end: () => provider.destroy(),
  };
  provider.messageHandlers[syncMessage.kept] = (_encoder, decoder) => {
    writer.kept = {
      updates: decoding.readVarUint(decoder),
      first: decoding.readVarUint(decoder) === 1,
      times: writer.kept.times + 1,
    };
  };
  provider.messageHandlers[syncMessage.refused] = (_encoder, decoder) => {
    writer.refused.push(decoding.readVarString(decoder));
  };
  return writer;
}

export const synced = (writer: Writer) => expect.poll(() => writer.provider.synced, { timeout: 10_000 }).toBe(true);
export const sourceOf = (writer: Writer, id: string) => writer.document.source(id)?.toJSON();

/** Everything that the client has written on this line is kept. */
export async function allKept(writer: Writer, updates: number): Promise<void> {
  await expect.poll(() => writer.kept.updates, { timeout: 10_000 }).toBeGreaterThanOrEqual(updates);
}

/** The sources of the cells of a revision as the database has them. */
export async function storedSources(client: Client, revisionId: string): Promise<Record<string, string>> {
  const { body } = await client.get<{ cells: { id: string; source: string }[] }>(`/revisions/${revisionId}/content`);
  return Object.fromEntries(body.cells.map(({ id, source }) => [id, source]));
}

export interface RawSocket {
  socket: WebSocket;
  /** Messages of the server, by their first number. */
  received: { kind: number; data: Uint8Array }[];
  closed: Promise<number>;
  send(...numbers: (number | Uint8Array | string)[]): void;
}

/** A bare line, to send whatever one likes. */
export async function rawSocket(
  server: TestServer,
  client: Pick<Client, 'cookie'>,
  revisionId: string,
): Promise<RawSocket> {
  const socket = new WebSocket(addressOf(server.origin, revisionId), {
    headers: { Cookie: client.cookie, Origin: server.origin },
  });
  const received: RawSocket['received'] = [];
  socket.on('message', (data: Buffer) => received.push({ kind: data[0] ?? -1, data: new Uint8Array(data) }));
  const closed = new Promise<number>((resolve) => socket.on('close', (code) => resolve(code)));
  socket.on('error', () => undefined);
  await Promise.race([new Promise((resolve) => socket.on('open', resolve)), closed]);
  return { socket, received, closed, send: (...parts) => socket.send(messageOf(...parts)) };
}

/** Numbers as varUint, byte arrays and words with their length in front. */
export function messageOf(...parts: (number | Uint8Array | string)[]): Uint8Array {
  const encoder = encoding.createEncoder();
  for (const part of parts) {
    if (typeof part === 'number') encoding.writeVarUint(encoder, part);
    else if (typeof part === 'string') encoding.writeVarString(encoder, part);
    else encoding.writeVarUint8Array(encoder, part);
  }
  return encoding.toUint8Array(encoder);
}
