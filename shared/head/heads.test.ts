import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Box } from '#shared/geometry/boxes.ts';
import { headGrowth, type HeadTrack } from './head-track.ts';
import { headsOf, lostStretches, uncovered } from './heads.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20261201 });

const box = (left: number): Box => ({ left, top: 100, width: 50, height: 60 });
const track = (change: Partial<HeadTrack> = {}): HeadTrack => ({
  width: 400,
  height: 600,
  fromFrame: 10,
  toFrame: 20,
  drawn: [{ frame: 12, box: box(100) }],
  followed: [],
  growth: 0.05,
  ...change,
});
const on = (of: HeadTrack, frame: number) => headsOf(of).find((head) => head.frame === frame);
const contains = (outer: Box, inner: Box): boolean =>
  outer.left <= inner.left &&
  outer.top <= inner.top &&
  outer.left + outer.width >= inner.left + inner.width &&
  outer.top + outer.height >= inner.top + inner.height;

describe('the box that hides a head', () => {
  it('is what was drawn, and what was surely followed', () => {
    const followed = [
      { frame: 13, box: box(104), confidence: 0.9 },
      { frame: 12, box: box(0), confidence: 1 },
    ];
    expect(on(track({ followed }), 12)).toEqual({ frame: 12, box: box(100), state: 'drawn' });
    expect(on(track({ followed }), 13)).toEqual({ frame: 13, box: box(104), state: 'followed' });
  });

  it('grows from its last place with every frame on which the head is lost, both ways', () => {
    // 5 % of the larger edge, 60 px, a frame
    expect(on(track(), 11)?.box).toEqual({ left: 97, top: 97, width: 56, height: 66 });
    expect(on(track(), 14)).toEqual({
      frame: 14,
      box: { left: 94, top: 94, width: 62, height: 72 },
      state: 'lost',
    });
  });

  it('takes a followed box that is not sure for lost', () => {
    const followed = [{ frame: 13, box: box(300), confidence: 0.49 }];
    expect(on(track({ followed }), 13)).toMatchObject({ state: 'lost', box: { left: 97 } });
  });

  it('covers both ends of a gap, grown by the distance to the nearer', () => {
    const drawn = [
      { frame: 10, box: box(100) },
      { frame: 14, box: box(200) },
    ];
    expect(on(track({ drawn }), 11)?.box).toEqual({ left: 97, top: 97, width: 156, height: 66 });
    expect(on(track({ drawn }), 12)?.box).toEqual({ left: 94, top: 94, width: 162, height: 72 });
    expect(on(track({ drawn }), 13)?.box).toEqual({ left: 97, top: 97, width: 156, height: 66 });
  });

  it('is the whole picture once it has grown so far, or where it left the picture', () => {
    const whole = { left: 0, top: 0, width: 400, height: 600 };
    expect(on(track({ growth: 2 }), 20)?.box).toEqual(whole);
    const away = [{ frame: 12, box: { ...box(0), left: 500 } }];
    expect(on(track({ drawn: away }), 12)?.box).toEqual(whole);
  });

  it('knows only the frames that were looked through, also from a box drawn outside of them', () => {
    const late = track({ drawn: [{ frame: 9, box: box(100) }] });
    expect(headsOf(late).map(({ frame }) => frame)).toEqual([
      10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20,
    ]);
    expect(on(late, 10)).toMatchObject({ state: 'lost', box: { left: 97 } });
    expect(on(track(), 21)).toBeUndefined();
  });

  it('never shrinks while the head is lost, and never leaves a frame of the span bare', () => {
    const known = fc.uniqueArray(
      fc.record({
        frame: fc.integer({ min: 0, max: 40 }),
        box: fc.integer({ min: 0, max: 350 }).map(box),
        confidence: fc.constantFrom(0, 0.4, 0.5, 1),
      }),
      { selector: ({ frame }) => frame, maxLength: 12 },
    );
    fc.assert(
      fc.property(known, (followed) => {
        const of = track({ fromFrame: 0, toFrame: 40, followed });
        const heads = headsOf(of);
        expect(uncovered(of, { from: 0, to: 40 })).toEqual([]);
        const sure = heads.filter(({ state }) => state !== 'lost').map(({ frame }) => frame);
        for (const head of heads) {
          if (head.state !== 'lost') continue;
          const before = sure.filter((frame) => frame < head.frame).at(-1);
          const after = sure.find((frame) => frame > head.frame);
          // both known neighbours are covered
          for (const frame of [before, after])
            if (frame !== undefined)
              expect(contains(head.box, heads[frame]?.box ?? box(NaN))).toBe(true);
        }
      }),
    );
  });
});

describe('what is missing', () => {
  it('is told in stretches', () => {
    const followed = [
      { frame: 13, box: box(104), confidence: 1 },
      { frame: 17, box: box(104), confidence: 1 },
    ];
    expect(lostStretches(headsOf(track({ followed })))).toEqual([
      { from: 10, to: 11 },
      { from: 14, to: 16 },
      { from: 18, to: 20 },
    ]);
    expect(lostStretches([])).toEqual([]);
  });

  it('is every frame without a box: outside of what was looked through, or all without any', () => {
    expect(uncovered(track(), { from: 10, to: 20 })).toEqual([]);
    expect(uncovered(track(), { from: 8, to: 22 })).toEqual([
      { from: 8, to: 9 },
      { from: 21, to: 22 },
    ]);
    expect(uncovered(track({ drawn: [] }), { from: 12, to: 13 })).toEqual([{ from: 12, to: 13 }]);
    expect(uncovered(null, { from: 0, to: 5 })).toEqual([{ from: 0, to: 5 }]);
  });
});

describe('how fast a lost head is covered', () => {
  it('is 1.5 heads a second, at least a twentieth a frame, and 10 frames a second where unknown', () => {
    expect(headGrowth(60)).toBe(0.05);
    expect(headGrowth(30)).toBe(0.05);
    expect(headGrowth(15)).toBe(0.1);
    expect(headGrowth(null)).toBe(0.15);
  });
});
