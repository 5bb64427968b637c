import type { LandmarkId } from '#shared/landmarks/types.ts';
import { femurLandmarks, femurLength } from '#shared/measures/turn-parts.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { type TiedLift, tiedLiftAt } from '#shared/measures/tied-lift.ts';
import type { RepCourse } from './course-of-rep.ts';

/** One coordinate over the frames of the fit, and its random error, px. */
export interface Coordinate {
  readonly at: Float64Array;
  readonly error: Float64Array;
}

/** The frames of one rise that carry weight, as plain columns of numbers. */
export interface RiseData {
  readonly gates: Gates;
  readonly count: number;
  readonly sigma: number;
  readonly lifts: Float64Array;
  readonly weights: Float64Array;
  readonly thighPart: Float64Array;
  readonly pelvisPart: Float64Array;
  /**
   * What is perturbed, in the order of `COORDINATES`; then u of the belt pointer's tip, or of both
   * outlines of the pelvis. Where lift is tied to a side clip, it stands in the place of the knee.
   */
  readonly coordinates: readonly Coordinate[];
  readonly liftIsTied: boolean;
  /** Shift of every lift by one standard error of each moment of the tie, degrees; none where not tied. */
  readonly tie: readonly Float64Array[];
  readonly pelvis: 'belt' | 'outline';
  readonly femurLength: number;
  readonly pelvisLength: number;
  readonly width: number;
  readonly thigh: number;
  readonly horizon: number;
  readonly focal: number;
  readonly centre: number;
}

/** Places in `coordinates`: both ASIS, the lifted knee's height, u of the femur's marks. */
export const COORDINATES = {
  liftedU: 0,
  liftedV: 1,
  supportU: 2,
  supportV: 3,
  kneeV: 4,
  femurNear: 5,
  femurA: 6,
  femurB: 7,
  pelvisFirst: 8,
  pelvisSecond: 9,
} as const;

const column = (frames: readonly LevelFrame[], id: LandmarkId, axis: 'u' | 'v'): Coordinate => ({
  at: Float64Array.from(frames, ({ marks }) => marks[id]?.[axis] ?? NaN),
  error: Float64Array.from(frames, ({ marks }) => marks[id]?.error ?? NaN),
});

/** Lift and its standard uncertainty by its own marks, degrees. */
const tiedColumn = (frames: readonly LevelFrame[], tied: TiedLift): Coordinate => ({
  at: Float64Array.from(frames, ({ time }) => tiedLiftAt(tied, time)?.lift ?? NaN),
  error: Float64Array.from(frames, ({ time }) => tiedLiftAt(tied, time)?.u ?? NaN),
});

const tieColumns = (frames: readonly LevelFrame[], tied: TiedLift): Float64Array[] => {
  const moments = tied.samples[0]?.byTie ?? [];
  return moments.map((_, k) =>
    Float64Array.from(frames, ({ time }) => tiedLiftAt(tied, time)?.byTie[k] ?? NaN),
  );
};

/** Null where the quiet stance does not give the lengths the fit needs. */
export const riseDataOf = (course: RepCourse, gates: Gates): RiseData | null => {
  const { setting, set, level } = course;
  const { rig, reference, tiedLift } = setting;
  const { width, thigh, horizon } = reference;
  const femur = femurLength(setting);
  const pelvisLength = set === 'bare' ? rig.outlineDepthPx : rig.beltPointerPx;
  if (width === null || thigh === null || horizon === null) return null;
  if (femur === null || pelvisLength === null) return null;
  const chosen = course.frames.flatMap((frame, i) => {
    const marks = level[i];
    return frame.inFit && marks ? [{ frame, marks }] : [];
  });
  const marks = chosen.map((each) => each.marks);
  const values = (read: (frame: (typeof chosen)[number]['frame']) => number | null) =>
    Float64Array.from(chosen, ({ frame }) => read(frame) ?? NaN);
  const [near, a, b] = femurLandmarks(set);
  if (!near || !a || !b) return null;
  return {
    gates,
    count: chosen.length,
    sigma: rig.sigma,
    lifts: values((frame) => frame.lift),
    weights: values((frame) => frame.weight),
    thighPart: values((frame) => frame.thighPart),
    pelvisPart: values((frame) => frame.pelvisPart),
    coordinates: [
      column(marks, 'asis-lifted', 'u'),
      column(marks, 'asis-lifted', 'v'),
      column(marks, 'asis-support', 'u'),
      column(marks, 'asis-support', 'v'),
      tiedLift ? tiedColumn(marks, tiedLift) : column(marks, 'lifted-knee', 'v'),
      column(marks, near, 'u'),
      column(marks, a, 'u'),
      column(marks, b, 'u'),
      ...(set === 'bare'
        ? [column(marks, 'outline-support', 'u'), column(marks, 'outline-lifted', 'u')]
        : [column(marks, 'belt-tip', 'u')]),
    ],
    liftIsTied: tiedLift !== undefined,
    tie: tiedLift ? tieColumns(marks, tiedLift) : [],
    pelvis: set === 'bare' ? 'outline' : 'belt',
    femurLength: femur,
    pelvisLength,
    width,
    thigh,
    horizon,
    focal: rig.focal,
    centre: rig.centre,
  };
};
