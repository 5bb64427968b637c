import { CONSTANTS } from '#shared/measures/constants.ts';
import { forward } from '#shared/measures/lift-from-side.ts';
import type { RepCourse } from './course-of-rep.ts';

/** Height of the lifted ankle over its quiet height at a marked frame, mm, with its standard uncertainty. */
export interface FootHeight {
  readonly time: number;
  readonly height: number;
  readonly u: number;
}

/** As the front picture shows it: a foot that comes forward looks lower than it is to a lens above it. */
export const frontFootHeights = ({ level, setting }: RepCourse): readonly FootHeight[] => {
  const { means } = setting.reference;
  const { mmPerPx } = setting.rig;
  const lifted = means['ankle-lifted'];
  const support = means['ankle-support'];
  if (!lifted || !support) return [];
  const home = lifted.v - support.v;
  return level.flatMap(({ time, marks }) => {
    const { 'ankle-lifted': a, 'ankle-support': b } = marks;
    if (!a || !b) return [];
    const u = mmPerPx * Math.hypot(a.error, b.error);
    return [{ time, height: mmPerPx * (home - (a.v - b.v)), u }];
  });
};

/** How much the lens height may be misjudged where nobody measured it, mm: common practice, no source. */
const LENS_GUESS = 400;

/** Of the front camera, mm: its lens above the ankle, how far off that may be, and its distance. */
const frontLens = ({ setting: { rig, reference } }: RepCourse) => {
  const { 'ankle-support': ankle } = reference.means;
  if (rig.lensHeightMm !== null)
    return { above: rig.lensHeightMm - CONSTANTS.ankleHeight.value, off: 0 };
  if (!ankle || reference.horizon === null) return null;
  return { above: rig.mmPerPx * (ankle.v - reference.horizon), off: LENS_GUESS };
};

/** What a side clip shows of the foot, as the front camera saw it at that moment. */
export const sideFootHeights = (side: RepCourse, front: RepCourse): readonly FootHeight[] => {
  const { mmPerPx } = side.setting.rig;
  const home = side.setting.reference.means['ankle-lifted'];
  const ahead = forward(side.setting);
  const lens = frontLens(front);
  const distance = front.setting.rig.focal * front.setting.rig.mmPerPx;
  if (!home || ahead === null || !lens) return [];
  return side.level.flatMap(({ time, marks: { 'ankle-lifted': ankle } }) => {
    if (!ankle) return [];
    const up = mmPerPx * (home.v - ankle.v);
    const forwards = mmPerPx * ahead * (ankle.u - home.u);
    const nearer = distance / (distance - forwards);
    const height = lens.above - (lens.above - up) * nearer;
    const u = Math.hypot(mmPerPx * ankle.error, lens.off * (nearer - 1));
    return Number.isFinite(height) ? [{ time, height, u }] : [];
  });
};
