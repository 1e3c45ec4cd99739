import { Router } from 'express';
import {
  answerRemarkRequest,
  askRemarkRequest,
  checkRequest,
  handOverRequest,
  lockRequest,
  returnRequest,
  setTickRequest,
} from '#contract';
import { limitSigning } from '../middleware/rate-limit';
import type { ServerContext } from '../services/context';
import { lockRevision } from '../services/locking';
import { answerRemark, askRemark, remarksOf, setClosed } from '../services/remarks';
import { returnRevision, revisionConditions, revisionContent, revisionDetail } from '../services/revisions';
import { handOver, signCheck } from '../services/signing';
import type { Summaries } from '../services/summaries';
import { tickCell, ticksOf, untickCell } from '../services/ticks';
import { verifyRevision } from '../services/verification';
import { parameter, route } from './route';

export function revisionRoutes(context: ServerContext, summaries: Summaries): Router {
  const router = Router();
  const id = (params: Record<string, string>) => parameter(params, 'revisionId');
  const cell = (params: Record<string, string>) => parameter(params, 'cellId');
  const remark = (params: Record<string, string>) => parameter(params, 'remarkId');
  const signing = [limitSigning()];

  route(router, {
    method: 'get',
    path: '/revisions/:revisionId',
    permission: 'revision.read',
    handle: ({ account, params }) => revisionDetail(context, account, id(params)),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/content',
    permission: 'revision.read',
    handle: ({ account, params }) => revisionContent(context, account, id(params)),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/conditions',
    permission: 'revision.read',
    handle: ({ account, params }) => revisionConditions(context, account, id(params)),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/verification',
    permission: 'revision.read',
    handle: ({ account, params }) => verifyRevision(context, account, id(params)),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/export',
    permission: 'revision.read',
    async handle({ account, params, request }) {
      const content = await revisionContent(context, account, id(params));
      request.res?.attachment(`${content.number ?? 'calculation'}-${content.revision ?? ''}.json`);
      return content;
    },
  });
  route(router, {
    method: 'post',
    path: '/revisions/:revisionId/hand-over',
    permission: 'revision.handOver',
    body: handOverRequest,
    before: signing,
    handle: ({ account, params, body }) => handOver(context, account, id(params), body),
  });
  route(router, {
    method: 'post',
    path: '/revisions/:revisionId/return',
    permission: 'revision.return',
    body: returnRequest,
    handle: ({ account, params, body }) => returnRevision(context, account, id(params), body.reason),
  });
  route(router, {
    method: 'post',
    path: '/revisions/:revisionId/check',
    permission: 'revision.check',
    body: checkRequest,
    before: signing,
    handle: ({ account, params, body }) => signCheck(context, account, id(params), body),
  });
  route(router, {
    method: 'post',
    path: '/revisions/:revisionId/lock',
    permission: 'revision.lock',
    body: lockRequest,
    before: signing,
    handle: ({ account, params, body }) => lockRevision(context, account, id(params), body),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/remarks',
    permission: 'revision.read',
    handle: ({ account, params }) => remarksOf(context, account, id(params)),
  });
  route(router, {
    method: 'post',
    path: '/revisions/:revisionId/remarks',
    permission: 'remark.ask',
    body: askRemarkRequest,
    status: 201,
    handle: ({ account, params, body }) => askRemark(context, summaries, account, id(params), body),
  });
  route(router, {
    method: 'post',
    path: '/remarks/:remarkId/answers',
    permission: 'remark.answer',
    body: answerRemarkRequest,
    status: 201,
    handle: ({ account, params, body }) => answerRemark(context, summaries, account, remark(params), body.text),
  });
  route(router, {
    method: 'post',
    path: '/remarks/:remarkId/close',
    permission: 'remark.close',
    handle: ({ account, params }) => setClosed(context, summaries, account, remark(params), true),
  });
  route(router, {
    method: 'post',
    path: '/remarks/:remarkId/reopen',
    permission: 'remark.close',
    handle: ({ account, params }) => setClosed(context, summaries, account, remark(params), false),
  });
  route(router, {
    method: 'get',
    path: '/revisions/:revisionId/ticks',
    permission: 'revision.read',
    handle: ({ account, params }) => ticksOf(context, account, id(params)),
  });
  route(router, {
    method: 'put',
    path: '/revisions/:revisionId/ticks/:cellId',
    permission: 'tick.set',
    body: setTickRequest,
    handle: ({ account, params, body }) =>
      tickCell(context, summaries, account, id(params), cell(params), body.fingerprint),
  });
  route(router, {
    method: 'delete',
    path: '/revisions/:revisionId/ticks/:cellId',
    permission: 'tick.set',
    handle: ({ account, params }) => untickCell(context, summaries, account, id(params), cell(params)),
  });
  return router;
}
