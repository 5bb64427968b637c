import type { RepInput } from '#shared/course/types.ts';
import type { LandmarkId, Mark, Side } from '#shared/landmarks/types.ts';
import type { CameraInput, FrameInput } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { type Body, bodyOf } from './body.ts';
import type { Chance } from './chance.ts';
import { figureOf } from './figure.ts';
import { markerOf } from './marking.ts';
import { habitOf, type Movement, movementOf } from './movement.ts';
import { type Pinhole, pinholeOf, seen } from './pinhole.ts';
import type { Plan } from './plan.ts';
import { skinsOf } from './skin.ts';

/** Lifts near which a frame of the rise is marked: more at the ends of the window, as advised. */
const MARKED_LIFTS = [22, 30, 38, 46, 53, 57, 60, 64, 69, 76, 82, 86, 89, 92, 95] as const;
const LOWERING_LIFTS = [85, 55, 30] as const;
const QUIET_FRAMES = 6;
const SHIFT_FRAMES = 2;
const TOP_FRAMES = 3;

/** First time in a stretch at which the lift has passed a height. */
const passing = (
  { poseAt }: Movement,
  lift: number,
  from: number,
  to: number,
  direction: 1 | -1,
): number => {
  let [low, high] = [from, to];
  for (let step = 0; step < 40; step += 1) {
    const time = (low + high) / 2;
    if (direction * (poseAt(time).lift - lift) < 0) low = time;
    else high = time;
  }
  return (low + high) / 2;
};

/** Times of the marked frames, ms, on the clip's own raster. */
const markedTimes = (movement: Movement, framesPerSecond: number): readonly number[] => {
  const { shiftFrom, footOff, top, lowerFrom, footDown, highest } = movement;
  const evenly = (from: number, to: number, count: number): readonly number[] =>
    Array.from({ length: count }, (_, i) => from + ((to - from) * (i + 0.5)) / count);
  const wanted = [
    ...evenly(0, shiftFrom, QUIET_FRAMES),
    ...evenly(shiftFrom, footOff, SHIFT_FRAMES),
    ...MARKED_LIFTS.filter((lift) => lift < highest - 1).map((lift) =>
      passing(movement, lift, footOff, top, 1),
    ),
    ...evenly(top, lowerFrom, TOP_FRAMES),
    ...LOWERING_LIFTS.map((lift) => passing(movement, lift, lowerFrom, footDown, -1)),
    footDown + 100,
  ];
  const frames = new Set(wanted.map((time) => Math.round((time * framesPerSecond) / 1000)));
  return [...frames].sort((a, b) => a - b).map((frame) => (frame * 1000) / framesPerSecond);
};

/** What the coach typed: lengths and distances are known to a few per cent. */
const typed = (
  { normal }: Chance,
  camera: Pinhole,
  body: Body,
  framesPerSecond: number,
): CameraInput => {
  const distance = camera.lens[0];
  return {
    view: 'front',
    width: camera.width,
    height: camera.height,
    mmPerPx: (distance / camera.focalPx) * normal(1, 0.025),
    distanceMm: distance * normal(1, 0.08),
    lensHeightMm: camera.lens[2] + normal(0, 12),
    beltPointerMm: body.beltPointer + normal(0, 5),
    thighPointerMm: body.thighPointer + 55 + normal(0, 3),
    plumbTilt: null,
    framesPerSecond,
    mirrored: false,
    offFront: null,
    exposureMs: null,
    toes: null,
  };
};

/** All marked reps of one person: a clip for each rep, one camera. */
export const clipsOf = (
  plan: Plan,
  chance: Chance,
): { readonly side: Side; readonly reps: readonly RepInput[] } => {
  const side = chance.pick(['left', 'right'] as const);
  const sigma = side === 'left' ? 1 : -1;
  const body = bodyOf(chance);
  const camera = pinholeOf(chance, plan.lines);
  const framesPerSecond = chance.pick([30, 60]);
  const input = typed(chance, camera, body, framesPerSecond);
  const habit = habitOf(chance, plan.change);
  const mark = markerOf(chance, plan.marking);
  const skins = skinsOf(chance, plan.reps, plan.artefact);
  const reps = skins.map((skin, at): RepInput => {
    const movement = movementOf(chance, habit, sigma);
    const frames = markedTimes(movement, framesPerSecond).map((time): FrameInput => {
      const points = figureOf(body, movement.poseAt(time), skin, sigma);
      const marks: Partial<Record<LandmarkId, Mark>> = {};
      for (const [id, point] of Object.entries(points))
        marks[id as LandmarkId] = mark(id as LandmarkId, time, seen(camera, point));
      return {
        frame: frameIndex(Math.round((time * framesPerSecond) / 1000)),
        time: milliseconds(time),
        marks,
      };
    });
    return {
      id: String(at),
      supportSide: side,
      camera: input,
      athlete: { bodyHeightMm: null },
      frames,
      sharedQuiet: null,
      moved: {},
      labels: null,
      excluded: null,
    };
  });
  return { side, reps };
};
