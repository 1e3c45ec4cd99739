import * as encoding from 'lib0/encoding';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import WebSocket from 'ws';
import { calculationIn, createCalculation, startTestServer, type TestServer } from '../helpers/server';
import { join, sourceOf, synced } from '../helpers/sync';

let server: TestServer;
beforeAll(async () => {
  server = await startTestServer();
});
afterAll(() => server.close());

describe('two engineers at one sheet', () => {
  it('see each other’s text, in one cell and in different ones', async () => {
    const { revision } = await createCalculation(server);
    const [one, two] = [join(server.client.engineer, revision.id), join(server.client.second, revision.id)];
    await synced(one);
    await synced(two);
    expect(one.document.cells().map((cell) => cell.id)).toContain('c21');
    one.document.source('c21')?.insert(0, '# from one\n');
    two.document.source('c21')?.insert(0, '# from two\n');
    const added = two.document.insertCell({ kind: 'text', after: null, source: 'On top' });
    await expect.poll(() => sourceOf(one, added)).toBe('On top');
    await expect.poll(() => sourceOf(one, 'c21')).toBe(sourceOf(two, 'c21'));
    expect(sourceOf(one, 'c21')).toContain('# from one');
    expect(sourceOf(one, 'c21')).toContain('# from two');
    one.end();
    two.end();
  });

  it('keep what was told kept over a restart of the server, and join what was written meanwhile', async () => {
    const { revision } = await createCalculation(server);
    const one = join(server.client.engineer, revision.id);
    await synced(one);
    const keptBefore = one.kept.times;
    one.document.source('c21')?.insert(0, '# before the restart\n');
    await expect.poll(() => one.kept.times).toBeGreaterThan(keptBefore);
    await server.stop();
    one.document.source('c21')?.insert(0, '# while it was away\n');
    await server.startAgain();
    const two = join(server.client.second, revision.id);
    await expect.poll(() => sourceOf(two, 'c21') ?? '', { timeout: 20_000 }).toContain('# while it was away');
    expect(sourceOf(two, 'c21')).toContain('# before the restart');
    one.end();
    two.end();
  });
});

describe('those who may not write', () => {
  it.each(['checker', 'reader', 'lead'] as const)('a %s changes nothing, whatever the client sends', async (part) => {
    const { revision } = await createCalculation(server);
    const [writer, other] = [join(server.client.engineer, revision.id), join(server.client[part], revision.id)];
    await synced(writer);
    await synced(other);
    const before = sourceOf(writer, 'c21');
    other.document.source('c21')?.insert(0, 'forged ');
    other.document.removeCell('c31');
    await expect.poll(() => other.refused.length).toBeGreaterThan(0);
    writer.document.source('c11')?.insert(0, 'after ');
    await expect.poll(() => sourceOf(other, 'c11') ?? '').toContain('after ');
    expect(sourceOf(writer, 'c21')).toBe(before);
    expect(writer.document.cells().map((cell) => cell.id)).toContain('c31');
    const stored = await server.client.reader.get<{ cells: { id: string; source: string }[] }>(
      `/revisions/${revision.id}/content`,
    );
    expect(stored.body.cells.find((cell) => cell.id === 'c21')?.source).toBe(before);
    writer.end();
    other.end();
  });

  it('a locked revision takes no update, also from who had it open before', async () => {
    const { revision } = await calculationIn(server, 'checked');
    const one = join(server.client.engineer, revision.id);
    await synced(one);
    one.document.source('c21')?.insert(0, '# too late\n');
    await expect.poll(() => one.refused.length).toBeGreaterThan(0);
    const stored = await server.client.reader.get<{ cells: { source: string }[] }>(`/revisions/${revision.id}/content`);
    expect(JSON.stringify(stored.body)).not.toContain('too late');
    one.end();
  });

  it('strangers, people not signed in and foreign pages get no document', async () => {
    const { revision } = await createCalculation(server);
    const attempt = (cookie: string, origin: string) =>
      new Promise<number>((resolve) => {
        const socket = new WebSocket(`${server.origin.replace('http', 'ws')}/sync/${revision.id}`, {
          headers: { Cookie: cookie, Origin: origin },
        });
        socket.on('close', (closed) => resolve(closed));
        socket.on('error', () => resolve(-1));
      });
    expect(await attempt(server.client.stranger.cookie, server.origin)).toBe(4404);
    expect(await attempt('', server.origin)).toBe(4401);
    expect(await attempt(server.client.engineer.cookie, 'https://elsewhere.example')).toBe(4403);
  });

  it('lose the line at once when they are taken out of the project', async () => {
    const { revision } = await createCalculation(server);
    const { second, administrator } = server.client;
    const two = join(second, revision.id);
    await synced(two);
    const closed = new Promise<number>((resolve) =>
      two.provider.on('connection-close', (event: { code: number } | null) => resolve(event?.code ?? 0)),
    );
    const path = `/projects/${server.projectId}/members/${second.account?.id ?? ''}`;
    await administrator.delete(path);
    // To whoever is no member the sheet is not there.
    expect(await closed).toBe(4404);
    two.end();
    await administrator.put(path, { role: 'engineer' });
  });
});

describe('messages that are none', () => {
  it('end their own connection and harm nobody', async () => {
    const { revision } = await createCalculation(server);
    const good = join(server.client.second, revision.id);
    await synced(good);
    const bad = (data: Uint8Array) =>
      new Promise<number>((resolve) => {
        const socket = new WebSocket(`${server.origin.replace('http', 'ws')}/sync/${revision.id}`, {
          headers: { Cookie: server.client.engineer.cookie, Origin: server.origin },
        });
        socket.on('open', () => socket.send(data));
        socket.on('close', (closed) => resolve(closed));
        socket.on('error', () => resolve(-1));
        setTimeout(() => socket.terminate(), 1500);
      });
    const malformed = encoding.createEncoder();
    encoding.writeVarUint(malformed, 0);
    encoding.writeVarUint(malformed, 2);
    encoding.writeVarUint8Array(malformed, Uint8Array.from([9, 9, 9, 255, 255]));
    expect(await bad(encoding.toUint8Array(malformed))).toBe(1003);
    expect(await bad(Uint8Array.from([0]))).toBe(1003);
    let seed = 7;
    const random = () => (seed = (seed * 1103515245 + 12345) % 2147483648) / 2147483648;
    for (let round = 0; round < 40; round += 1)
      await Promise.race([
        bad(Uint8Array.from({ length: 1 + Math.floor(random() * 40) }, () => Math.floor(random() * 256))),
        new Promise((resolve) => setTimeout(resolve, 60)),
      ]);
    good.document.source('c11')?.insert(0, 'still here ');
    const check = join(server.client.engineer, revision.id);
    await expect.poll(() => sourceOf(check, 'c11') ?? '').toContain('still here');
    good.end();
    check.end();
  });
});
