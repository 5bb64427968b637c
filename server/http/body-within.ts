import type { RequestHandler } from 'express';

/** Cuts the connection of a request whose body is not whole in time: it trickles, and holds what it can. */
export const bodyWithin =
  (ms: number): RequestHandler =>
  (req, res, next) => {
    const cut = setTimeout(() => {
      if (!req.complete) req.destroy();
    }, ms);
    res.once('close', () => {
      clearTimeout(cut);
    });
    next();
  };
