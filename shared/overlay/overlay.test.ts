import { describe, expect, it } from 'vitest';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { Mark, Marks } from '#shared/landmarks/types.ts';
import { overlay } from './overlay.ts';

const placed = (u: number, v: number): Mark => ({
  hidden: false,
  point: framePoint(u, v),
  scale: 1,
  source: 'hand',
  looked: true,
});
const tracked = (u: number, v: number): Mark => ({
  hidden: false,
  point: framePoint(u, v),
  scale: 1,
  source: 'tracked',
  looked: false,
});
const NO_HIPS = { support: null, lifted: null };

describe('overlay', () => {
  it('draws nothing for a frame without marks', () => {
    expect(
      overlay({ view: 'front', supportSide: 'left', marks: {}, hips: NO_HIPS, values: null }),
    ).toEqual([]);
  });

  it('gives each side its own shape and joins what is marked', () => {
    const marks: Marks = {
      'asis-support': placed(400, 600),
      'asis-lifted': placed(500, 600),
      'belt-tip': placed(450, 640),
    };
    expect(
      overlay({ view: 'front', supportSide: 'right', marks, hips: NO_HIPS, values: null }),
    ).toEqual([
      {
        kind: 'line',
        from: { u: 400, v: 600 },
        to: { u: 500, v: 600 },
        role: 'midline',
        state: 'placed',
      },
      {
        kind: 'line',
        from: { u: 450, v: 600 },
        to: { u: 450, v: 640 },
        role: 'midline',
        state: 'placed',
      },
      {
        kind: 'ring',
        at: { u: 400, v: 600 },
        radius: null,
        role: 'support',
        state: 'placed',
        landmark: 'asis-support',
      },
      {
        kind: 'diamond',
        at: { u: 500, v: 600 },
        role: 'lifted',
        state: 'placed',
        landmark: 'asis-lifted',
      },
      {
        kind: 'bracket',
        at: { u: 450, v: 640 },
        role: 'midline',
        state: 'placed',
        landmark: 'belt-tip',
      },
    ]);
  });

  it('draws a tracked mark, and every line that rests on it, as tracked', () => {
    const marks: Marks = { 'strap-inner': placed(10, 10), 'strap-outer': tracked(30, 10) };
    expect(
      overlay({ view: 'front', supportSide: 'left', marks, hips: NO_HIPS, values: null }),
    ).toEqual([
      {
        kind: 'line',
        from: { u: 10, v: 10 },
        to: { u: 30, v: 10 },
        role: 'support',
        state: 'tracked',
      },
      {
        kind: 'ring',
        at: { u: 10, v: 10 },
        radius: null,
        role: 'support',
        state: 'placed',
        landmark: 'strap-inner',
      },
      {
        kind: 'ring',
        at: { u: 30, v: 10 },
        radius: null,
        role: 'support',
        state: 'tracked',
        landmark: 'strap-outer',
      },
    ]);
  });

  it('draws a mark in conflict as such, with the line that ends there', () => {
    const marks: Marks = { 'strap-inner': placed(10, 10), 'strap-outer': tracked(30, 10) };
    const drawn = overlay({
      view: 'front',
      supportSide: 'left',
      marks,
      hips: NO_HIPS,
      values: null,
      conflicts: new Set(['strap-inner']),
    });
    expect(drawn.map((each) => each.state)).toEqual(['conflict', 'conflict', 'tracked']);
  });

  it('draws the lifted thigh from a known hip centre only where both ASIS are there', () => {
    const hips = { support: framePoint(410, 680), lifted: framePoint(490, 680) };
    const knee = { 'lifted-knee': placed(520, 700) };
    const withOne = overlay({
      view: 'front',
      supportSide: 'right',
      marks: { ...knee, 'asis-support': placed(400, 600) },
      hips,
      values: null,
    });
    expect(withOne.filter((each) => each.kind === 'line')).toEqual([]);
    const withBoth = overlay({
      view: 'front',
      supportSide: 'right',
      marks: { ...knee, 'asis-support': placed(400, 600), 'asis-lifted': placed(500, 600) },
      hips,
      values: null,
    });
    expect(withBoth.filter((each) => each.kind === 'line' && each.role === 'lifted')).toEqual([
      {
        kind: 'line',
        from: { u: 490, v: 680 },
        to: { u: 520, v: 700 },
        role: 'lifted',
        state: 'placed',
      },
    ]);
  });

  it('leaves a hidden mark out, with what would end there', () => {
    const marks: Marks = { 'asis-support': placed(400, 600), 'asis-lifted': { hidden: true } };
    expect(
      overlay({ view: 'front', supportSide: 'right', marks, hips: NO_HIPS, values: null }),
    ).toEqual([
      {
        kind: 'ring',
        at: { u: 400, v: 600 },
        radius: null,
        role: 'support',
        state: 'placed',
        landmark: 'asis-support',
      },
    ]);
  });

  it('writes lift and turn on their own outer sides', () => {
    const marks: Marks = { 'asis-support': placed(400, 600), 'lifted-knee': placed(520, 700) };
    const values = {
      lift: degrees(74.24),
      liftHalfWidth: degrees(2),
      turn: degrees(-6.71),
      turnHalfWidth: degrees(5.1),
      provisional: true,
    };
    const labels = overlay({
      view: 'front',
      supportSide: 'right',
      marks,
      hips: NO_HIPS,
      values,
    }).filter((each) => each.kind === 'label');
    expect(labels).toEqual([
      {
        kind: 'label',
        at: { u: 520, v: 700 },
        text: 'lift 74° ± 2',
        towards: 'right',
        role: 'lifted',
        state: 'tracked',
      },
      {
        kind: 'label',
        at: { u: 400, v: 600 },
        text: 'turn −6.7° ± 5, provisional',
        towards: 'left',
        role: 'support',
        state: 'tracked',
      },
    ]);
  });

  it('never gives a number to a lift under 20° from the front', () => {
    const labels = overlay({
      view: 'front',
      supportSide: 'left',
      marks: { 'lifted-knee': placed(520, 700) },
      hips: NO_HIPS,
      values: {
        lift: degrees(11),
        liftHalfWidth: degrees(2),
        turn: null,
        turnHalfWidth: null,
        provisional: false,
      },
    }).filter((each) => each.kind === 'label');
    expect(labels.map((each) => each.text)).toEqual(['lift < 20°']);
    expect(labels[0]?.towards).toBe('left');
  });

  it('shows the lift of a side clip as an arc from the plumb to the thigh', () => {
    const drawn = overlay({
      view: 'lifted-side',
      supportSide: 'right',
      marks: { trochanter: placed(100, 100), 'knee-lateral': placed(200, 100) },
      hips: NO_HIPS,
      values: {
        lift: degrees(90),
        liftHalfWidth: degrees(2),
        turn: null,
        turnHalfWidth: null,
        provisional: false,
      },
    });
    expect(drawn.find((each) => each.kind === 'arc')).toEqual({
      kind: 'arc',
      centre: { u: 100, v: 100 },
      radius: 45,
      from: 180,
      to: 90,
      role: 'lifted',
      state: 'placed',
    });
    expect(drawn.filter((each) => each.kind === 'diamond').map((each) => each.landmark)).toEqual([
      'trochanter',
      'knee-lateral',
    ]);
  });

  it('puts the landmark asked for where it is expected', () => {
    const drawn = overlay({
      view: 'front',
      supportSide: 'left',
      marks: {},
      hips: NO_HIPS,
      values: null,
      next: { landmark: 'lifted-knee', at: framePoint(5, 6) },
    });
    expect(drawn).toEqual([
      {
        kind: 'diamond',
        at: { u: 5, v: 6 },
        role: 'lifted',
        state: 'next',
        landmark: 'lifted-knee',
      },
    ]);
  });
});
