import { Router } from 'express';
import { z } from 'zod';
import { changeCalculationRequest } from '#contract';
import { calculationDetail, changeCalculation } from '../services/calculations';
import type { ServerContext } from '../services/context';
import { beginRevision } from '../services/revisions';
import type { Summaries } from '../services/summaries';
import { parameter, route } from './route';

const letterQuery = z.object({
  letter: z
    .string()
    .regex(/^[A-Z]{1,3}$/, 'is no letter of a revision')
    .optional(),
});

export function calculationRoutes(context: ServerContext, summaries: Summaries): Router {
  const router = Router();
  const id = (params: Record<string, string>) => parameter(params, 'calculationId');
  route(router, {
    method: 'get',
    path: '/calculations/:calculationId',
    permission: 'revision.read',
    query: letterQuery,
    handle: ({ account, params, query }) => calculationDetail(context, account, id(params), query.letter),
  });
  route(router, {
    method: 'patch',
    path: '/calculations/:calculationId',
    permission: 'calculation.rename',
    body: changeCalculationRequest,
    handle: ({ account, params, body }) => changeCalculation(context, account, id(params), body),
  });
  route(router, {
    method: 'post',
    path: '/calculations/:calculationId/revisions',
    permission: 'revision.begin',
    status: 201,
    handle: ({ account, params }) => beginRevision(context, summaries, account, id(params)),
  });
  return router;
}
