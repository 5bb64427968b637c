import type { PublicReplay } from '#shared/contracts/replays.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { landmark } from '#shared/landmarks/table.ts';
import {
  LANDMARK_IDS,
  type LandmarkId,
  type LandmarkSetId,
  type Mark,
  type Marks,
} from '#shared/landmarks/types.ts';
import { hipCentre } from '#shared/measures/hip-centre.ts';
import { noteShape } from '#shared/overlay/notes.ts';
import { overlay } from '#shared/overlay/overlay.ts';
import type { HipCentres } from '#shared/overlay/segments.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { frameBetween } from './frame-between.ts';

type MarkedFrame = PublicReplay['overlay'][number];

const isLandmark = (id: string): id is LandmarkId => LANDMARK_IDS.some((known) => known === id);

const marksOf = ({ marks }: MarkedFrame): Marks => {
  const out: Partial<Record<LandmarkId, Mark>> = {};
  for (const { landmark, u, v, looked } of marks)
    if (isLandmark(landmark))
      out[landmark] = {
        hidden: false,
        point: framePoint(u, v),
        scale: 1,
        source: looked ? 'hand' : 'tracked',
        looked,
      };
  return out;
};

const pointOf = (marks: Marks, id: LandmarkId) => {
  const mark = marks[id];
  return mark && !mark.hidden ? mark.point : null;
};

const EXTRA: ReadonlySet<LandmarkId> = new Set([
  'acromion-support',
  'acromion-lifted',
  'toe-support',
  'heel-support',
]);

/** The landmarks of the richest set that is marked, and trunk and foot: what the poorer sets add would lie over it. */
const withoutPoorer = (marks: Marks): Marks => {
  const set: LandmarkSetId = marks['thigh-tip']
    ? 'belt+thigh'
    : marks['belt-tip']
      ? 'belt'
      : 'bare';
  const out: Partial<Record<LandmarkId, Mark>> = {};
  for (const id of LANDMARK_IDS) {
    const { sets, views } = landmark(id);
    const kept = sets.includes(set) || EXTRA.has(id) || !views.includes('front');
    if (kept && marks[id]) out[id] = marks[id];
  }
  return out;
};

/** ASIS distance of the quiet stance, px: from it the hip centres are drawn. Null where it is not marked. */
export const quietWidth = ({
  overlay: frames,
  moments,
}: Pick<PublicReplay, 'overlay' | 'moments'>): number | null => {
  const quiet = frames.find(({ frame }) => frame === moments.quiet) ?? frames[0];
  if (!quiet) return null;
  const marks = marksOf(quiet);
  const a = pointOf(marks, 'asis-support');
  const b = pointOf(marks, 'asis-lifted');
  return a && b ? Math.hypot(a.u - b.u, a.v - b.v) : null;
};

const hipsOf = (marks: Marks, width: number | null): HipCentres => {
  const support = pointOf(marks, 'asis-support');
  const lifted = pointOf(marks, 'asis-lifted');
  if (!support || !lifted || width === null) return { support: null, lifted: null };
  return {
    support: hipCentre(support, lifted, width),
    lifted: hipCentre(lifted, support, width),
  };
};

export interface Shown {
  readonly primitives: readonly Primitive[];
  readonly lift: number | null;
  readonly liftPlusMinus: number | null;
  readonly turn: number | null;
  readonly turnPlusMinus: number | null;
}

/** What is drawn on a frame, and its angles: the marks, and what the comment on show points at. */
export const drawnOn = (
  replay: Pick<PublicReplay, 'overlay' | 'moments' | 'view' | 'side'>,
  times: readonly Milliseconds[],
  frame: number,
  comment: PublicReplay['comments'][number] | null,
): Shown => {
  const known = frameBetween(replay.overlay, times, frame);
  const marks = known ? withoutPoorer(marksOf(known)) : {};
  const note = comment?.shape;
  const pointed =
    comment && note && comment.fromFrame <= frame && frame <= comment.toFrame
      ? [noteShape(note)]
      : [];
  return {
    primitives: [
      ...overlay({
        view: replay.view,
        supportSide: replay.side,
        marks,
        hips: hipsOf(marks, quietWidth(replay)),
        values: null,
      }),
      ...pointed,
    ],
    lift: known?.lift ?? null,
    liftPlusMinus: known?.liftPlusMinus ?? null,
    turn: known?.turn ?? null,
    turnPlusMinus: known?.turnPlusMinus ?? null,
  };
};
