import type { Chance } from './chance.ts';

/** What slips over its bone: both outlines, the belt, the knee's surface, the thigh strap. */
export const SLIPPING = ['outline', 'belt', 'knee', 'strap'] as const;
export type Slipping = (typeof SLIPPING)[number];

/**
 * Assumed slip: standard deviation of its change of direction from 60° to 90° of lift, degrees, and
 * the share of its bone's own turn that it misses. With the errors of lengths and distance this
 * makes the systematic part that engine 1 assumes. From our model, no source.
 */
const ASSUMED: Readonly<Record<Slipping, { readonly change: number; readonly share: number }>> = {
  outline: { change: 2.0, share: 0.06 },
  belt: { change: 1.0, share: 0.03 },
  knee: { change: 1.8, share: 0.06 },
  strap: { change: 1.0, share: 0.03 },
};

/** Of the slip's variance this belongs to the person, the rest to each rep. */
const SHARED = 0.7;

/** Change of a slip's direction, degrees, at a lift and a turn of its bone since quiet stance. */
export type Slip = (lift: number, turned: number) => number;

export type Skin = Readonly<Record<Slipping, Slip>>;

interface Curve {
  readonly ramp: number;
  readonly wave: number;
  readonly centre: number;
}

/** Size of the step against the ramp. */
const WAVE = 0.5;

/** Grows along with the lift, and in one step somewhere on the way. */
const at = ({ ramp, wave, centre }: Curve, lift: number): number =>
  (ramp * lift) / 90 + wave / (1 + Math.exp(-(lift - centre) / 8));

const curveOf = ({ normal, between }: Chance): Curve => ({
  ramp: normal(0, 1),
  wave: normal(0, WAVE),
  centre: between(30, 100),
});

/** Standard deviation of a drawn curve's change from 60° to 90°, by numbers. */
const UNIT = ((): number => {
  let squares = 0;
  const steps = 700;
  for (let i = 0; i < steps; i += 1) {
    const centre = 30 + (70 * (i + 0.5)) / steps;
    const wave = at({ ramp: 0, wave: WAVE, centre }, 90) - at({ ramp: 0, wave: WAVE, centre }, 60);
    squares += wave * wave;
  }
  return Math.sqrt(1 / 9 + squares / steps);
})();

/** The slips of one person's reps; `times` the assumed size. */
export const skinsOf = (chance: Chance, reps: number, times: number): readonly Skin[] => {
  const persons = SLIPPING.map((part) => ({
    part,
    curve: curveOf(chance),
    share: chance.normal(times * ASSUMED[part].share, times * ASSUMED[part].share),
  }));
  return Array.from({ length: reps }, () => {
    const slips = persons.map(({ part, curve, share }): readonly [Slipping, Slip] => {
      const own = curveOf(chance);
      const size = (times * ASSUMED[part].change) / UNIT;
      const [a, b] = [size * Math.sqrt(SHARED), size * Math.sqrt(1 - SHARED)];
      return [
        part,
        (lift, turned) =>
          a * (at(curve, lift) - at(curve, 0)) + b * (at(own, lift) - at(own, 0)) - share * turned,
      ];
    });
    return Object.fromEntries(slips) as Record<Slipping, Slip>;
  });
};
