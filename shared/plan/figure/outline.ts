import { type Point, taper } from '#shared/geometry/taper.ts';
import { type Joints, type LimbJoints } from './body.ts';
import { away, type Spot } from './reach.ts';

/** What a part of the figure is, for its colour. */
export type PartLook = 'support' | 'lifted' | 'body' | 'load';

/** One closed outline, in drawing order: what comes later lies nearer. */
export interface Part {
  readonly look: PartLook;
  readonly path: string;
}

type Place = (spot: Spot) => Point;

const LEG = { hip: 11, knee: 7, ankle: 4.5, heel: 4.5, toe: 2.8 } as const;
const ARM = { shoulder: 5.5, elbow: 4.4, hand: 3.4 } as const;
const TRUNK = { hip: 11.5, shoulder: 9.5 } as const;
const HEAD = 11.5;

const circle = ([x, y]: Point, r: number): string =>
  `M${x - r} ${y}A${r} ${r} 0 1 1 ${x + r} ${y}A${r} ${r} 0 1 1 ${x - r} ${y}Z`;

/** The parts of a figure, far ones first. */
export const outlineOf = (
  joints: Joints,
  place: Place,
  scale: number,
  load: 'near' | 'far' | undefined,
): Part[] => {
  const limb = (look: PartLook, from: Spot, to: Spot, radii: readonly [number, number]): Part => ({
    look,
    path: taper(place(from), place(to), radii[0] * scale, radii[1] * scale),
  });
  const leg = (look: PartLook, { root, joint, end, foot }: Joints['near']): Part[] => [
    limb(look, root, joint, [LEG.hip, LEG.knee]),
    limb(look, joint, end, [LEG.knee, LEG.ankle]),
    // heel and toe lie below the ankle and turn with the foot
    limb(look, away(away(end, foot, -4), foot - Math.PI / 2, 3.4), toeOf(end, foot), [
      LEG.heel,
      LEG.toe,
    ]),
  ];
  const arm = ({ root, joint, end }: LimbJoints): Part[] => [
    limb('body', root, joint, [ARM.shoulder, ARM.elbow]),
    limb('body', joint, end, [ARM.elbow, ARM.hand]),
  ];
  const weight = ({ end }: LimbJoints): Part[] => [
    limb('load', [end[0] - 8, end[1] - 2], [end[0] + 8, end[1] - 2], [2, 1.99]),
    ...[-9, 9].map((by) =>
      limb('load', [end[0] + by, end[1] - 6], [end[0] + by, end[1] + 2], [3.2, 3.19]),
    ),
  ];
  const { hip, shoulder, head, facing, near, far, nearArm, farArm } = joints;
  return [
    ...(load === 'far' ? weight(farArm) : []),
    ...arm(farArm),
    ...leg('lifted', far),
    limb('body', shoulder, head, [5, 4.9]),
    limb('body', hip, shoulder, [TRUNK.hip, TRUNK.shoulder]),
    // a nose says which way is forward
    limb('body', away(head, facing, 8), away(head, facing, 12.5), [3, 1.6]),
    { look: 'body', path: circle(place(head), HEAD * scale) },
    ...leg('support', near),
    ...(load === 'near' ? weight(nearArm) : []),
    ...arm(nearArm),
  ];
};

/** The tip of a foot. */
export const toeOf = (ankle: Spot, foot: number): Spot =>
  away(away(ankle, foot, 16), foot - Math.PI / 2, 5);
