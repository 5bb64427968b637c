import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { InPractice } from '#server/db/in-practice.ts';
import { product } from '#server/db/in-practice.ts';
import type { Storage } from '#server/storage/storage.ts';
import { Clip } from './clip.entity.ts';
import { clipPrefix } from './clip-files.ts';
import { Upload } from './upload.entity.ts';

/** Throws away what was received of an upload; where it has become a clip, that stays. */
export const giveUpUpload = async (
  { inPractice, storage }: { readonly inPractice: InPractice; readonly storage: Storage },
  practiceId: string,
  id: string,
): Promise<void> => {
  const work = product(practiceId);
  // files first: killed in between, the row still names them
  await rm(join(storage.incoming, id), { force: true });
  await rm(join(storage.incoming, `${id}.json`), { force: true });
  const isTakenIn = await inPractice(work, ({ em }) => em.count(Clip, { id }));
  if (!isTakenIn) await storage.deleteAll(clipPrefix(practiceId, id));
  await inPractice(work, ({ em }) => em.nativeDelete(Upload, { id }));
};
