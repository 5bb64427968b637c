import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Reading } from '#shared/contracts/readings.ts';
import { degrees } from '#shared/geometry/units.ts';
import { uncovered } from '#shared/head/heads.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { viewOf } from '#shared/records/views.ts';
import { frameBetween } from '#shared/replay/frame-between.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { currentHead, headTrack } from '../heads/current-head.ts';
import type { Head } from '../heads/head.entity.ts';
import { spanOf } from '../replays/span.ts';
import { Rep } from '../reps/rep.entity.ts';
import { timesOfClip } from '../reps/reps.presenter.ts';
import { storedReps } from '../reps/stored-reps.ts';
import type { ReportKeyFrames } from './report-content.ts';

const WHERE = 'Open the clip on the Bench and choose ‘Hide the head’';

/**
 * The version of the box by which pictures of these frames may be shown; else why there are none. Nobody has said
 * that a report may show the head, so without a box that somebody has looked at there are no pictures.
 */
export const headOfFrames = async (
  em: EntityManager,
  clip: Clip,
  frames: readonly number[],
): Promise<Head | string> => {
  const head = await currentHead(em, clip.id);
  if (!head) return `no box is drawn around the head in this clip. ${WHERE}`;
  const track = headTrack(head, clip);
  if (frames.some((frame) => uncovered(track, { from: frame, to: frame }).length > 0))
    return `the box around the head does not cover every one of them. ${WHERE}, and follow it through the whole clip`;
  return head.lookedAt
    ? head
    : `nobody has looked yet whether the box covers the head. ${WHERE}, look through it and confirm`;
};

/** Quiet stance, both gates and the top of the first rep that counts; null where no rep does. */
export const keyFramesOf = async (
  em: EntityManager,
  reading: Reading,
  side: Side,
  athlete: Athlete,
): Promise<ReportKeyFrames | null> => {
  const counting = reading.result.reps.find(({ used }) => used)?.id;
  const rep =
    counting === undefined
      ? null
      : await em.findOne(Rep, { id: counting }, { populate: ['clip.frames'] });
  const clip = rep?.clip.unwrap();
  if (!rep || !clip) return null;
  const stored = (await storedReps(em, [clip], athlete)).find((each) => each.rep.id === rep.id);
  if (!stored) return null;
  const gates = gatesOf(reading.result.rules);
  const span = { from: rep.startFrame, to: rep.endFrame };
  const { moments, overlay } = spanOf(stored, span, {
    figures: true,
    gates: { from: degrees(gates.from), to: degrees(gates.to) },
  });
  const times = timesOfClip(clip);
  const rows = Object.values(moments).flatMap((frame) =>
    frame === null ? [] : (frameBetween(overlay, times, frame) ?? []),
  );
  if (rows.length === 0) return null;
  const head = await headOfFrames(
    em,
    clip,
    rows.map(({ frame }) => frame),
  );
  return {
    clip: clip.id,
    head: typeof head === 'string' ? null : head.id,
    leftOut: typeof head === 'string' ? head : null,
    drawn: { overlay: rows, moments, view: viewOf(clip.cameraStood, rep.supportSide), side },
  };
};
