import { type Colour, colour } from '../figure/paints.ts';
import { RAD, type Vec } from '../model/vec.ts';

/** A block standing in the room, turned about the vertical. */
export interface Block {
  readonly centre: Vec;
  readonly half: Vec;
  readonly cos: number;
  readonly sin: number;
  readonly tint: Colour;
}

/** A round pole with bands of two tints, each `band` mm tall. */
export interface Pole {
  readonly x: number;
  readonly y: number;
  readonly bottom: number;
  readonly top: number;
  readonly radius: number;
  readonly band: number;
  readonly tints: readonly [Colour, Colour];
}

/** Blocks that stand together, and an upright block around them all. */
export interface Group {
  readonly bound: Block;
  readonly blocks: readonly Block[];
}

export interface RoomScene {
  readonly groups: readonly Group[];
  readonly poles: readonly Pole[];
}

/** The wall behind the person, the ceiling: mm from the origin. */
export const WALL_X = -1650;
export const CEILING_Z = 3050;
export const WALL = colour('#a3a99c');
export const CEILING = colour('#c9c8be');

const TRIM = colour('#d9d6ca');
const LEAF = colour('#6f7f7c');
const PANEL = colour('#67766f');
const DARK = colour('#2b2f2f');
const WOOD = colour('#9a7350');
const SEAT = colour('#b98f66');

const block = (centre: Vec, half: Vec, tint: Colour, turn = 0): Block => ({
  centre,
  half,
  cos: Math.cos(turn * RAD),
  sin: Math.sin(turn * RAD),
  tint,
});

/** A door in its frame on the wall, its middle at `y`. */
const door = (y: number): readonly Block[] => {
  const [half, tall] = [430, 2040];
  const leaf = WALL_X + 8;
  const panel = (z: number, halfZ: number): Block =>
    block([leaf + 8, y, z], [6, 285, halfZ], PANEL);
  return [
    block([WALL_X + 14, y - half - 45, tall / 2 + 22], [16, 45, tall / 2 + 22], TRIM),
    block([WALL_X + 14, y + half + 45, tall / 2 + 22], [16, 45, tall / 2 + 22], TRIM),
    block([WALL_X + 14, y, tall + 45], [16, half + 90, 45], TRIM),
    block([leaf, y, tall / 2], [6, half, tall / 2], LEAF),
    panel(600, 400),
    panel(1560, 330),
    block([leaf + 34, y + half - 70, 1010], [5, 55, 10], DARK),
    block([leaf + 20, y + half - 70, 1010], [20, 9, 9], DARK),
  ];
};

const skirting = (from: number, to: number): readonly Block[] => [
  block([WALL_X + 9, (from + to) / 2, 55], [9, (to - from) / 2, 55], TRIM),
  block([WALL_X + 6, (from + to) / 2, 114], [6, (to - from) / 2, 6], TRIM),
];

/** A plain wooden chair; `turn` 0 looks into the lens. */
const chair = (x: number, y: number, turn: number): readonly Block[] => {
  const [c, s] = [Math.cos(turn * RAD), Math.sin(turn * RAD)];
  const piece = (at: Vec, half: Vec, tint: Colour): Block =>
    block([x + c * at[0] - s * at[1], y + s * at[0] + c * at[1], at[2]], half, tint, turn);
  const leg = (px: number, py: number, tall: number): Block =>
    piece([px, py, tall / 2], [16, 16, tall / 2], WOOD);
  return [
    piece([0, 0, 445], [205, 200, 14], SEAT),
    leg(180, 175, 432),
    leg(180, -175, 432),
    leg(-185, 175, 860),
    leg(-185, -175, 860),
    piece([0, 178, 385], [180, 10, 26], WOOD),
    piece([0, -178, 385], [180, 10, 26], WOOD),
    piece([180, 0, 385], [10, 175, 26], WOOD),
    piece([-185, 0, 800], [11, 160, 44], SEAT),
    piece([-185, 0, 650], [11, 160, 26], SEAT),
  ];
};

export interface RoomPlan {
  /** direction along the picture in which the chair stands: −1 left, 1 right */
  readonly chairSide: -1 | 1;
  /** the chair stands behind the person where the support side is away from the lens */
  readonly chairBehind: boolean;
  readonly rodY: number;
  readonly rodLength: number;
}

const group = (blocks: readonly Block[]): Group => {
  const edge = (axis: 0 | 1 | 2, sign: 1 | -1): number =>
    sign *
    Math.max(
      ...blocks.map(({ centre, half, cos, sin }) => {
        const reach =
          axis === 2
            ? half[2]
            : Math.abs((axis === 0 ? cos : sin) * half[0]) +
              Math.abs((axis === 0 ? sin : cos) * half[1]);
        return sign * centre[axis] + reach;
      }),
    );
  const span = (axis: 0 | 1 | 2): readonly [number, number] => {
    const [low, high] = [edge(axis, -1), edge(axis, 1)];
    return [(low + high) / 2, (high - low) / 2];
  };
  const [x, y, z] = [span(0), span(1), span(2)];
  return { bound: block([x[0], y[0], z[0]], [x[1], y[1], z[1]], DARK), blocks };
};

export const roomScene = (plan: RoomPlan): RoomScene => {
  const doorY = -830;
  return {
    groups: [
      group(door(doorY)),
      group([...skirting(-4000, doorY - 520), ...skirting(doorY + 520, 4000)]),
      group(
        plan.chairBehind
          ? chair(-620, plan.chairSide * 330, 90)
          : chair(-130, plan.chairSide * 590, plan.chairSide * -28),
      ),
      group([block([0, plan.rodY, 4], [75, 75, 4], DARK)]),
    ],
    poles: [
      {
        x: 0,
        y: plan.rodY,
        bottom: 0,
        top: plan.rodLength,
        radius: 11,
        band: 100,
        tints: [colour('#efece3'), colour('#2b2f2f')],
      },
    ],
  };
};
