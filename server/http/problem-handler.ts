import { OptimisticLockError } from '@mikro-orm/core';
import type { ErrorRequestHandler, RequestHandler, Response } from 'express';
import type { Logger } from 'pino';
import { type ProblemBody, type ProblemCode, PROBLEMS } from '#shared/contracts/problems.ts';
import { MissingFile } from '#server/storage/storage.ts';
import { loggedError } from './logging.ts';
import { Problem } from './problem.ts';
import { requestIdOf } from './request-id.ts';

/** What the body reader, the file sender and the system say, in the product's own words. */
const CODE_OF_TYPE: Record<string, ProblemCode> = {
  'entity.too.large': 'body-too-large',
  'entity.parse.failed': 'unreadable-body',
  'entity.verify.failed': 'unreadable-body',
  'encoding.unsupported': 'unsupported-media-type',
  'charset.unsupported': 'unsupported-media-type',
  'request.aborted': 'unreadable-body',
  'request.size.invalid': 'unreadable-body',
  ENOSPC: 'storage-full',
  EDQUOT: 'storage-full',
};

const problemOf = (error: unknown): Problem => {
  if (error instanceof Problem) return error;
  if (error instanceof MissingFile) return new Problem('clip-missing-in-storage');
  if (error instanceof OptimisticLockError) return new Problem('edited-meanwhile');
  if (error instanceof URIError) return new Problem('not-found');
  if (error instanceof Error) {
    const { type, code, status } = error as Error & {
      type?: unknown;
      code?: unknown;
      status?: unknown;
    };
    for (const name of [type, code]) {
      const known = typeof name === 'string' ? CODE_OF_TYPE[name] : undefined;
      if (known) return new Problem(known);
    }
    if (status === 416) return new Problem('range-not-satisfiable');
  }
  return new Problem('unexpected');
};

/** Answers with `application/problem+json` (RFC 9457). */
export const sendProblem = (res: Response, problem: Problem): void => {
  const [status, title] = PROBLEMS[problem.code];
  const body: ProblemBody = {
    type: `urn:redshank:problem:${problem.code}`,
    code: problem.code,
    title,
    status,
    ...(problem.detail === undefined ? {} : { detail: problem.detail }),
    requestId: requestIdOf(res),
    ...(problem.faults === undefined ? {} : { faults: [...problem.faults] }),
  };
  res.status(status).type('application/problem+json').send(JSON.stringify(body));
};

/** The one place where errors become answers. Of an unknown error the client learns an id and nothing else. */
export const problemHandler =
  (log: Logger): ErrorRequestHandler =>
  (error: unknown, _req, res, _next) => {
    const problem = problemOf(error);
    if (problem.code === 'unexpected') {
      log.error({ requestId: requestIdOf(res), error: loggedError(error) }, 'unexpected error');
    }
    if (res.headersSent) {
      res.destroy();
      return;
    }
    res.setHeader('Cache-Control', 'no-store');
    res.removeHeader('ETag');
    sendProblem(res, problem);
  };

/** An address of the interface that no feature serves. */
export const unknownRoute: RequestHandler = () => {
  throw new Problem('not-found');
};
