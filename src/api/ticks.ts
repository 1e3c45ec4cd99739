import { z } from 'zod';
import { tick, type SetTickRequest, type Tick } from '#contract';
import { request } from './client';

const all = z.array(tick);

export const getTicks = (revisionId: string): Promise<Tick[]> => request(all, 'GET', `/revisions/${revisionId}/ticks`);

/** Both acts answer all ticks of the revision as they are then. */
export const setTick = (revisionId: string, cellId: string, body: SetTickRequest): Promise<Tick[]> =>
  request(all, 'PUT', `/revisions/${revisionId}/ticks/${encodeURIComponent(cellId)}`, { body });
export const removeTick = (revisionId: string, cellId: string): Promise<Tick[]> =>
  request(all, 'DELETE', `/revisions/${revisionId}/ticks/${encodeURIComponent(cellId)}`);
