import { z } from 'zod';
import { remark, type AnswerRemarkRequest, type AskRemarkRequest, type Remark } from '#contract';
import { request } from './client';

const all = z.array(remark);

export const getRemarks = (revisionId: string): Promise<Remark[]> =>
  request(all, 'GET', `/revisions/${revisionId}/remarks`);

/** Every act answers all remarks of the revision as they are then. */
export const askRemark = (revisionId: string, body: AskRemarkRequest): Promise<Remark[]> =>
  request(all, 'POST', `/revisions/${revisionId}/remarks`, { body });
export const answerRemark = (remarkId: string, body: AnswerRemarkRequest): Promise<Remark[]> =>
  request(all, 'POST', `/remarks/${remarkId}/answers`, { body });
export const closeRemark = (remarkId: string): Promise<Remark[]> =>
  request(all, 'POST', `/remarks/${remarkId}/close`, { body: {} });
export const reopenRemark = (remarkId: string): Promise<Remark[]> =>
  request(all, 'POST', `/remarks/${remarkId}/reopen`, { body: {} });
