import { describe, expect, it } from 'vitest';
import { type CameraPlan, intoRoom, makeCamera } from './camera.ts';

const LEVEL: CameraPlan = {
  focalPx: 1500,
  distance: 3000,
  lensHeight: 950,
  pan: 0,
  tilt: 0,
  roll: 0,
  facing: 0,
};

describe('a level camera three metres away', () => {
  const camera = makeCamera(LEVEL);

  it('looks at lens height through the middle of the picture', () => {
    expect(camera.project([0, 0, 950])).toEqual([540, 960]);
  });

  it('shows one metre beside the person as focal length over distance', () => {
    const [, top] = camera.project([0, 600, 1000]);
    const [, bottom] = camera.project([0, 600, 0]);
    expect(bottom - top).toBeCloseTo(500, 9);
  });

  it("shows the athlete's left on the right of the picture", () => {
    expect(camera.project([0, 100, 950])[0]).toBeCloseTo(590, 9);
  });

  it('shows what is nearer larger', () => {
    expect(camera.project([1000, 100, 950])[0] - 540).toBeCloseTo(75, 9);
  });
});

describe('a camera held less well', () => {
  it('moves the scene left when panned right, and down when tilted up', () => {
    expect(makeCamera({ ...LEVEL, pan: 1 }).project([0, 0, 950])[0]).toBeLessThan(540);
    expect(makeCamera({ ...LEVEL, tilt: 1 }).project([0, 0, 950])[1]).toBeGreaterThan(960);
  });

  it('turns the scene against its own roll', () => {
    const [u] = makeCamera({ ...LEVEL, roll: 2 }).project([0, 0, 1950]);
    expect(u).toBeLessThan(540);
  });
});

describe('a person filmed from the left side', () => {
  it('turns the left towards the lens and the front to the left of the picture', () => {
    const place = intoRoom(-90);
    const [x, y] = place([0, 100, 0]);
    expect(x).toBeCloseTo(100, 9);
    expect(y).toBeCloseTo(0, 9);
    const camera = makeCamera({ ...LEVEL, facing: -90 });
    expect(camera.project(place([100, 0, 950]))[0]).toBeLessThan(540);
  });
});
