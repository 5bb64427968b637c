import type { RepInput } from '#shared/course/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { type Degrees, degrees, toRadians } from '#shared/geometry/units.ts';
import type { LandmarkId, Mark, Marks, Side, View } from '#shared/landmarks/types.ts';
import type { CameraInput, FrameInput } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';

/** mm: x forward to the camera, y to the athlete's left, z up; the floor is 0. */
type Point = readonly [x: number, y: number, z: number];

/** What the made body does in one frame. */
export interface Pose {
  readonly lift: Degrees;
  /** Turns of femur and pelvis to the athlete's left. */
  readonly femur: Degrees;
  readonly pelvis: Degrees;
  /** The support-side hip lower (+) or higher, mm at each ASIS; trunk lean to the left. */
  readonly hikeMm?: number;
  readonly lean?: Degrees;
}

export const WIDTH = 240;
export const PELVIS_Z = 960;
export const THIGH = 430;
export const SHANK = 400;
const KNEE_RADIUS = 50;
export const FOCAL = 1500;
export const DISTANCE = 3000;
export const LENS = 900;

export const BELT_POINTER_MM = 130;
export const THIGH_POINTER_MM = 170;

/** A camera dead in front of the body, level, at known distance and height. */
export const madeCamera = (view: View = 'front'): CameraInput => ({
  view,
  width: 1080,
  height: 1920,
  mmPerPx: DISTANCE / FOCAL,
  distanceMm: DISTANCE,
  lensHeightMm: LENS,
  beltPointerMm: BELT_POINTER_MM,
  thighPointerMm: THIGH_POINTER_MM,
  plumbTilt: null,
  framesPerSecond: 60,
  mirrored: false,
  offFront: null,
  exposureMs: null,
  toes: null,
});

const seen = ([x, y, z]: Point): Mark => {
  const depth = DISTANCE - x;
  return {
    hidden: false,
    point: framePoint(540 + (FOCAL * y) / depth, 960 + (FOCAL * (LENS - z)) / depth),
    scale: 1,
    source: 'hand',
    looked: true,
  };
};

/** `ahead` mm forward and `left` mm to the left of a centre, turned to the left by an angle. */
const turned = (centre: Point, by: Degrees, ahead: number, left: number): Point => {
  const [c, s] = [Math.cos(toRadians(by)), Math.sin(toRadians(by))];
  return [centre[0] + ahead * c - left * s, centre[1] + ahead * s + left * c, centre[2]];
};

/** All front-view marks of one pose, through a pinhole camera. */
export const madeMarks = (side: Side, pose: Pose): Marks => {
  const sigma = side === 'left' ? 1 : -1;
  const pelvis: Point = [0, 0, PELVIS_Z];
  const hike = pose.hikeMm ?? 0;
  const asis = (left: number, up: number): Point => {
    const [x, y, z] = turned(pelvis, pose.pelvis, 0, left * (WIDTH / 2));
    return [x, y, z + up];
  };
  const hipZ = PELVIS_Z - 0.345 * WIDTH;
  const hipY = WIDTH / 2 - 0.14 * WIDTH;
  const angle = toRadians(pose.lift);
  const lifted: Point = [THIGH * Math.sin(angle), -sigma * hipY, hipZ - THIGH * Math.cos(angle)];
  const knee: Point = [0, sigma * hipY, hipZ - THIGH];
  const strap: Point = [0, sigma * hipY, hipZ - THIGH + 60];
  const lean = toRadians(pose.lean ?? degrees(0));
  const shoulders: Point = [0, 480 * Math.sin(lean), hipZ + 480 * Math.cos(lean)];
  const points: Partial<Record<LandmarkId, Point>> = {
    'asis-support': asis(sigma, -hike),
    'asis-lifted': asis(-sigma, hike),
    'belt-tip': turned(pelvis, pose.pelvis, BELT_POINTER_MM, 0),
    'outline-support': turned(pelvis, pose.pelvis, -70, sigma * 160),
    'outline-lifted': turned(pelvis, pose.pelvis, -70, -sigma * 160),
    'lifted-knee': lifted,
    kneecap: turned(knee, pose.femur, KNEE_RADIUS, 0),
    'knee-inner': turned(knee, pose.femur, 0, -sigma * KNEE_RADIUS),
    'knee-outer': turned(knee, pose.femur, 0, sigma * KNEE_RADIUS),
    'thigh-tip': turned(strap, pose.femur, THIGH_POINTER_MM, 0),
    'strap-inner': turned(strap, pose.femur, 0, -sigma * 65),
    'strap-outer': turned(strap, pose.femur, 0, sigma * 65),
    'ankle-support': [0, sigma * hipY, 75],
    // the knee bends: the foot hangs half-way behind it
    'ankle-lifted': [lifted[0] / 2, lifted[1], lifted[2] - SHANK],
    'acromion-support': [0, shoulders[1] + sigma * 180, shoulders[2]],
    'acromion-lifted': [0, shoulders[1] - sigma * 180, shoulders[2]],
    'toe-support': [160, sigma * (hipY + 30), 20],
    'heel-support': [-50, sigma * hipY, 10],
  };
  const marks: Partial<Record<LandmarkId, Mark>> = {};
  for (const [id, point] of Object.entries(points) as [LandmarkId, Point][])
    marks[id] = seen(point);
  return marks;
};

/** Lifts of a whole rep: still, up past 90°, held, down. One frame every 50 ms. */
export const MADE_LIFTS: readonly number[] = [
  ...Array.from({ length: 12 }, () => 0),
  ...Array.from({ length: 23 }, (_, i) => 5 * (i + 1) - 5),
  ...[111, 112, 112, 111],
  ...Array.from({ length: 21 }, (_, i) => Math.max(0, 100 - 5 * i)),
  ...[0, 0, 0],
];

export const MADE_GAP_MS = 50;

/**
 * A rep whose true lift and turn are known. `turnAt` gives the turn (external positive) at a lift;
 * `thighShare` of it is done by the femur, the rest by the pelvis.
 */
export const madeRep = (
  side: Side,
  turnAt: (lift: number) => number,
  { id = 'made', thighShare = 0 }: { readonly id?: string; readonly thighShare?: number } = {},
): RepInput => {
  const sigma = side === 'left' ? 1 : -1;
  const frames = MADE_LIFTS.map((lift, i): FrameInput => {
    const turn = turnAt(lift);
    return {
      frame: frameIndex(i * 3),
      time: milliseconds(i * MADE_GAP_MS),
      marks: madeMarks(side, {
        lift: degrees(lift),
        femur: degrees(sigma * turn * thighShare),
        pelvis: degrees(-sigma * turn * (1 - thighShare)),
      }),
    };
  });
  return {
    id,
    supportSide: side,
    camera: madeCamera(),
    athlete: { bodyHeightMm: 1720 },
    frames,
    sharedQuiet: null,
    moved: {},
    labels: null,
    excluded: null,
  };
};
