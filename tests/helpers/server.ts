import { request as httpRequest } from 'node:http';
import { pino, stdSerializers } from 'pino';
import type { Account, RegisterRow, RevisionDetail, Role } from '#contract';
import { readConfig } from '../../src-server/config/index';
import { insertPerson } from '../../src-server/repositories/people';
import { startServer, type RunningServer } from '../../src-server/server';
import { hashPassword } from '../../src-server/services/passwords';
import { createTestDatabase, type TestDatabase } from './database';

export const testPassword = 'a long enough passphrase';

export interface Answer<Body = unknown> {
  status: number;
  body: Body;
  headers: Record<string, string | string[] | undefined>;
}

/** A client with a cookie of its own. */
export class Client {
  cookie = '';

  constructor(
    readonly origin: string,
    readonly account?: Account,
  ) {}

  send<Body = unknown>(
    method: string,
    path: string,
    body?: unknown,
    headers: Record<string, string> = {},
  ): Promise<Answer<Body>> {
    const text = body === undefined ? undefined : JSON.stringify(body);
    const { hostname, port } = new URL(this.origin);
    return new Promise((resolve, reject) => {
      const outgoing = httpRequest(
        {
          hostname,
          port,
          method,
          path,
          headers: {
            Origin: this.origin,
            ...(this.cookie === '' ? {} : { Cookie: this.cookie }),
            ...(text === undefined ? {} : { 'Content-Type': 'application/json' }),
            ...headers,
          },
        },
        (response) => {
          const chunks: Buffer[] = [];
          response.on('data', (chunk: Buffer) => chunks.push(chunk));
          response.on('end', () => {
            const [set] = response.headers['set-cookie'] ?? [];
            if (set !== undefined) this.cookie = set.split(';')[0] ?? '';
            const raw = Buffer.concat(chunks).toString('utf8');
            const json = response.headers['content-type']?.includes('json') === true;
            resolve({
              status: response.statusCode ?? 0,
              body: (json ? JSON.parse(raw) : raw) as Body,
              headers: response.headers,
            });
          });
        },
      );
      outgoing.on('error', reject);
      if (text !== undefined) outgoing.write(text);
      outgoing.end();
    });
  }

  get = <Body = unknown>(path: string) => this.send<Body>('GET', `/api${path}`);
  post = <Body = unknown>(path: string, body: unknown = {}) => this.send<Body>('POST', `/api${path}`, body);
  put = <Body = unknown>(path: string, body: unknown) => this.send<Body>('PUT', `/api${path}`, body);
  patch = <Body = unknown>(path: string, body: unknown) => this.send<Body>('PATCH', `/api${path}`, body);
  delete = <Body = unknown>(path: string) => this.send<Body>('DELETE', `/api${path}`);
}

export type Part = Role | 'second' | 'administrator' | 'stranger';

export interface TestServer {
  origin: string;
  running: RunningServer;
  database: TestDatabase;
  projectId: string;
  client: Record<Part, Client>;
  /** Somebody who is not signed in. */
  nobody: Client;
  /** Closes the server; `startAgain` starts another on the same database and port. */
  stop(): Promise<void>;
  startAgain(): Promise<void>;
  close(): Promise<void>;
}

const parts: readonly Part[] = ['engineer', 'second', 'checker', 'lead', 'reader', 'administrator', 'stranger'];

/** Silent, unless the environment asks for it: LOG_LEVEL=error npm test -- tests/server */
const testLog = pino({ level: process.env.LOG_LEVEL ?? 'silent', serializers: { error: stdSerializers.err } });

async function start(database: TestDatabase, port: number): Promise<RunningServer> {
  const config = readConfig({
    NODE_ENV: 'test',
    DATABASE_URL: database.url,
    SESSION_SECRET: 'only for tests, sixteen or more',
    PORT: String(port),
  });
  return startServer(config, testLog);
}

/** A server on a database of its own with a project and one person in each part; without `people` an empty one. */
export async function startTestServer({ people = true } = {}): Promise<TestServer> {
  const database = await createTestDatabase();
  let running = await start(database, 0);
  const origin = `http://127.0.0.1:${running.port}`;
  const { db } = running.context;
  const passwordHash = await hashPassword(testPassword);
  const [project] = !people
    ? []
    : await db('projects')
        .insert({ number: '9001', title: 'Trial plant', firm: 'Firm' })
        .returning<{ id: string }[]>('id');
  const projectId = project?.id ?? '';
  const client: Partial<Record<Part, Client>> = {};
  for (const part of people ? parts : []) {
    const account = await insertPerson(db, {
      signInName: part,
      name: `P. ${part}`,
      initials: part.slice(0, 2).toUpperCase(),
      email: `${part}@test.example`,
      administrator: part === 'administrator',
      passwordHash,
    });
    const role = part === 'second' ? 'engineer' : part;
    if (role !== 'administrator' && role !== 'stranger')
      await db('project_members').insert({ project_id: projectId, person_id: account.id, role });
    const own = new Client(origin, account);
    await own.post('/session', { signInName: part, password: testPassword });
    client[part] = own;
  }
  return {
    origin,
    get running() {
      return running;
    },
    database,
    projectId,
    client: client as Record<Part, Client>,
    nobody: new Client(origin),
    stop: () => running.close(),
    async startAgain() {
      running = await start(database, running.port);
    },
    async close() {
      await running.close();
      await database.drop();
    },
  };
}

/** Opens a calculation from an example and answers its first revision. */
export async function createCalculation(server: TestServer, example = 'charge-air-pipe'): Promise<RevisionDetail> {
  const { status, body } = await server.client.engineer.post<RevisionDetail>(
    `/projects/${server.projectId}/calculations`,
    { title: `Trial of ${example}`, start: { from: 'example', example } },
  );
  if (status !== 201) throw new Error(`The calculation was not opened: ${JSON.stringify(body)}`);
  return body;
}

/** The fingerprint that a signer's screen shows. */
export async function shownFingerprint(client: Client, revisionId: string): Promise<string> {
  const { body } = await client.get<{ contentFingerprint: string }>(`/revisions/${revisionId}/conditions`);
  return body.contentFingerprint;
}

export async function handOver(server: TestServer, revisionId: string): Promise<Answer<RevisionDetail>> {
  const { engineer } = server.client;
  return engineer.post(`/revisions/${revisionId}/hand-over`, {
    password: testPassword,
    contentFingerprint: await shownFingerprint(engineer, revisionId),
  });
}

/** Ticks every cell for what the server computes now. */
export async function tickAll(server: TestServer, revisionId: string): Promise<void> {
  const { checker } = server.client;
  const { evaluateCalculation } = await import('#engine');
  const { body } = await checker.get<{
    cells: { id: string; kind: 'text'; source: string; settings: object }[];
    settings: { unitSystem: 'SI'; significantDigits: number; ambientPressure: number };
  }>(`/revisions/${revisionId}/content`);
  const results = evaluateCalculation({ settings: body.settings, cells: body.cells });
  for (const cell of body.cells) {
    const result = results.cells[cell.id];
    if (result !== undefined && result.kind !== 'section')
      await checker.put(`/revisions/${revisionId}/ticks/${cell.id}`, { fingerprint: result.fingerprint });
  }
}

export async function signCheck(server: TestServer, revisionId: string): Promise<Answer<RevisionDetail>> {
  const { checker } = server.client;
  return checker.post(`/revisions/${revisionId}/check`, {
    password: testPassword,
    contentFingerprint: await shownFingerprint(checker, revisionId),
  });
}

export async function lock(
  server: TestServer,
  revisionId: string,
  changeNote = 'First issue',
): Promise<Answer<RevisionDetail>> {
  const { lead } = server.client;
  return lead.post(`/revisions/${revisionId}/lock`, {
    password: testPassword,
    contentFingerprint: await shownFingerprint(lead, revisionId),
    changeNote,
  });
}

/** A calculation brought to a state by the people whose act it is. */
export async function calculationIn(
  server: TestServer,
  state: 'draft' | 'for check' | 'checked' | 'locked',
): Promise<RevisionDetail> {
  const detail = await createCalculation(server);
  const { id } = detail.revision;
  if (state !== 'draft') await handOver(server, id);
  if (state === 'checked' || state === 'locked') {
    await tickAll(server, id);
    await signCheck(server, id);
  }
  if (state === 'locked') await lock(server, id);
  const { body } = await server.client.engineer.get<RevisionDetail>(`/revisions/${id}`);
  return body;
}

export type { RegisterRow };
