import { describe, expect, it } from 'vitest';
import { BODIES, STRAP_ABOVE_KNEE, STRAP_SKIN } from '../model/bodies.ts';
import { poseSkeleton } from '../model/skeleton.ts';
import { length, sub } from '../model/vec.ts';
import { alongLeg, legShapes } from './leg.ts';

const bones = (lift: number) =>
  poseSkeleton(BODIES.man, {
    rep: 0,
    support: 'left',
    lift,
    shift: 1,
    pelvisYaw: 0,
    femurYaw: 5,
    trunkYaw: 0,
    obliquity: 4,
    pelvisTilt: 3,
    trunkLean: 2,
    footTurnOut: 8,
    swayMm: [0, 0],
  });

describe.each(Object.entries(BODIES))('the drawn leg of the %s', (_name, body) => {
  const { places, halfWidth, front } = legShapes(body).skin;
  const nearest = (place: number): number =>
    places.reduce(
      (best, p, i) => (Math.abs(p - place) < Math.abs((places[best] ?? 9) - place) ? i : best),
      0,
    );

  it('is as wide at the knee as the marks of its edges are apart', () => {
    expect(Math.abs((halfWidth[nearest(1)] ?? 0) - body.kneeWidth / 2)).toBeLessThan(2);
  });

  it('has its front skin where the pointer’s length begins', () => {
    const strap = nearest(1 - STRAP_ABOVE_KNEE / body.thigh);
    expect(Math.abs((front[strap] ?? 0) - STRAP_SKIN)).toBeLessThan(2);
  });
});

describe('the centre line', () => {
  it('passes through hip and ankle, and near the knee of a bent leg', () => {
    const { lifted, body } = bones(95);
    expect(length(sub(alongLeg(lifted, body, 0).centre, lifted.hip))).toBeLessThan(1e-6);
    expect(length(sub(alongLeg(lifted, body, 2).centre, lifted.ankle))).toBeLessThan(1e-6);
    expect(length(sub(alongLeg(lifted, body, 1).centre, lifted.knee))).toBeLessThan(30);
  });

  it('does not jump anywhere', () => {
    const { lifted, body } = bones(105);
    for (let place = 0; place < 2; place += 0.01) {
      const step = sub(
        alongLeg(lifted, body, place + 0.01).centre,
        alongLeg(lifted, body, place).centre,
      );
      expect(length(step)).toBeLessThan(0.012 * body.thigh);
    }
  });
});
