import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Clip } from '#shared/contracts/clips.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { aClip } from './records.ts';

/** A Bench that a coach has open: a clip from the front without reps, but for what is changed. */
export const benchDocument = (change: Partial<Clip>): BenchDocument => {
  const clip = aClip({ state: 'ready', view: 'front', cameraStood: 'front', ...change });
  return {
    clip: { ...clip, frames: null },
    visit: { id: clip.visitId, day: '2026-03-03' },
    athlete: { id: clip.visitId, name: 'Ines Marlow', heightMm: null },
    reps: [],
    comments: [],
    calls: [],
    assumption: [],
    markErrors: [],
    protocol: { version: 1, at: '2026-03-03T16:20:00Z', rules: STANDARD_RULES },
    otherReps: [],
    may: { mark: true, comment: true, markAgain: false },
  };
};
