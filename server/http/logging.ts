import type { IncomingMessage, ServerResponse } from 'node:http';
import { type DestinationStream, type Logger, pino } from 'pino';
import { pinoHttp } from 'pino-http';
import type { RequestHandler } from 'express';

/** Replay tokens, and tokens of invitations and new passwords, stand in the path. */
const TOKEN_IN_PATH = /^(\/(?:api\/)?(?:r|join|reset|confirm-email)\/)[^/]+/i;
/** What no address needs, and a terminal that shows the log could take for a command. */
const UNPRINTED = /[^\x21-\x7e]/g;
const LONGEST = 300;

/** The address as it may be kept: without its query, which can hold names, and without tokens. */
export const loggedPath = (url: string): string =>
  (url.split('?')[0] ?? '')
    .replace(TOKEN_IN_PATH, '$1[token]')
    .replaceAll(UNPRINTED, '?')
    .slice(0, LONGEST);

/** Only frames: the first lines of a database error hold the values of its query. */
const framesOf = (stack: string | undefined): string[] =>
  (stack ?? '')
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line.startsWith('at '))
    .slice(0, 12);

/**
 * An error as it may be kept. The messages of the database and of the ORM carry the row that was written, so of
 * those only the kind, SQLSTATE, table and constraint stay.
 */
export const loggedError = (error: unknown): Record<string, unknown> => {
  if (!(error instanceof Error)) return { type: typeof error };
  const { code, table, constraint, sqlState } = error as Error & Record<string, unknown>;
  const hasRow =
    /^[0-9A-Z]{5}$/.test(typeof code === 'string' ? code : '') || sqlState || 'getEntity' in error;
  return {
    type: error.constructor.name,
    ...(hasRow ? { code, table, constraint } : { message: error.message.slice(0, 500) }),
    at: framesOf(error.stack),
    ...(error.cause === undefined || hasRow ? {} : { cause: loggedError(error.cause) }),
  };
};

export const makeLog = (level: string, to: DestinationStream = pino.destination(1)): Logger =>
  pino(
    {
      level,
      base: null,
      timestamp: pino.stdTimeFunctions.isoTime,
      serializers: { err: loggedError },
    },
    to,
  );

/** One line per request: who is left out, what and how long stays in. */
export const logRequests = (log: Logger, idOf: (res: ServerResponse) => string): RequestHandler =>
  pinoHttp({
    logger: log,
    genReqId: (_req: IncomingMessage, res: ServerResponse) => idOf(res),
    quietReqLogger: true,
    autoLogging: { ignore: (req) => !/^\/api\//i.test(req.url ?? '') },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (req: { method: string; url: string }) => ({
        method: req.method,
        path: loggedPath(req.url),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: () => undefined,
    },
  });
