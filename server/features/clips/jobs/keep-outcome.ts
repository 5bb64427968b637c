import type { MediaRefusal } from '#server/media/refusals.ts';
import type { MeasuredRate, PreparedClip } from '#server/media/types.ts';
import { product } from '../../../db/in-practice.ts';
import type { Ground } from '../../../main/ground.ts';
import { readingsAreStale } from '../../readings/stale.ts';
import { Clip } from '../clip.entity.ts';
import { clipFiles } from '../clip-files.ts';
import { lockClip } from './lock-clip.ts';
import { tellClipState } from './tell-progress.ts';

const rateOf = (rate: MeasuredRate) => {
  if (rate.kind === 'variable')
    return {
      perSecond: rate.median,
      variable: true,
      minPerSecond: rate.min,
      maxPerSecond: rate.max,
    };
  const perSecond = rate.rate.numerator / rate.rate.denominator;
  return { perSecond, variable: false, minPerSecond: perSecond, maxPerSecond: perSecond };
};

/** The clip is ready: everything that was found and made, in one unit of work. */
export const keepPrepared = (
  { inPractice }: Ground,
  practiceId: string,
  clipId: string,
  made: PreparedClip,
  preparedSeconds: number,
): Promise<void> =>
  inPractice(product(practiceId), async (unit) => {
    await lockClip(unit.em, clipId);
    const clip = await unit.em.findOne(
      Clip,
      { id: clipId },
      { populate: ['visit.athlete', 'frames', 'facts'] },
    );
    if (!clip) return;
    const { facts, frames, bench, replay, strip } = made;
    const { num, den } = frames.timeBase;
    unit.em.assign(clip, {
      state: 'ready',
      progress: null,
      secondsLeft: null,
      preparedSeconds,
      refusalCode: null,
      refusalFigures: null,
      files: clipFiles(practiceId, clipId),
      width: facts.upright.width,
      height: facts.upright.height,
      durationSeconds: facts.duration,
      frameRate: rateOf(facts.frameRate),
      frameCount: frames.ticks.length,
      copies: {
        bench: {
          width: bench.width,
          height: bench.height,
          allIntra: bench.gop === 1,
          bytes: bench.bytes,
        },
        replay: { width: replay.width, height: replay.height, bytes: replay.bytes },
        strip: { frames: [...strip.frames], width: strip.tile.width, height: strip.tile.height },
      },
      origin: made.origin,
    });
    clip.frames.set({
      count: frames.ticks.length,
      timeBase: { num, den },
      ticks: [...frames.ticks],
    });
    clip.facts.set(facts);
    await unit.em.flush();
    // marks that were there before the copies, as after an import, are read now
    await readingsAreStale(unit, clip.visit.id);
    await tellClipState(unit, clip);
  });

/** The clip is not taken: why, for its sentence. */
export const keepRefusal = (
  { inPractice }: Ground,
  practiceId: string,
  clipId: string,
  refusal: MediaRefusal,
): Promise<void> =>
  inPractice(product(practiceId), async (unit) => {
    await lockClip(unit.em, clipId);
    const clip = await unit.em.findOne(Clip, { id: clipId }, { populate: ['visit.athlete'] });
    if (!clip) return;
    unit.em.assign(clip, {
      state: 'refused',
      progress: null,
      secondsLeft: null,
      refusalCode: refusal.code,
      refusalFigures: { ...refusal.figures },
    });
    await unit.em.flush();
    await tellClipState(unit, clip);
  });
