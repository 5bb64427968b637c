import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import { MissingFile, type Storage } from '#server/storage/storage.ts';
import type { AthleteExport } from './export-athlete.ts';
import type { HeldFile } from './held-file.ts';
import { zip, type ZipEntry } from './zip.ts';

const cutShort = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';

/** A file that is missing in storage is named as missing, and does not cost the person all the others. */
const entryOf = async (storage: Storage, file: HeldFile, now: Date): Promise<ZipEntry> => {
  const text = (name: string, said: string): ZipEntry => ({
    name,
    modified: now,
    content: () => Promise.resolve(Readable.from([Buffer.from(said)])),
  });
  if ('text' in file) return text(file.name, file.text);
  try {
    const { modified } = await storage.stat(file.key);
    return { name: file.name, modified, content: () => storage.read(file.key) };
  } catch (error) {
    if (!(error instanceof MissingFile)) throw error;
    return text(`${file.name}.missing.txt`, 'This file could not be found in storage.\n');
  }
};

/** Sends the archive as it is made: no clip is ever held whole, neither in memory nor on disk. */
export const sendExport = async (
  res: Response,
  storage: Storage,
  { name, files }: AthleteExport,
): Promise<void> => {
  const now = new Date();
  const entries: ZipEntry[] = [];
  for (const file of files) entries.push(await entryOf(storage, file, now));
  res.attachment(name);
  res.set({ 'Content-Type': 'application/zip', 'Cache-Control': 'private, no-store' });
  await pipeline(Readable.from(zip(entries), { objectMode: false }), res).catch(
    (error: unknown) => {
      if (!cutShort(error)) throw error;
    },
  );
};
