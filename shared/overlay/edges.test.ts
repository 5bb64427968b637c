import { expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { Mark, Marks } from '#shared/landmarks/types.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { liftDial } from './dials.ts';
import { plainDegrees, signedDegrees } from './figures.ts';
import { overlay } from './overlay.ts';

it('a figure that rounds to nought carries no sign', () => {
  expect(plainDegrees(degrees(-0.04))).toBe('0.0°');
  expect(plainDegrees(degrees(-0.06))).toBe('−0.1°');
  expect(plainDegrees(degrees(74.2))).toBe('74.2°');
  expect(signedDegrees(degrees(-0.04))).not.toMatch(/[−+]/);
});

it('a dial that rests on marks nobody has looked at is drawn as such', () => {
  const states = (provisional: boolean): string =>
    JSON.stringify(liftDial(degrees(50), provisional, STANDARD_GATES));
  expect(states(true)).toContain('tracked');
  expect(states(false)).not.toEqual(states(true));
});

it('a side clip joins the leg in the shape of the side the camera sees', () => {
  const at = (u: number, v: number): Mark => ({
    hidden: false,
    point: framePoint(u, v),
    scale: 1,
    source: 'hand',
    looked: true,
  });
  const marks: Marks = { trochanter: at(10, 10), 'knee-lateral': at(10, 90) };
  const hips = { support: null, lifted: null };
  for (const view of ['lifted-side', 'support-side'] as const) {
    const lines = overlay({ view, supportSide: 'left', marks, hips, values: null }).filter(
      (shape) => shape.kind === 'line' && shape.role !== 'note',
    );
    expect(lines).toHaveLength(1);
    expect(lines[0]).toMatchObject({ role: view === 'lifted-side' ? 'lifted' : 'support' });
  }
});
