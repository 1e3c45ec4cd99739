import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { CalculationChange, CalculationDelta } from '#engine';
import { createEngineClient } from '../../../src/workers/engine-client';
import { joinChanges } from '../../../src/workers/join-changes';
import type { EngineAnswer, EngineRequest } from '../../../src/workers/messages';
import { lines } from './sheet';

/** Stands for the browser's worker: keeps requests until the test lets it answer. */
class FakeWorker {
  static started: FakeWorker[] = [];
  readonly requests: EngineRequest[] = [];
  terminated = false;
  onmessage: ((event: { data: EngineAnswer }) => void) | undefined;
  onerror: ((event: { message: string }) => void) | undefined;

  constructor() {
    FakeWorker.started.push(this);
  }
  postMessage(request: EngineRequest): void {
    this.requests.push(request);
  }
  terminate(): void {
    this.terminated = true;
  }
  answer(answer: Partial<CalculationDelta> | Error): void {
    const number = this.requests.at(-1)?.number ?? 0;
    const data: EngineAnswer =
      answer instanceof Error
        ? { number, ok: false, message: answer.message }
        : { number, ok: true, delta: { cells: [], removed: [], names: [], ...answer } };
    this.onmessage?.({ data });
  }
}

function client() {
  const heard: string[] = [];
  const engine = createEngineClient({
    onDelta: ({ removed }) => heard.push(`delta ${removed.join()}`),
    onBusy: (busy) => heard.push(busy ? 'busy' : 'idle'),
    onFailure: (error) => heard.push(error.message),
  });
  return { engine, heard };
}
const worker = (index = 0) => {
  const found = FakeWorker.started.at(index);
  if (found === undefined) throw new Error('no worker');
  return found;
};
const put = (...ids: string[]): CalculationChange => ({ put: ids.map((id) => lines(id, `${id} = 1`)) });
const idsPut = (request: EngineRequest | undefined) => request?.change.put?.map(({ id }) => id);

beforeEach(() => {
  FakeWorker.started = [];
  vi.stubGlobal('Worker', FakeWorker);
  vi.useFakeTimers();
});
afterEach(() => {
  vi.unstubAllGlobals();
  vi.useRealTimers();
});

describe('the client of the engine', () => {
  it('joins what comes while the worker is busy into one change', () => {
    const { engine, heard } = client();
    engine.update(put('a'));
    engine.update(put('b'));
    engine.update(put('c'));
    expect(worker().requests).toHaveLength(1);
    worker().answer({ removed: ['first'] });
    expect(idsPut(worker().requests[1])).toEqual(['b', 'c']);
    worker().answer({ removed: ['second'] });
    expect(heard).toEqual(['busy', 'delta first', 'delta second', 'idle']);
  });

  it('tells a failure and goes on', () => {
    const { engine, heard } = client();
    engine.update(put('a'));
    worker().answer(new Error('no good'));
    engine.update(put('b'));
    worker().answer({});
    expect(heard).toEqual(['busy', 'no good', 'idle', 'busy', 'delta ', 'idle']);
    expect(FakeWorker.started).toHaveLength(1);
  });

  it('replaces a worker that hangs, and tells the new one everything', () => {
    const { engine, heard } = client();
    engine.update(put('a'));
    worker().answer({});
    engine.update(put('b'));
    vi.advanceTimersByTime(60_000);
    expect(worker().terminated).toBe(true);
    expect(heard.at(-2)).toContain('too long');
    engine.update(put('c'));
    expect(FakeWorker.started).toHaveLength(2);
    expect(idsPut(worker(1).requests[0])).toEqual(['a', 'b', 'c']);
  });

  it('does not listen to a worker that it has replaced', () => {
    const { engine, heard } = client();
    engine.update(put('a'));
    vi.advanceTimersByTime(60_000);
    engine.update(put('b'));
    const count = heard.length;
    worker(0).answer({ removed: ['late'] });
    expect(heard).toHaveLength(count);
  });

  it('ends with its worker', () => {
    const { engine } = client();
    engine.update(put('a'));
    engine.dispose();
    expect(worker().terminated).toBe(true);
  });
});

describe('joined changes', () => {
  it('keep the later of two puts, and know what is gone', () => {
    const joined = joinChanges({ ...put('a', 'b'), order: ['a', 'b'] }, { put: [lines('a', 'a = 2')], remove: ['b'] });
    expect(joined.put).toEqual([lines('a', 'a = 2')]);
    expect(joined.remove).toEqual(['b']);
    expect(joined.order).toEqual(['a', 'b']);
  });

  it('put again what was removed before', () => {
    expect(joinChanges({ remove: ['a'] }, put('a'))).toMatchObject({ remove: [], put: [lines('a', 'a = 1')] });
  });
});
