import { revisionDetail, type ChangeCalculationRequest, type RevisionDetail } from '#contract';
import { request } from './client';

/** The latest revision, or the one with the letter. */
export const getCalculation = (id: string, letter?: string): Promise<RevisionDetail> =>
  request(revisionDetail, 'GET', `/calculations/${id}`, { query: { letter } });
export const changeCalculation = (id: string, body: ChangeCalculationRequest): Promise<RevisionDetail> =>
  request(revisionDetail, 'PATCH', `/calculations/${id}`, { body });
/** Begins the next revision of a locked one. */
export const beginRevision = (calculationId: string): Promise<RevisionDetail> =>
  request(revisionDetail, 'POST', `/calculations/${calculationId}/revisions`, { body: {} });
