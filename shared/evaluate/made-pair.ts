import type { RepInput } from '#shared/course/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees, toRadians } from '#shared/geometry/units.ts';
import type { LandmarkId, Mark, Marks, Side } from '#shared/landmarks/types.ts';
import { normalDraws } from '#shared/measures/draws.ts';
import type { FrameInput } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import {
  DISTANCE,
  FOCAL,
  LENS,
  madeCamera,
  madeMarks,
  PELVIS_Z,
  SHANK,
  THIGH,
  WIDTH,
} from './made-rep.ts';

/** One movement: lift and turn at a time, ms from its beginning. */
export interface MadeMotion {
  readonly side: Side;
  /** Still until then; then up to `highest` in `upMs`, held for `holdMs`, down again in `upMs`. */
  readonly stillMs: number;
  readonly upMs: number;
  readonly holdMs: number;
  readonly highest: number;
  readonly turnAt: (lift: number) => number;
}

/** How a camera runs and how well its clip is marked. */
export interface MadeFilming {
  /** Of the movement's beginning on the clip's clock. */
  readonly startMs: number;
  readonly stepMs: number;
  /** Scatter of each mark, px, and the draws it comes from. */
  readonly scatterPx: number;
  readonly seed: number;
}

export const madeLiftAt = (
  { stillMs, upMs, holdMs, highest }: MadeMotion,
  time: number,
): number => {
  const smooth = (part: number): number =>
    (highest / 2) * (1 - Math.cos(Math.PI * Math.min(1, Math.max(0, part))));
  const down = stillMs + upMs + holdMs;
  return time < down ? smooth((time - stillMs) / upMs) : smooth(1 - (time - down) / upMs);
};

/** What a camera on the lifted side sees: hip, knee, shoulder and the near ankle; the far ankle beside it. */
const sideMarks = (lift: number): Marks => {
  const angle = toRadians(degrees(lift));
  const hipZ = PELVIS_Z - 0.345 * WIDTH;
  const hipY = WIDTH / 2 - 0.14 * WIDTH;
  const knee = [THIGH * Math.sin(angle), hipZ - THIGH * Math.cos(angle)] as const;
  const at = ([x, z]: readonly [number, number], near: number): Mark => {
    const depth = DISTANCE - near;
    return {
      hidden: false,
      point: framePoint(540 + (FOCAL * x) / depth, 960 + (FOCAL * (LENS - z)) / depth),
      scale: 1,
      source: 'hand',
      looked: true,
    };
  };
  return {
    trochanter: at([0, hipZ], hipY),
    'knee-lateral': at(knee, hipY),
    acromion: at([0, hipZ + 480], hipY),
    'ankle-lifted': at([knee[0] / 2, knee[1] - SHANK], hipY),
    'ankle-support': at([-40, 75], -hipY),
  };
};

const scattered = (marks: Marks, px: number, draw: () => number): Marks => {
  const out: Partial<Record<LandmarkId, Mark>> = {};
  for (const [id, mark] of Object.entries(marks) as [LandmarkId, Mark][])
    out[id] = mark.hidden
      ? mark
      : {
          ...mark,
          point: framePoint(mark.point.u + px * draw(), mark.point.v + px * draw()),
        };
  return out;
};

const filmed = (
  motion: MadeMotion,
  { startMs, stepMs, scatterPx, seed }: MadeFilming,
  marksAt: (lift: number) => Marks,
): FrameInput[] => {
  const draw = normalDraws(seed);
  const lasts = motion.stillMs + 2 * motion.upMs + motion.holdMs + 300;
  const first = Math.ceil(startMs / stepMs);
  return Array.from({ length: Math.floor(lasts / stepMs) }, (_, i) => {
    const time = (first + i) * stepMs;
    return {
      frame: frameIndex(first + i),
      time: milliseconds(time),
      marks: scattered(marksAt(madeLiftAt(motion, time - startMs)), scatterPx, draw),
    };
  });
};

const rep = (
  id: string,
  { side }: MadeMotion,
  camera: RepInput['camera'],
  frames: FrameInput[],
): RepInput => ({
  id,
  supportSide: side,
  camera,
  athlete: { bodyHeightMm: 1720 },
  frames,
  sharedQuiet: null,
  moved: {},
  labels: null,
  excluded: null,
});

/** The movement from the front. */
export const madeFront = (motion: MadeMotion, filming: MadeFilming): RepInput => {
  const sigma = motion.side === 'left' ? 1 : -1;
  return rep(
    'front',
    motion,
    { ...madeCamera(), framesPerSecond: 1000 / filming.stepMs },
    filmed(motion, filming, (lift) =>
      madeMarks(motion.side, {
        lift: degrees(lift),
        femur: degrees(0),
        pelvis: degrees(-sigma * motion.turnAt(lift)),
      }),
    ),
  );
};

/** The same movement from the lifted side, with the toes to the image right. */
export const madeSide = (motion: MadeMotion, filming: MadeFilming): RepInput =>
  rep(
    'side',
    motion,
    {
      ...madeCamera('lifted-side'),
      framesPerSecond: 1000 / filming.stepMs,
      toes: 'image-right',
    },
    filmed(motion, filming, sideMarks),
  );
