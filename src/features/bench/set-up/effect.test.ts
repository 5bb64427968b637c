import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import {
  distanceEffect,
  floorEffect,
  lensEffect,
  plumbEffect,
  pointersEffect,
  scaleEffect,
  shutterEffect,
} from './effect.ts';

describe('what the set-up makes measurable', () => {
  it('scale from a rod', () => {
    const scale = {
      from: 'rod' as const,
      a: framePoint(100, 100),
      b: framePoint(100, 600),
      lengthMm: 1000,
    };
    expect(scaleEffect(scale)).toEqual({ text: '2.00 mm per pixel', kind: 'done' });
    expect(scaleEffect({ ...scale, lengthMm: 2000 }).kind).toBe('wait');
    expect(scaleEffect({ ...scale, b: scale.a }).kind).toBe('bad');
    expect(scaleEffect(null).kind).toBe('bad');
  });

  it('distance and lens height', () => {
    expect(distanceEffect(null).kind).toBe('bad');
    expect(distanceEffect(1500).kind).toBe('wait');
    expect(distanceEffect(3000)).toEqual({ text: '3.00 m', kind: 'done' });
    expect(lensEffect(null).text).toContain('± 7°');
    expect(lensEffect(950).text).toContain('± 2°');
  });

  it('pointers', () => {
    const text = (belt: number | null, thigh: number | null) =>
      pointersEffect({ beltPointerMm: belt, thighPointerMm: thigh }, STANDARD_GATES).text;
    expect(text(null, 120)).toContain(`${ACHIEVED.bare.toldFromNone.one}°`);
    expect(text(140, null)).toContain(`${ACHIEVED.belt.toldFromNone.one}°`);
    expect(text(140, 120)).toContain(`${ACHIEVED['belt+thigh'].toldFromNone.one}°`);
  });

  it('pointers in a practice with other gates: between which the figures were worked out', () => {
    const of = (belt: number | null, thigh: number | null, from = 55) =>
      pointersEffect(
        { beltPointerMm: belt, thighPointerMm: thigh },
        { from: degrees(from), to: degrees(90) },
      ).text;
    for (const text of [of(null, null), of(140, null), of(140, 120)])
      expect(text).toMatch(/°, worked out for 60° to 90°\.$/);
    expect(of(140, 120, 60)).not.toContain('worked out');
  });

  it('plumb line', () => {
    expect(plumbEffect(null).kind).toBe('done');
    const leaning = { top: framePoint(100, 100), bottom: framePoint(200, 1100) };
    expect(plumbEffect(leaning)).toEqual({
      text: 'The picture leans by 5.7°, more than 3°; every mark is turned back by that.',
      kind: 'wait',
    });
  });

  it('floor line', () => {
    const line = { a: framePoint(100, 900), b: framePoint(400, 880) };
    const found = (by: number) => ({ by: degrees(by), u: degrees(2) });
    expect(floorEffect(null, null).kind).toBe('done');
    expect(floorEffect(line, null).kind).toBe('wait');
    expect(floorEffect(line, found(-8))).toEqual({
      text: 'The camera stood 8° (±\u00a04°) off the front.',
      kind: 'done',
    });
    expect(floorEffect(line, found(24))).toEqual({
      text: 'The camera stood 24° (±\u00a04°) off the front: more than 20° bends the turn. Film again from straight ahead.',
      kind: 'wait',
    });
  });

  it('shutter', () => {
    const smear = (px: number) => ({
      from: 'smear' as const,
      a: framePoint(0, 0),
      b: framePoint(px, 0),
    });
    expect(shutterEffect(null, 60).kind).toBe('done');
    expect(shutterEffect({ from: 'typed', perSecond: 120 }, 60).kind).toBe('done');
    expect(shutterEffect({ from: 'typed', perSecond: 30 }, 60)).toEqual({
      text: 'The shutter is open for 1/30 s: with 60 frames a second it cannot be open longer than 1/60 s. Look again.',
      kind: 'bad',
    });
    expect(shutterEffect({ from: 'typed', perSecond: 30 }, null).kind).toBe('done');
    expect(shutterEffect(smear(2), 60).text).toBe(
      'A dot is drawn out by 2.0 pixels: sharp enough.',
    );
    expect(shutterEffect(smear(8), 60).text).toMatch(/8\.0 pixels; more than 3 /);
  });
});
