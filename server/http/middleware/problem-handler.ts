import type { ErrorRequestHandler, RequestHandler } from 'express';
import { AppError, toProblem } from '../../errors.ts';
import { requestIdOf } from '../request-id.ts';
import type { Logger } from '../../logging/logger.ts';

/** Turns anything thrown into `application/problem+json`; unexpected errors are logged whole, others by their code. */
export const problemHandler =
  (log: Logger): ErrorRequestHandler =>
  (thrown, req, res, next) => {
    const problem = toProblem(thrown, requestIdOf(req));
    const at = { requestId: requestIdOf(req), method: req.method, path: req.path, code: problem.code };
    if (problem.status >= 500) log.error({ ...at, err: thrown as unknown }, 'request failed');
    else log.debug(at, 'request refused');
    if (res.headersSent) return next(thrown);
    if (problem.retry_after_s !== undefined) res.setHeader('retry-after', String(problem.retry_after_s));
    res.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  };

export const nothingHere: RequestHandler = (_req, _res, next) => next(new AppError('not-found'));
