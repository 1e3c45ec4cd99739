import { z } from 'zod';
import { tick, type SetTickRequest, type Tick } from '#contract';
import { command, request } from './client';

export const getTicks = (revisionId: string): Promise<Tick[]> =>
  request(z.array(tick), 'GET', `/revisions/${revisionId}/ticks`);
export const setTick = (revisionId: string, cellId: string, body: SetTickRequest): Promise<Tick> =>
  request(tick, 'PUT', `/revisions/${revisionId}/ticks/${encodeURIComponent(cellId)}`, { body });
export const removeTick = (revisionId: string, cellId: string): Promise<void> =>
  command('DELETE', `/revisions/${revisionId}/ticks/${encodeURIComponent(cellId)}`);
