import type { Chance } from './chance.ts';
import { after, apply, minus, pitched, rolled, type Turning, type Vector, yawed } from './space.ts';

/** Where the lens is and what it sees: the truth, of which the coach knows a part. */
export interface Pinhole {
  readonly width: number;
  readonly height: number;
  readonly focalPx: number;
  readonly lens: Vector;
  /** Turns a direction of the athlete's space into: out of the lens towards the coach, left, up. */
  readonly facing: Turning;
}

export const SOURCES = [720, 1080, 2160] as const;
export type SourceLines = (typeof SOURCES)[number];

/** A phone at 2.2–4.6 m and about hip height, a little off square in every way. */
export const pinholeOf = (chance: Chance, lines: SourceLines): Pinhole => {
  const distance = chance.between(2200, 4600);
  const long = (lines * 16) / 9;
  const portrait = chance.pick([true, false]);
  // finer than 2.45 mm per pixel in a clip of 1,080 lines: the whole body fills the picture
  const mmPerPx = chance.between(1.7, 2.45) * (1080 / lines);
  const aside = chance.normal(0, 80);
  const aim = chance.normal(0, 2);
  return {
    width: portrait ? lines : long,
    height: portrait ? long : lines,
    focalPx: distance / mmPerPx,
    lens: [distance, aside, chance.normal(900, 90)],
    facing: after(rolled(chance.normal(0, 0.6)), after(pitched(chance.normal(0, 1.5)), yawed(aim))),
  };
};

/** u right and v down, px; image right is the athlete's left. */
export const seen = (camera: Pinhole, point: Vector): readonly [u: number, v: number] => {
  const [ahead, left, up] = apply(camera.facing, minus(point, camera.lens));
  const perDepth = camera.focalPx / -ahead;
  return [camera.width / 2 + left * perDepth, camera.height / 2 - up * perDepth];
};
