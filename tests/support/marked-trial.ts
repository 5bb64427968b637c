import { randomUUID } from 'node:crypto';
import { expect } from 'vitest';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { makeVisit } from '#server/features/visits/visit.factory.ts';
import type { Api } from './api.ts';
import type { GoldenClip } from './golden.ts';

/** A trial as a clip of a visit of its own, marked through the API by the coach of the athlete. */
export const markedTrial = async (
  api: Api,
  coach: Awaited<ReturnType<Api['as']>>,
  golden: GoldenClip,
  /** Of the visit; today where left out. */
  day?: string,
) => {
  const { coach: user, athlete } = api.world;
  const { width, height, geometry, frames, trial } = golden;
  const { visit, clip } = await api.ground.inPractice(user, ({ em }) => {
    const made = makeVisit(em, { athlete, coach: user, ...(day !== undefined && { day }) });
    return Promise.resolve({
      visit: made,
      clip: makeClip(em, {
        visit: made,
        uploadedBy: user,
        width,
        height,
        geometry,
        frames,
        frameCount: frames.count,
        frameRate: { perSecond: 60, variable: false, minPerSecond: 60, maxPerSecond: 60 },
      }),
    });
  });
  for (const { startFrame, endFrame, commands } of golden.reps) {
    const { body } = await coach
      .post(`/api/clips/${clip.id}/reps`)
      .send({ supportSide: trial.supportSide, startFrame, endFrame })
      .expect(201);
    const saved = await coach.post(`/api/reps/${body.id}/marks`).send({ commands }).expect(200);
    expect(
      saved.body.outcomes.every((each: { outcome: string }) => each.outcome === 'applied'),
    ).toBe(true);
  }
  const side = `/api/visits/${visit.id}/sides/${trial.supportSide}`;
  return { visit, clip, side };
};

/** Moves the first mark of one of the trial's reps (from 0) by 2 px, as the coach would. */
export const moveFirstMark = async (
  coach: Awaited<ReturnType<Api['as']>>,
  { id: clipId }: { readonly id: string },
  golden: GoldenClip,
  rep = 0,
): Promise<void> => {
  const [command] = golden.reps[rep]?.commands ?? [];
  if (command?.set.to !== 'point') throw new Error('The rep begins with a point.');
  const moved = {
    ...command,
    id: randomUUID(),
    baseRevision: 1,
    set: { ...command.set, u: command.set.u + 2 },
  };
  const { items } = (await coach.get(`/api/clips/${clipId}/reps`).expect(200)).body;
  await coach
    .post(`/api/reps/${items[rep].id}/marks`)
    .send({ commands: [moved] })
    .expect(200);
};
