import type { Clip, FrameTable } from '#shared/contracts/clips.ts';
import type { Boundaries, Rep } from '#shared/contracts/reps.ts';
import type { BoundaryId, RepBoundaries, RepInput } from '#shared/course/types.ts';
import { distance, plumbTilt } from '#shared/geometry/points.ts';
import type { FrameMarks, MarksByFrame } from '#shared/landmarks/commands.ts';
import { LANDMARK_IDS, type LandmarkId, type Mark, type Marks } from '#shared/landmarks/types.ts';
import { thighPointerFromSkin } from '#shared/measures/constants.ts';
import type { CameraInput, FrameInput } from '#shared/measures/inputs.ts';
import { type OffFront, offFrontOf } from '#shared/measures/off-front.ts';
import { type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { markedFrames } from './stored-marks.ts';

/** The clip's own facts that measuring needs; a clip without its frame table fits in. */
export type MeasuredClip = Pick<
  Clip,
  'width' | 'height' | 'geometry' | 'mmPerPx' | 'frameRate' | 'mirrored' | 'cameraStood'
>;

/** Time of every frame, from the exact ticks of the copy. */
export const timesOf = (table: FrameTable): Milliseconds[] =>
  table.ticks.map((tick) => milliseconds((tick * table.timeBase.num * 1000) / table.timeBase.den));

/** Seen from the athlete's left, forward is the picture's left. */
const toesOf = ({ cameraStood }: MeasuredClip): CameraInput['toes'] => {
  if (cameraStood !== 'athlete-left' && cameraStood !== 'athlete-right') return null;
  return cameraStood === 'athlete-left' ? 'image-left' : 'image-right';
};

export const cameraOf = (clip: MeasuredClip, view: Rep['view']): CameraInput | null => {
  const { width, height, geometry } = clip;
  if (width === null || height === null) return null;
  const { plumb, floorLine, shutter, thighPointerMm } = geometry;
  const camera: CameraInput = {
    view,
    width,
    height,
    mmPerPx: clip.mmPerPx,
    distanceMm: geometry.distanceMm,
    lensHeightMm: geometry.lensHeightMm,
    beltPointerMm: geometry.beltPointerMm,
    thighPointerMm: thighPointerMm === null ? null : thighPointerFromSkin(thighPointerMm),
    plumbTilt: plumb && plumbTilt(plumb.top, plumb.bottom),
    framesPerSecond: clip.frameRate?.perSecond ?? null,
    mirrored: clip.mirrored,
    offFront: null,
    exposureMs: shutter?.from === 'typed' ? 1000 / shutter.perSecond : null,
    ...(shutter?.from === 'smear' && { smearPx: distance(shutter.a, shutter.b) }),
    toes: toesOf(clip),
  };
  return view === 'front' && floorLine
    ? { ...camera, offFront: offFrontOf(floorLine, camera)?.by ?? null }
    : camera;
};

/** How far the camera of a front clip stood off the front, with its uncertainty; null where nothing tells it. */
export const offFrontOfClip = (clip: MeasuredClip): OffFront | null => {
  const camera = cameraOf(clip, 'front');
  const { floorLine } = clip.geometry;
  return camera && floorLine && offFrontOf(floorLine, camera);
};

/** Marks of one frame as the engine takes them; a coarser picture costs certainty. */
export const engineMarks = (marks: FrameMarks, sourceLongEdge: number): Marks => {
  const out: Partial<Record<LandmarkId, Mark>> = {};
  for (const id of LANDMARK_IDS) {
    const value = marks[id];
    if (!value) continue;
    out[id] =
      value.to === 'hidden'
        ? { hidden: true }
        : {
            hidden: false,
            point: value.point,
            scale: Math.max(1, sourceLongEdge / value.pictureLongEdge),
            source: value.source,
            looked: value.looked,
          };
  }
  return out;
};

export const frameInputs = (
  marks: MarksByFrame,
  times: readonly Milliseconds[],
  sourceLongEdge: number,
): FrameInput[] =>
  markedFrames(marks).flatMap((frame) => {
    const time = times[frame];
    const here = marks.get(frame);
    return time === undefined || !here
      ? []
      : [{ frame, time, marks: engineMarks(here, sourceLongEdge) }];
  });

/** The contract's names of a rep's moments, and the engine's. */
export const MOMENTS = {
  quietStart: 'quietFrom',
  quietEnd: 'quietTo',
  footOff: 'footOff',
  top: 'top',
  topEnd: 'lowerFrom',
  footDown: 'footDown',
} as const satisfies Record<keyof Boundaries, BoundaryId>;
export type Moment = keyof Boundaries;
export const MOMENT_ORDER = Object.keys(MOMENTS) as Moment[];

/** Only what a hand has moved counts; what the marks say is found anew each time. */
const movedOf = (
  boundaries: Boundaries,
  times: readonly Milliseconds[],
): Partial<RepBoundaries> => {
  const moved: { -readonly [K in BoundaryId]?: Milliseconds } = {};
  for (const moment of MOMENT_ORDER) {
    const boundary = boundaries[moment];
    if (boundary?.by !== 'hand') continue;
    const time = times[boundary.frame];
    if (time !== undefined) moved[MOMENTS[moment]] = time;
  }
  return moved;
};

/** What is stored of one rep, its clip and its person. */
export interface RepFacts {
  readonly rep: Pick<Rep, 'id' | 'supportSide' | 'view' | 'boundaries' | 'excluded'>;
  readonly clip: MeasuredClip;
  readonly times: readonly Milliseconds[];
  readonly marks: MarksByFrame;
  readonly bodyHeightMm: number | null;
}

/** Null until the clip's size is known. */
export const repInputOf = ({
  rep,
  clip,
  times,
  marks,
  bodyHeightMm,
}: RepFacts): RepInput | null => {
  const camera = cameraOf(clip, rep.view);
  if (!camera) return null;
  return {
    id: rep.id,
    supportSide: rep.supportSide,
    camera,
    athlete: { bodyHeightMm },
    frames: frameInputs(marks, times, Math.max(camera.width, camera.height)),
    sharedQuiet: null,
    moved: movedOf(rep.boundaries, times),
    labels: null,
    excluded: rep.excluded,
  };
};
