import { describe, expect, it } from 'vitest';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { cameraOf } from '#tests/fixtures/clips/marked.ts';
import { loadTruth } from '#tests/fixtures/clips/truth.ts';
import { courseOfRep, isCourse } from './course-of-rep.ts';
import type { CourseFrame, RepInput } from './types.ts';
import { worthKeeping } from './worth-keeping.ts';

/** Every frame of a rep marked at the true pixels, as a tracker fills it. */
const denseRep = (name: 'right-early' | 'short-lift', index: number): RepInput => {
  const truth = loadTruth(name);
  const rep = truth.reps[index];
  if (!rep) throw new RangeError(`no rep ${index}`);
  return {
    id: name,
    supportSide: rep.supportSide,
    camera: cameraOf(truth),
    athlete: { bodyHeightMm: null },
    frames: truth.frames.slice(rep.firstFrame, rep.lastFrame + 1).map((frame) => ({
      frame: frameIndex(frame.index),
      time: milliseconds(frame.tMs),
      marks: Object.fromEntries(
        LANDMARK_IDS.flatMap((id) => {
          const [u, v] = frame.marks[id] ?? [];
          return u === undefined || v === undefined
            ? []
            : [
                [
                  id,
                  {
                    hidden: false,
                    point: framePoint(u, v),
                    scale: 1,
                    source: 'tracked',
                    looked: false,
                  },
                ],
              ];
        }),
      ),
    })),
    sharedQuiet: null,
    moved: {},
    labels: null,
    excluded: null,
  };
};

const courseOf = (rep: RepInput): readonly CourseFrame[] => {
  const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course.frames;
};

describe.each([
  ['right-early', 0],
  ['right-early', 2],
] as const)('of a rep that is marked throughout (%s, rep %i)', (name, index) => {
  const frames = courseOf(denseRep(name, index));
  const kept = new Set(worthKeeping(frames));
  const of = (wanted: (frame: CourseFrame) => boolean) =>
    frames.filter((each) => kept.has(each.frame) && wanted(each));

  it('a few dozen frames are kept', () => {
    expect(kept.size).toBeGreaterThan(30);
    expect(kept.size).toBeLessThan(46);
  });

  it('all that the reading asks for are among them', () => {
    expect(of(({ phase }) => phase === 'quiet').length).toBeGreaterThanOrEqual(5);
    const rising = (from: number, to: number) =>
      of(({ phase, lift }) => phase === 'rise' && lift !== null && lift >= from && lift < to);
    expect(rising(54, 66).length).toBeGreaterThanOrEqual(4);
    expect(rising(84, 96).length).toBeGreaterThanOrEqual(4);
    expect(rising(20, 52).length).toBeGreaterThanOrEqual(4);
    const highest = Math.max(...frames.map(({ lift }) => lift ?? 0));
    expect(rising(highest - 4, 200).length).toBeGreaterThanOrEqual(3);
  });

  it('foot off and foot down lie between neighbours', () => {
    const offs = frames.findIndex(({ phase }) => phase === 'rise');
    expect(kept.has(frameIndex((frames[offs]?.frame ?? 0) - 1))).toBe(true);
    expect(kept.has(frames[offs]?.frame ?? frameIndex(0))).toBe(true);
  });
});

describe('frames that are kept', () => {
  const frames = courseOf(denseRep('right-early', 1));

  it('are those the tracker was sure of, where there are enough', () => {
    const doubtful = new Set(
      frames.flatMap(({ frame, phase }, i) => (phase === 'rise' && i % 3 === 0 ? [frame] : [])),
    );
    const firstUp = frames.find(({ phase }) => phase === 'rise')?.frame ?? 0;
    const kept = worthKeeping(frames, doubtful).filter((frame) => frame > firstUp + 1);
    expect(kept.filter((frame) => doubtful.has(frame)).length).toBeLessThanOrEqual(2);
  });

  it('lie evenly where no lift is known', () => {
    const blind = frames.map((frame) => ({ ...frame, lift: null, phase: 'between' as const }));
    const kept = worthKeeping(blind);
    expect(kept).toHaveLength(36);
    expect(kept[0]).toBe(frames[0]?.frame);
    expect(kept.at(-1)).toBe(frames.at(-1)?.frame);
  });

  it('are all of a few', () => {
    const few = frames.slice(0, 5).map((frame) => ({ ...frame, phase: 'between' as const }));
    expect(worthKeeping(few)).toEqual(few.map(({ frame }) => frame));
  });

  it('of a lift that stops short there are none near 90°', () => {
    const short = courseOf(denseRep('short-lift', 0));
    const kept = new Set(worthKeeping(short));
    expect(kept.size).toBeGreaterThan(20);
    expect(short.filter(({ frame, lift }) => kept.has(frame) && (lift ?? 0) > 84)).toEqual([]);
  });
});
