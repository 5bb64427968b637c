import { describe, expect, it } from 'vitest';
import { frameTimes } from '#src/video/frame-times.ts';
import { aPublicReplay } from '#tests/support/public-replay.ts';
import { calmTurn } from '#shared/replay/calm-turn.ts';
import { cropFor } from './crop.ts';
import { drawnOn, quietWidth } from '#shared/replay/drawn-on.ts';
import { frameBetween } from '#shared/replay/frame-between.ts';
import { momentsOf } from './moments.ts';

const replay = aPublicReplay();
const times = frameTimes(replay.frames);
const knee = (frame: number) =>
  frameBetween(replay.overlay, times, frame)?.marks.find(
    ({ landmark }) => landmark === 'lifted-knee',
  )?.v;

describe('what is drawn between marked frames', () => {
  it('is the frame’s own marks where it has some', () => {
    expect(frameBetween(replay.overlay, times, 50)).toBe(replay.overlay[2]);
  });

  it('lies on a straight line between the frames around it', () => {
    // 1050 at frame 40, 930 at frame 50
    expect(knee(45)).toBeCloseTo(990, 6);
    expect(frameBetween(replay.overlay, times, 45)).toMatchObject({ lift: 75, turn: 5.5 });
  });

  it('is nothing over a long gap of a body that moves, and before and after all marks', () => {
    // 600 ms from frame 10 to 40
    expect(frameBetween(replay.overlay, times, 20)).toBeNull();
    expect(frameBetween(replay.overlay, times, 5)).toBeNull();
    expect(frameBetween(replay.overlay, times, 90)).toBeNull();
  });

  it('goes on over a longer gap of a body that stands still', () => {
    // 400 ms from frame 60 to 80, the knee 10 px lower
    expect(knee(70)).toBeCloseTo(895, 6);
  });

  it('keeps an unknown angle unknown', () => {
    const overlay = replay.overlay.map((each) =>
      each.frame === 50 ? { ...each, turn: null } : each,
    );
    expect(frameBetween(overlay, times, 45)?.turn).toBeNull();
    expect(frameBetween(overlay, times, 45)?.liftPlusMinus).toBe(3);
  });
});

describe('the turn under the film', () => {
  it('is smoothed over its neighbours, and unknown stays unknown', () => {
    const overlay = [0, 8, 0, 8, 0, 8].map((turn, n) => ({
      frame: 10 + 5 * n,
      marks: [],
      lift: 60,
      liftPlusMinus: 3,
      turn: n === 5 ? null : turn,
      turnPlusMinus: 5,
    }));
    const calm = calmTurn(overlay, times).map(({ turn }) => turn);
    expect(calm[5]).toBeNull();
    for (const turn of calm.slice(0, 5)) {
      expect(turn).toBeGreaterThan(1);
      expect(turn).toBeLessThan(7);
    }
    expect(calmTurn(overlay, times).map(({ lift }) => lift)).toEqual([60, 60, 60, 60, 60, 60]);
  });
});

describe('the part of the picture that is shown', () => {
  it('holds every mark from the pelvis down, without the shoulders', () => {
    const shoulders = { landmark: 'acromion-support', u: 450, v: 300, looked: true };
    const [first, ...rest] = replay.overlay;
    if (!first) throw new Error('the replay has no marks');
    const crop = cropFor(
      [{ ...first, marks: [...first.marks, shoulders] }, ...rest],
      replay.width,
      replay.height,
    );
    expect(crop.v).toBeGreaterThan(700);
    for (const { marks } of replay.overlay)
      for (const { u, v } of marks) {
        expect(u).toBeGreaterThan(crop.u);
        expect(u).toBeLessThan(crop.u + crop.width);
        expect(v).toBeGreaterThan(crop.v);
        expect(v).toBeLessThan(crop.v + crop.height);
      }
    expect(crop.height / crop.width).toBeLessThanOrEqual(1.2001);
  });

  it('never leaves the frame, and is all of it where nothing is marked', () => {
    const crop = cropFor(replay.overlay, 700, 1620);
    expect(crop.u).toBeGreaterThanOrEqual(0);
    expect(crop.u + crop.width).toBeLessThanOrEqual(700);
    expect(crop.v + crop.height).toBeLessThanOrEqual(1620);
    expect(cropFor([], 1080, 1920)).toEqual({ u: 0, v: 0, width: 1080, height: 1920 });
  });
});

describe('the drawing', () => {
  it('leaves out what a richer set makes needless', () => {
    const drawn = drawnOn(replay, times, 50, null).primitives;
    const landmarks = drawn.flatMap((each) =>
      'landmark' in each && each.landmark !== null ? [each.landmark] : [],
    );
    expect(landmarks).toContain('thigh-tip');
    expect(landmarks).not.toContain('kneecap');
  });

  it('shows what a comment points at, at its own frames only', () => {
    const comment = replay.comments[0] ?? null;
    const rings = (frame: number) =>
      drawnOn(replay, times, frame, comment).primitives.filter(
        ({ kind, role }) => kind === 'ring' && role === 'note',
      ).length;
    expect(rings(42)).toBe(1);
    expect(rings(50)).toBe(0);
  });

  it('takes the hip centres from the quiet stance', () => {
    expect(quietWidth(replay)).toBe(140);
    expect(quietWidth({ ...replay, overlay: [] })).toBeNull();
  });
});

describe('the moments', () => {
  it('are those that the rep has and the span shows', () => {
    expect(momentsOf(replay).map(({ name }) => name)).toEqual(['Quiet', '60°', '90°', 'Top']);
    const cut = { ...replay, fromFrame: 20, moments: { ...replay.moments, from: null } };
    expect(momentsOf(cut).map(({ name }) => name)).toEqual(['90°', 'Top']);
  });
});
