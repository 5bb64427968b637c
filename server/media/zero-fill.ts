import type { FileHandle } from 'node:fs/promises';

const ZEROES = Buffer.alloc(64 * 1024);

/** Writes zeroes from `start` up to, not including, `end`. */
export const zeroFill = async (file: FileHandle, start: number, end: number): Promise<void> => {
  for (let at = start; at < end; at += ZEROES.length)
    await file.write(ZEROES, 0, Math.min(ZEROES.length, end - at), at);
};
