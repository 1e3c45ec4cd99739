import { z } from 'zod';
import { remark, type AnswerRemarkRequest, type AskRemarkRequest, type Remark } from '#contract';
import { request } from './client';

export const getRemarks = (revisionId: string): Promise<Remark[]> =>
  request(z.array(remark), 'GET', `/revisions/${revisionId}/remarks`);
export const askRemark = (revisionId: string, body: AskRemarkRequest): Promise<Remark> =>
  request(remark, 'POST', `/revisions/${revisionId}/remarks`, { body });
export const answerRemark = (remarkId: string, body: AnswerRemarkRequest): Promise<Remark> =>
  request(remark, 'POST', `/remarks/${remarkId}/answers`, { body });
export const closeRemark = (remarkId: string): Promise<Remark> =>
  request(remark, 'POST', `/remarks/${remarkId}/close`, { body: {} });
export const reopenRemark = (remarkId: string): Promise<Remark> =>
  request(remark, 'POST', `/remarks/${remarkId}/reopen`, { body: {} });
