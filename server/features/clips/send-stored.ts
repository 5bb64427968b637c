import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import type { Storage } from '#server/storage/storage.ts';
import { Problem } from '../../http/problem.ts';

/**
 * Health data: kept by the browser that may see it, by nothing between, and asked for again each time (304 while it
 * may be seen), so that an ended link or a withdrawn consent plays nothing from the cache.
 */
const PRIVATE = 'private, no-cache';

const cutShort = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';

/**
 * Sends a stored file, or the one range of it that was asked for (206, or 416 with the size).
 * @throws MissingFile, Problem 'range-not-satisfiable'
 */
export const sendStored = async (
  req: Request,
  res: Response,
  storage: Storage,
  key: string,
  type: string,
): Promise<void> => {
  const { bytes, modified } = await storage.stat(key);
  const etag = `"${bytes.toString(36)}-${modified.getTime().toString(36)}"`;
  res.set({
    'Content-Type': type,
    'Accept-Ranges': 'bytes',
    'Cache-Control': PRIVATE,
    ETag: etag,
    'Last-Modified': modified.toUTCString(),
  });
  if (req.fresh) {
    res.status(304).end();
    return;
  }
  const ranges = rangesOf(req, bytes, etag);
  if (ranges === 'outside') {
    res.set('Content-Range', `bytes */${bytes}`);
    throw new Problem('range-not-satisfiable');
  }
  const range = ranges ?? { start: 0, end: bytes - 1 };
  res.set('Content-Length', String(range.end - range.start + 1));
  if (ranges) res.status(206).set('Content-Range', `bytes ${range.start}-${range.end}/${bytes}`);
  if (req.method === 'HEAD') {
    res.end();
    return;
  }
  await pipeline(await storage.read(key, range), res).catch((error: unknown) => {
    // a player that seeks closes the connection it no longer needs
    if (!cutShort(error)) throw error;
  });
};

/** One range; several at once are answered with the whole file, as RFC 9110 allows. */
const rangesOf = (
  req: Request,
  bytes: number,
  etag: string,
): { start: number; end: number } | 'outside' | null => {
  const condition = req.get('if-range');
  if (condition !== undefined && condition !== etag) return null;
  const asked = req.range(bytes);
  if (asked === -1) return 'outside';
  if (asked === undefined || asked === -2 || asked.type !== 'bytes' || asked.length !== 1)
    return null;
  return asked[0] ?? null;
};
