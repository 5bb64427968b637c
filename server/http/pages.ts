import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { type Response, Router } from 'express';

/** Whether a replay link may still be opened; asked before its page is sent. */
export type LinkIsLive = (token: string) => Promise<boolean>;

/**
 * The built pages. Files under /assets carry a hash in their name and never change; the page itself is asked for
 * again each time. Every path without a file's ending is a page, and a dead replay link's page has status 404.
 */
export const servePages = (folder: string, linkIsLive: LinkIsLive): Router => {
  const router = Router();
  const page = join(folder, 'index.html');
  /** The athlete's own small page, without the code of the staff's pages. */
  const replayPage = join(folder, 'replay.html');
  const sendPage = (res: Response, status: number, file = page): void => {
    res.status(status).setHeader('Cache-Control', 'no-cache');
    if (existsSync(file)) res.sendFile(file, { cacheControl: false });
    else res.type('text').send('The pages are not built yet: npm run build:web');
  };
  router.use(
    '/assets',
    express.static(join(folder, 'assets'), {
      immutable: true,
      maxAge: '1y',
      index: false,
      fallthrough: true,
    }),
    (_req, res) => {
      res.sendStatus(404);
    },
  );
  router.use(express.static(folder, { index: false, cacheControl: false, fallthrough: true }));
  router.get('/r/:token', async (req, res) => {
    sendPage(res, (await linkIsLive(req.params.token)) ? 200 : 404, replayPage);
  });
  router.get('/{*path}', (req, res) => {
    if (/\.[a-z0-9]+$/i.test(req.path)) res.sendStatus(404);
    else sendPage(res, 200);
  });
  return router;
};
