import { expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { swapRoles } from './swap-roles.ts';
import { type Mark, otherSide } from './types.ts';

it('the other side of left is right, and back', () => {
  expect(otherSide('left')).toBe('right');
  expect(otherSide('right')).toBe('left');
});

it('one mark changes its side, and what is not marked stays so', () => {
  const mark: Mark = {
    hidden: false,
    point: framePoint(1, 2),
    scale: 1,
    source: 'hand',
    looked: true,
  };
  expect(swapRoles({ 'ankle-support': mark })).toEqual({ 'ankle-lifted': mark });
  expect(swapRoles({})).toEqual({});
});
