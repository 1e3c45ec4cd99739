import type { z } from 'zod';
import { errorBody } from '#contract';
import { ApiError } from './api-error';

type Method = 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';
type Query = Readonly<Record<string, string | number | undefined>>;

/** What the application wants to be told of; set once by the boot files. */
export const apiEvents: {
  notSignedIn: () => void;
  begin: () => void;
  end: () => void;
} = { notSignedIn: () => undefined, begin: () => undefined, end: () => undefined };

const noLine = 'there is no line to the server';

function address(path: string, query: Query): string {
  const pairs = Object.entries(query).flatMap(([name, value]) =>
    value === undefined ? [] : [`${name}=${encodeURIComponent(value)}`],
  );
  return `/api${path}${pairs.length > 0 ? `?${pairs.join('&')}` : ''}`;
}

async function readError(response: Response): Promise<ApiError> {
  const parsed = errorBody.safeParse(await response.json().catch(() => undefined));
  if (!parsed.success) {
    const message = response.status >= 500 ? 'the server is out of order for the moment' : 'the server refused';
    return new ApiError('UNREADABLE', `${message} (${response.status})`, response.status);
  }
  const { code, message, fields } = parsed.data.error;
  return new ApiError(code, message, response.status, fields);
}

async function send(method: Method, path: string, query: Query, body: unknown): Promise<Response> {
  const init: RequestInit = { method, credentials: 'same-origin', headers: { accept: 'application/json' } };
  if (body !== undefined) {
    init.headers = { accept: 'application/json', 'content-type': 'application/json' };
    init.body = JSON.stringify(body);
  }
  try {
    return await fetch(address(path, query), init);
  } catch {
    throw new ApiError('NO_LINE', noLine, 0);
  }
}

async function exchange(method: Method, path: string, query: Query, body: unknown): Promise<Response> {
  apiEvents.begin();
  try {
    const response = await send(method, path, query, body);
    if (response.ok) return response;
    const error = await readError(response);
    if (error.code === 'NOT_SIGNED_IN') apiEvents.notSignedIn();
    throw error;
  } finally {
    apiEvents.end();
  }
}

/** Asks, and reads the answer with `shape`; throws ApiError. */
export async function request<Shape extends z.ZodType>(
  shape: Shape,
  method: Method,
  path: string,
  { query = {}, body }: { query?: Query; body?: unknown } = {},
): Promise<z.output<Shape>> {
  const response = await exchange(method, path, query, body);
  const parsed = shape.safeParse(await response.json().catch(() => undefined));
  if (!parsed.success) {
    throw new ApiError('UNREADABLE', 'the answer of the server could not be read; reload the page', response.status);
  }
  return parsed.data;
}

/** Asks where the answer carries nothing that is needed. */
export async function command(method: Method, path: string, body?: unknown): Promise<void> {
  await exchange(method, path, {}, body);
}
