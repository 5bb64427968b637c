import { join } from 'node:path';
import { makeConsent } from '#server/features/athletes/athlete.factory.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { clipFiles } from '#server/features/clips/clip-files.ts';
import { makeVisit } from '#server/features/visits/visit.factory.ts';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { makeClip as makeFile } from '#tests/fixtures/media/make-clips.ts';
import type { Api } from './api.ts';

/** A short clip of the world's athlete with real copies, consent, a call by eye and a rep on frames 2 to 25. */
export const playedClip = async (api: Api, folder: string) => {
  const coach = await api.as(api.world.coach);
  const { coach: user, athlete, practiceId } = api.world;
  const original = join(folder, 'constant.mp4');
  await makeFile('constant.mp4', original);
  const copies = await prepareClip({ original, outDir: join(folder, 'copies') });
  const { num, den } = copies.frames.timeBase;
  const { width, height } = copies.facts.upright;
  const count = copies.frames.ticks.length;
  const { visit, clip } = await api.ground.inPractice(user, ({ em }) => {
    makeConsent(em, { athlete, recordedBy: user, purposes: ['assessment', 'sharing-by-link'] });
    const visit = makeVisit(em, { athlete, coach: user });
    const clip = makeClip(em, {
      visit,
      uploadedBy: user,
      ...{ width, height, frameCount: count },
      frames: { count, timeBase: { num, den }, ticks: [...copies.frames.ticks] },
      copies: {
        bench: { width, height, allIntra: true, bytes: copies.bench.bytes },
        replay: { width, height, bytes: copies.replay.bytes },
        strip: { frames: [0], width: 90, height: 160 },
      },
    });
    clip.files = clipFiles(practiceId, clip.id);
    return Promise.resolve({ visit, clip });
  });
  const files = clipFiles(practiceId, clip.id);
  const { storage } = api.ground;
  await storage.putFile(files.bench, copies.bench.path, 'video/mp4');
  await storage.putFile(files.replay, copies.replay.path, 'video/mp4');
  await storage.putFile(files.poster, copies.poster.path, 'image/jpeg');
  const rep = await coach
    .post(`/api/clips/${clip.id}/reps`)
    .send({ supportSide: 'right', startFrame: 2, endFrame: 25 })
    .expect(201);
  await coach
    .post(`/api/visits/${visit.id}/sides/right/call`)
    .send({ seen: 'early', confidence: 'sure' })
    .expect(201);
  return {
    coach,
    clipId: clip.id,
    size: { width, height },
    of: { visitId: visit.id, repId: String(rep.body.id), side: 'right' },
  };
};
