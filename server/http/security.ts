import type { RequestHandler } from 'express';
import helmet from 'helmet';
import { Problem } from './problem.ts';

/**
 * The content policy of every page. Workers are files of their own; the decoder and the canvas hand pictures
 * around as blobs. Over plain http nothing is upgraded, or a local instance could not load its own scripts.
 */
export const securityHeaders = (overHttps: boolean): RequestHandler[] => [
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        workerSrc: ["'self'"],
        styleSrc: ["'self'"],
        imgSrc: ["'self'", 'blob:', 'data:'],
        mediaSrc: ["'self'", 'blob:'],
        connectSrc: ["'self'"],
        fontSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
      },
    },
    crossOriginEmbedderPolicy: false,
    referrerPolicy: { policy: 'no-referrer' },
    strictTransportSecurity: overHttps,
  }),
  (_req, res, next) => {
    res.setHeader('Permissions-Policy', 'camera=(self), microphone=(), geolocation=()');
    next();
  },
];

const READS = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * A write comes from our own pages or from a script. Browsers say where a write comes from; programs that are
 * not browsers send neither header and carry no cookie of somebody else.
 */
export const ownOriginOnly =
  (publicUrl: string): RequestHandler =>
  (req, _res, next) => {
    if (READS.has(req.method)) return next();
    const { origin } = req.headers;
    const site = req.headers['sec-fetch-site'];
    const ours = (value: string): boolean =>
      value === new URL(publicUrl).origin ||
      value === `${req.protocol}://${req.headers.host ?? ''}`;
    if (origin !== undefined ? !ours(origin) : site === 'cross-site' || site === 'same-site') {
      throw new Problem('foreign-origin');
    }
    next();
  };

/** Answers of the interface are one person's and are kept nowhere on the way. */
export const neverStored: RequestHandler = (_req, res, next) => {
  res.setHeader('Cache-Control', 'no-store');
  next();
};
