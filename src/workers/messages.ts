import type { CalculationChange, CalculationDelta } from '#engine';

/** Page → worker. Numbers rise, so that an answer can be told apart from that of a worker since replaced. */
export interface EngineRequest {
  number: number;
  change: CalculationChange;
}

/** Worker → page. */
export type EngineAnswer =
  { number: number; ok: true; delta: CalculationDelta } | { number: number; ok: false; message: string };
