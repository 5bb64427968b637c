import type { Readable } from 'node:stream';
import { MissingFile, type Storage } from '#server/storage/storage.ts';
import { Problem } from '../../http/problem.ts';
import { athletePrefix } from '../athletes/athlete-files.ts';

/** Among the files of the person themselves, so that they go with the person. */
export const reportKey = (practiceId: string, athleteId: string, reportId: string): string =>
  `${athletePrefix(practiceId, athleteId)}/reports/${reportId}.pdf`;

/** @throws Problem 'report-missing-in-storage' */
export const readReport = async (
  storage: Storage,
  key: string,
): Promise<{ readonly bytes: number; readonly stream: Readable }> => {
  try {
    const { bytes } = await storage.stat(key);
    return { bytes, stream: await storage.read(key) };
  } catch (error) {
    if (error instanceof MissingFile) throw new Problem('report-missing-in-storage');
    throw error;
  }
};
