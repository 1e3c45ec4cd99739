import { createEngine } from '#engine';
import type { EngineAnswer, EngineRequest } from './messages';

/** One engine, kept between changes: only what a change touches is computed anew. */
const engine = createEngine();

self.onmessage = ({ data }: MessageEvent<EngineRequest>) => {
  let answer: EngineAnswer;
  try {
    answer = { number: data.number, ok: true, delta: engine.update(data.change) };
  } catch (error) {
    answer = { number: data.number, ok: false, message: error instanceof Error ? error.message : String(error) };
  }
  self.postMessage(answer);
};
