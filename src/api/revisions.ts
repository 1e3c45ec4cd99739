import type { z } from 'zod';
import { exchangeSchema, type ExchangeCalculation } from '#document';
import {
  conditions,
  revisionDetail,
  type CheckRequest,
  type Conditions,
  type HandOverRequest,
  type LockRequest,
  type ReturnRequest,
  type RevisionDetail,
} from '#contract';
import { request } from './client';

const act = (revisionId: string, name: string, body: unknown): Promise<RevisionDetail> =>
  request(revisionDetail, 'POST', `/revisions/${revisionId}/${name}`, { body });

export const getRevision = (id: string): Promise<RevisionDetail> => request(revisionDetail, 'GET', `/revisions/${id}`);
/** The content as exchange JSON; of a locked revision the frozen one. */
export const getRevisionContent = (id: string): Promise<ExchangeCalculation> =>
  request<z.ZodType<ExchangeCalculation>>(exchangeSchema, 'GET', `/revisions/${id}/content`);
export const getConditions = (id: string): Promise<Conditions> =>
  request(conditions, 'GET', `/revisions/${id}/conditions`);

export const handOver = (id: string, body: HandOverRequest): Promise<RevisionDetail> => act(id, 'hand-over', body);
export const returnRevision = (id: string, body: ReturnRequest): Promise<RevisionDetail> => act(id, 'return', body);
export const checkRevision = (id: string, body: CheckRequest): Promise<RevisionDetail> => act(id, 'check', body);
export const lockRevision = (id: string, body: LockRequest): Promise<RevisionDetail> => act(id, 'lock', body);

/** Address of the download of the exchange JSON. */
export const exportAddress = (id: string): string => `/api/revisions/${id}/export`;
