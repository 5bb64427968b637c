import express, { type Express, Router } from 'express';
import type { Route } from '#shared/contracts/route.ts';
import { noteRefusals } from '../features/audit/refusals.ts';
import type { Feature } from '../main/feature.ts';
import type { Ground } from '../main/ground.ts';
import { rememberAsker } from './asker.ts';
import { logRequests } from './logging.ts';
import { servePages } from './pages.ts';
import { Problem } from './problem.ts';
import { problemHandler, unknownRoute } from './problem-handler.ts';
import { requestIds } from './request-id.ts';
import { neverStored, ownOriginOnly, securityHeaders } from './security.ts';
import { makeServe } from './serve.ts';
import { tokenHash } from './token-hash.ts';

export interface AppOptions {
  readonly features: readonly Feature[];
  /** The built pages; without it only the interface is served. */
  readonly pages?: string;
  readonly onRoute?: (route: Route) => void;
  /** True while the server stops: requests on connections that are still open are sent elsewhere. */
  readonly isClosing?: () => boolean;
}

/** The web server's one chain: who and what in front, features in the middle, problems at the end. */
export const makeApp = (
  ground: Ground,
  { features, pages, onRoute, isClosing }: AppOptions,
): Express => {
  const { config, log, sessions, inPractice, orm } = ground;
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.set('trust proxy', config.trustProxy);
  app.use(requestIds, rememberAsker);
  app.use(logRequests(log, (res) => String(res.getHeader('X-Request-Id'))));
  app.use((_req, res, next) => {
    if (!isClosing?.()) return next();
    res.setHeader('Connection', 'close');
    throw new Problem('shutting-down');
  });
  app.use(...securityHeaders(config.publicUrl.startsWith('https:')));
  app.use('/api', neverStored, ownOriginOnly(config.publicUrl));

  const router = Router();
  const serve = makeServe({
    router,
    inPractice,
    whoIs: sessions.whoIs,
    whoIsBeforeCodes: sessions.whoIsBeforeCodes,
    checkAnswers: config.environment === 'test' || config.environment === 'development',
    ...(onRoute ? { onRoute } : {}),
    onRefusal: noteRefusals(ground),
  });
  for (const feature of features) feature({ serve, router, ground });
  app.use(router);
  app.use('/api', unknownRoute);

  if (pages !== undefined) {
    const linkIsLive = async (token: string): Promise<boolean> => {
      const rows = await orm.em
        .fork()
        .execute<unknown[]>('select 1 from find_replay(?)', [tokenHash(token)]);
      return rows.length > 0;
    };
    app.use(servePages(pages, linkIsLive));
  }
  app.use(problemHandler(log));
  return app;
};
