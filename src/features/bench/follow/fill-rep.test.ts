import { describe, expect, it } from 'vitest';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { type FoundRep } from '#shared/course/find-reps.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { applyMarking, NO_MARKS, type PointValue } from '#shared/landmarks/commands.ts';
import { place } from '#shared/landmarks/commands-make.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { landmarkAt, spotOf, type SpotId } from '#shared/landmarks/spots.ts';
import type { LandmarkId, Side } from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { type ClipName, loadTruth } from '#tests/fixtures/clips/truth.ts';
import { benchDocument } from '#tests/support/bench-document.ts';
import type { Followed } from '#src/tracking/types.ts';
import { draftRep, type Touches } from '../model/draft.ts';
import { fillRep, refill } from './fill-rep.ts';
import { type Places, type Tracks, withTracks } from './following.ts';
import { keyframesOf, keyframesOfTouches, spanAround } from './keyframes.ts';
import { repsFromTracks } from './reps-from-tracks.ts';
import { lenders, marksOfTaken, withTouchedFrames } from './take-reps.ts';

const LONG_EDGE = 1920;

/** What a faultless tracker says of a demo clip: every landmark of both sides, lost where it is covered. */
const trueTracks = (
  name: ClipName,
): { tracks: Tracks; times: ReturnType<typeof milliseconds>[] } => {
  const truth = loadTruth(name);
  const tracks = new Map<SpotId, (Followed | null)[]>();
  for (const { index, rep, marks, hidden } of truth.frames)
    for (const [id, [u, v]] of Object.entries(marks)) {
      const supportSide = truth.reps[rep]?.supportSide ?? 'left';
      const spot = spotOf(id as LandmarkId, { supportSide, view: truth.view });
      const places = tracks.get(spot) ?? new Array<Followed | null>(truth.frames.length).fill(null);
      const lost = hidden.includes(id);
      places[index] = {
        frame: frameIndex(index),
        point: lost ? null : framePoint(u, v),
        confidence: lost ? 0 : 0.9,
        state: lost ? 'lost' : 'sure',
      };
      tracks.set(spot, places);
    }
  return { tracks, times: truth.frames.map(({ tMs }) => milliseconds(tMs)) };
};

const documentOf = (name: ClipName): BenchDocument => {
  const truth = loadTruth(name);
  const { setUp } = truth;
  return benchDocument({
    width: truth.picture.width,
    height: truth.picture.height,
    mmPerPx: setUp.mmPerPx,
    geometry: {
      scale: { from: 'typed', mmPerPx: setUp.mmPerPx },
      distanceMm: setUp.distanceMm,
      lensHeightMm: setUp.lensHeightMm,
      beltPointerMm: setUp.beltPointerMm,
      thighPointerMm: setUp.thighPointerMm,
      plumb: null,
      floorLine: null,
      shutter: null,
    },
  });
};

const touchesOn = (name: ClipName, frame: number, side: Side): Touches => {
  const truth = loadTruth(name);
  const marks = truth.frames[frame]?.marks ?? {};
  const value = (u: number, v: number): PointValue => ({
    to: 'point',
    point: framePoint(u, v),
    source: 'hand',
    looked: true,
    confidence: null,
    pictureLongEdge: LONG_EDGE,
  });
  return new Map([
    [
      frameIndex(frame),
      new Map(
        landmarksOf('belt+thigh').map((id) => {
          const [u, v] = marks[id] ?? [0, 0];
          return [spotOf(id, { supportSide: side, view: 'front' }), value(u, v)] as const;
        }),
      ),
    ],
  ]);
};

const foundOf = (name: ClipName): readonly FoundRep[] => {
  const { tracks, times } = trueTracks(name);
  const found = repsFromTracks(documentOf(name), tracks, times);
  if ('code' in found) throw new Error(found.code);
  return found;
};

describe('reps taken from what was followed', () => {
  const { tracks, times } = trueTracks('right-early');
  const document = documentOf('right-early');
  const touches = touchesOn('right-early', 20, 'right');
  const found = withTouchedFrames(foundOf('right-early'), touches, times);
  const reps = found.map((each, n) => ({
    ...draftRep(document, each.supportSide, touches, times).rep,
    id: `rep-${n}`,
    startFrame: each.startFrame,
    endFrame: each.endFrame,
  }));
  const set = 'belt+thigh';
  const parts = marksOfTaken(reps, {
    document,
    touches,
    tracks,
    times,
    set,
    pictureLongEdge: LONG_EDGE,
  });

  it('are all three, with marks on some forty frames each', () => {
    expect(parts).toHaveLength(3);
    for (const { commands } of parts) {
      const frames = new Set(commands.map(({ frame }) => frame));
      expect(frames.size).toBeGreaterThan(30);
      expect(frames.size).toBeLessThan(50);
    }
  });

  it('keep what was touched as marks by hand, and the rest hollow with its confidence', () => {
    const [first] = parts;
    const touched = first?.commands.filter(({ frame }) => frame === 20) ?? [];
    expect(touched).toHaveLength(landmarksOf(set).length + 8);
    for (const { after, landmark } of touched)
      if (landmarksOf(set).includes(landmark))
        expect(after).toMatchObject({ source: 'hand', looked: true });
    const rest = first?.commands.filter(({ frame }) => frame !== 20) ?? [];
    for (const { after } of rest)
      expect(after).toMatchObject({ source: 'tracked', looked: false, confidence: 0.9 });
  });

  it('have no mark where the landmark was lost', () => {
    const truth = loadTruth('right-early');
    for (const { commands } of parts)
      for (const { frame, landmark } of commands)
        expect(truth.frames[frame]?.hidden).not.toContain(landmark);
  });

  it('are filled a second time without moving what a person has placed or looked at', () => {
    const [rep] = reps;
    if (!rep || !parts[0]) throw new Error('no rep');
    const marks = applyMarking(NO_MARKS, parts[0].commands);
    const frame = [...marks.keys()][8] ?? frameIndex(0);
    const nudged = applyMarking(
      marks,
      place(marks, {
        frame,
        landmark: 'kneecap',
        point: framePoint(1, 2),
        pictureLongEdge: LONG_EDGE,
      }),
    );
    const shifted: Tracks = new Map(
      [...tracks].map(([spot, places]): [SpotId, Places] => [
        spot,
        places.map((p) => p && { ...p, point: p.point && framePoint(p.point.u + 3, p.point.v) }),
      ]),
    );
    const again = fillRep({
      rep,
      marks: nudged,
      tracks: shifted,
      document,
      times,
      set,
      pictureLongEdge: LONG_EDGE,
    });
    expect(again.length).toBeGreaterThan(0);
    expect(again.some((each) => each.frame === frame && each.landmark === 'kneecap')).toBe(false);
    expect(
      again.every(({ before }) => before === null || (before.to === 'point' && !before.looked)),
    ).toBe(true);
  });

  it('follow one landmark anew between two places that a person has seen', () => {
    const [rep] = reps;
    if (!rep || !parts[0]) throw new Error('no rep');
    const marks = applyMarking(NO_MARKS, parts[0].commands);
    const filling = { rep, marks, tracks: new Map(), pictureLongEdge: LONG_EDGE };
    const commands = refill(filling, 'belt-tip', [100, 200]);
    expect(commands.length).toBeGreaterThan(0);
    // lost now: what was followed there before is taken away
    for (const { frame, landmark, after } of commands) {
      expect([landmark, after]).toEqual(['belt-tip', null]);
      expect(frame).toBeGreaterThanOrEqual(100);
      expect(frame).toBeLessThanOrEqual(200);
    }
  });
});

describe('a take of both sides', () => {
  const { tracks, times } = trueTracks('both-sides');
  const document = documentOf('both-sides');
  const found = foundOf('both-sides');

  it('gives each rep the landmarks of its own support side', () => {
    const truth = loadTruth('both-sides');
    const none: Touches = new Map();
    const reps = found.map((each, n) => ({
      ...draftRep(document, each.supportSide, none, times).rep,
      id: `rep-${n}`,
      startFrame: each.startFrame,
      endFrame: each.endFrame,
    }));
    const parts = marksOfTaken(reps, {
      document,
      touches: none,
      tracks,
      times,
      set: 'belt+thigh',
      pictureLongEdge: LONG_EDGE,
    });
    expect(found.map(({ supportSide }) => supportSide)).toEqual(
      truth.reps.map(({ supportSide }) => supportSide),
    );
    for (const [n, { commands }] of parts.entries())
      for (const { frame, landmark, after } of commands) {
        // the last steps of a rep belong to the next one's quiet stance in the truth, with other names
        if (truth.frames[frame]?.rep !== n) continue;
        const [u, v] = truth.frames[frame].marks[landmark] ?? [NaN, NaN];
        if (after?.to === 'point') expect([after.point.u, after.point.v]).toEqual([u, v]);
      }
    expect(parts.every(({ commands }) => commands.some((c) => c.landmark === 'thigh-tip'))).toBe(
      true,
    );
  });

  it('of which some reps never stood still: the nearest of the same side lends its quiet stance', () => {
    const reps = found.map((each, n) => ({
      ...draftRep(document, each.supportSide, new Map(), times).rep,
      id: `rep-${n}`,
      startFrame: each.startFrame,
    }));
    const marching = found.map((each, n) => (n < 2 ? each : { ...each, quiet: null }));
    expect(lenders(marching, reps).map(({ borrower, lender }) => [borrower.id, lender.id])).toEqual(
      [
        ['rep-2', 'rep-0'],
        ['rep-3', 'rep-1'],
        ['rep-4', 'rep-0'],
        ['rep-5', 'rep-1'],
      ],
    );
  });
});

describe('reps that are named already', () => {
  it('are not found again', () => {
    const { tracks, times } = trueTracks('right-early');
    const document = documentOf('right-early');
    const rep = {
      ...draftRep(document, 'right', new Map(), times).rep,
      id: 'named',
      endFrame: 310,
    };
    const found = repsFromTracks({ ...document, reps: [{ rep, marks: [] }] }, tracks, times);
    expect(found).toHaveLength(2);
  });
});

describe('frames that a person has seen', () => {
  const touches = touchesOn('right-early', 20, 'right');

  it('are where following starts from', () => {
    const draft = draftRep(documentOf('right-early'), 'right', touches, [milliseconds(0)]);
    const byRep = keyframesOf([draft]);
    expect([...byRep.keys()].sort()).toEqual([...keyframesOfTouches(touches).keys()].sort());
    expect(byRep.get(spotOf('belt-tip', draft.rep))).toHaveLength(1);
    expect(landmarkAt('belt-tip' as SpotId, draft.rep)).toBe('belt-tip');
  });

  it('bound the span that is followed anew', () => {
    const at = (n: number) => ({ frame: frameIndex(n), point: framePoint(0, 0) });
    expect(spanAround([at(10), at(50), at(90)], frameIndex(50), 120)).toEqual([11, 89]);
    expect(spanAround([at(50)], frameIndex(50), 120)).toEqual([0, 120]);
  });

  it('leave places outside the span as they were', () => {
    const spot = 'belt-tip' as SpotId;
    const at = (n: number, u: number): Followed => ({
      frame: frameIndex(n),
      point: framePoint(u, 0),
      confidence: 1,
      state: 'sure',
    });
    const old: Tracks = new Map([[spot, [at(0, 1), at(1, 1), at(2, 1)]]]);
    const more: Tracks = new Map([[spot, [null, at(1, 5), null]]]);
    expect(
      withTracks(old, more, 1, 1)
        .get(spot)
        ?.map((place) => place?.point?.u),
    ).toEqual([1, 5, 1]);
  });
});
