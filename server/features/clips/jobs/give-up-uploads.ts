import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import * as z from 'zod';
import { product } from '../../../db/in-practice.ts';
import { handles, type JobContext, type JobType } from '../../../jobs/job.ts';
import { giveUpUpload } from '../give-up-upload.ts';
import { Upload } from '../upload.entity.ts';

/** As long as an upload is waited for of which no byte comes; `uploads_to_give_up` has the same. */
const IDLE_MS = 3 * 86_400_000;

/** Gives up an upload that nobody came back for. */
export const GIVE_UP_UPLOAD: JobType<{ uploadId: string }> = {
  queue: 'give-up-upload',
  payload: z.object({ uploadId: z.uuid() }),
};

/** Killed at any instant, the row still names what is left, and the job runs again. */
const run = async ({
  ground,
  practiceId,
  payload: { uploadId },
}: JobContext<{ uploadId: string }>): Promise<void> => {
  const upload = await ground.inPractice(product(practiceId), ({ em }) =>
    em.findOne(Upload, { id: uploadId }),
  );
  if (!upload) return;
  const received = await stat(join(ground.storage.incoming, uploadId)).catch(() => null);
  const lastByteAt = Math.max(upload.openedAt.getTime(), received?.mtimeMs ?? 0);
  if (Date.now() - lastByteAt < IDLE_MS) return;
  await giveUpUpload(ground, practiceId, uploadId);
};

export const giveUpUploadsJob = handles({
  type: GIVE_UP_UPLOAD,
  lockKey: ({ uploadId }) => uploadId,
  run,
  expireInMinutes: 10,
  retryLimit: 5,
  lookAgainMinutes: 60,
  unfinished: {
    sql: 'select upload_id, practice_id from uploads_to_give_up()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { uploadId: String(row.upload_id) },
    }),
  },
});
