import { randomBytes } from 'node:crypto';
import type { RequestHandler, Response } from 'express';

type Locals = { requestId?: string };

/** Names every request; the name stands in the log, in the answer's header and in every problem. */
export const requestIds: RequestHandler = (_req, res, next) => {
  const id = randomBytes(9).toString('base64url');
  (res.locals as Locals).requestId = id;
  res.setHeader('X-Request-Id', id);
  next();
};

export const requestIdOf = (res: Response): string => (res.locals as Locals).requestId ?? 'unknown';
