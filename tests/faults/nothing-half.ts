import assert from 'node:assert/strict';
import { readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { product } from '#server/db/in-practice.ts';
import { Clip } from '#server/features/clips/clip.entity.ts';
import { clipFiles, hiddenFiles, keptFilmKey } from '#server/features/clips/clip-files.ts';
import { Upload } from '#server/features/clips/upload.entity.ts';
import { KeptFilm } from '#server/features/replays/film/kept-film.entity.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { reportKey } from '#server/features/reports/report-files.ts';
import { Report } from '#server/features/reports/report.entity.ts';
import type { Rep } from '#server/features/reps/rep.entity.ts';
import type { Visit } from '#server/features/visits/visit.entity.ts';
import type { Place } from './place.ts';

const filesUnder = async (root: string): Promise<string[]> => {
  const entries = await readdir(root, { recursive: true, withFileTypes: true }).catch(() => []);
  return entries
    .filter((entry) => entry.isFile())
    .map(({ parentPath, name }) => join(parentPath, name).slice(root.length + 1));
};

/** Storage and database tell the same: no file without its row, no row without its file, nothing temporary. */
export const expectNothingHalf = async ({
  instance,
  inPractice,
  practiceId,
}: Place): Promise<void> => {
  const uploads = join(instance.data, 'uploads');
  const { files, incoming, coming } = await inPractice(product(practiceId), async ({ em }) => {
    const clips = await em.find(Clip, {});
    const replays = await em.find(Replay, { hiddenHead: { $ne: null } }, { populate: ['rep'] });
    const films = await em.find(KeptFilm, { state: 'ready' }, { populate: ['replay.rep'] });
    const reports = await em.find(Report, { state: 'ready' }, { populate: ['visit'] });
    const underWay = await em.find(Upload, {});
    return {
      files: [
        ...clips.flatMap((clip) => Object.values(clip.files).filter((key) => key !== null)),
        ...replays.flatMap(({ id, rep, hiddenHead }) => {
          const clipId = (rep.unwrap() as Rep).clip.id;
          return Object.values(hiddenFiles(practiceId, clipId, id, hiddenHead?.id ?? ''));
        }),
        ...films.map(({ id, replay }) => {
          const { rep } = replay.unwrap() as Replay;
          return keptFilmKey(practiceId, (rep.unwrap() as Rep).clip.id, id);
        }),
        ...reports.map(({ id, visit }) =>
          reportKey(practiceId, (visit.unwrap() as Visit).athlete.id, id),
        ),
      ],
      // in its place while nobody could say whether its clip was committed: given up with its row
      coming: new Set<string>(underWay.map(({ id }) => clipFiles(practiceId, id).original)),
      incoming: new Set<string>(underWay.flatMap(({ id }) => [id, `${id}.json`])),
    };
  });
  const stored = (await filesUnder(join(uploads, 'files'))).filter((one) => !coming.has(one));
  assert.deepEqual(stored.sort(), files.sort());
  const strays = (await filesUnder(join(uploads, 'incoming'))).filter((one) => !incoming.has(one));
  assert.deepEqual(strays, [], 'nothing comes in that no row knows');
  assert.deepEqual(await readdir(join(uploads, 'temp')).catch(() => []), [], 'temporary folders');
};
