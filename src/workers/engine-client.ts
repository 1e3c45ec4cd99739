import type { CalculationChange, CalculationDelta } from '#engine';
import { joinChanges } from './join-changes';
import type { EngineAnswer, EngineRequest } from './messages';

/** A sheet that computes longer than this is taken to hang: its worker is replaced. */
const patience = 15_000;

export interface EngineClientOptions {
  onDelta(delta: CalculationDelta): void;
  onBusy(busy: boolean): void;
  /** The engine failed or hung; the next update starts it afresh. */
  onFailure(error: Error): void;
}

export interface EngineClient {
  update(change: CalculationChange): void;
  dispose(): void;
}

/** Talks to one engine worker: one change at a time, those that come meanwhile joined to one. */
export function createEngineClient(options: EngineClientOptions): EngineClient {
  let worker: Worker | undefined;
  let number = 0;
  let busy = false;
  let waiting: CalculationChange | undefined;
  /** Everything since the start: a worker that is replaced has to be told all of it again. */
  let whole: CalculationChange = {};
  let alarm: ReturnType<typeof setTimeout> | undefined;

  function start(): Worker {
    const started = new Worker(new URL('./engine.worker.ts', import.meta.url), { type: 'module' });
    started.onmessage = ({ data }: MessageEvent<EngineAnswer>) => settle(data);
    started.onerror = (event) => fail(new Error(event.message || 'the engine could not be started'));
    return started;
  }

  function send(change: CalculationChange): void {
    if (!busy) options.onBusy(true);
    busy = true;
    number += 1;
    const fresh = worker === undefined;
    worker ??= start();
    const request: EngineRequest = { number, change: fresh ? whole : change };
    worker.postMessage(request);
    clearTimeout(alarm);
    alarm = setTimeout(
      () => fail(new Error('The sheet takes too long to compute. Undo the last change, or split it.')),
      patience,
    );
  }

  function settle(answer: EngineAnswer): void {
    if (answer.number !== number) return;
    clearTimeout(alarm);
    if (answer.ok) options.onDelta(answer.delta);
    else options.onFailure(new Error(answer.message));
    next();
  }

  function next(): void {
    const change = waiting;
    waiting = undefined;
    if (change !== undefined) {
      send(change);
      return;
    }
    busy = false;
    options.onBusy(false);
  }

  function fail(error: Error): void {
    clearTimeout(alarm);
    worker?.terminate();
    worker = undefined;
    options.onFailure(error);
    next();
  }

  return {
    update(change) {
      whole = joinChanges(whole, change);
      if (busy) waiting = waiting === undefined ? change : joinChanges(waiting, change);
      else send(change);
    },
    dispose() {
      clearTimeout(alarm);
      worker?.terminate();
      worker = undefined;
    },
  };
}
