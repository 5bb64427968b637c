import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import type { ScanType } from '#shared/contracts/consents.ts';
import type { Storage } from '#server/storage/storage.ts';

/** How the file of a scan ends. */
export const SCAN_ENDINGS: Record<ScanType, string> = {
  'application/pdf': 'pdf',
  'image/jpeg': 'jpg',
  'image/png': 'png',
};

/** Sent to be saved, never to be shown inside our pages: what a file from outside does is its own affair. */
export const sendScan = async (
  res: Response,
  storage: Storage,
  { key, type, at }: { readonly key: string; readonly type: ScanType; readonly at: string },
): Promise<void> => {
  const { bytes } = await storage.stat(key);
  res.attachment(`consent-${at.slice(0, 10)}.${SCAN_ENDINGS[type]}`);
  res.set({
    'Content-Type': type,
    'Content-Length': String(bytes),
    'Cache-Control': 'private, no-store',
    'Content-Security-Policy': "default-src 'none'; sandbox",
    'X-Content-Type-Options': 'nosniff',
  });
  await pipeline(await storage.read(key), res);
};
