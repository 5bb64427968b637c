import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from '#shared/measures/inputs.ts';
import type { LandmarkId, Mark, PlacedMark } from '#shared/landmarks/types.ts';
import type { RepInput } from '#shared/course/types.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from './derive.ts';
import type { ReadingInput, ReadingResult } from './types.ts';

/** Nothing to 60°, then outward by `slope` degrees for each degree of lift. */
const from60 = (slope: number) => (lift: number) => slope * Math.max(0, lift - 60);

const inputOf = (reps: readonly RepInput[], over: Partial<ReadingInput> = {}): ReadingInput => ({
  engine: 1,
  supportSide: 'left',
  set: null,
  thighTurnsLittle: false,
  markError: ASSUMED_MARK_ERROR,
  ownSystematic: null,
  rules: STANDARD_RULES,
  reps,
  ...over,
});

const withoutMarks = (rep: RepInput, ids: readonly LandmarkId[]): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame) => ({
    ...frame,
    marks: Object.fromEntries(
      Object.entries(frame.marks).filter(([id]) => !ids.some((each) => each === id)),
    ),
  })),
});

const withCamera = (rep: RepInput, over: Partial<CameraInput>): RepInput => ({
  ...rep,
  camera: { ...rep.camera, ...over },
});

const mapMarks = (rep: RepInput, change: (mark: PlacedMark) => Mark): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame) => ({
    ...frame,
    marks: Object.fromEntries(
      Object.entries(frame.marks).map(([id, mark]) => [id, mark.hidden ? mark : change(mark)]),
    ),
  })),
});

const early = madeRep('left', from60(0.4), { id: 'a' });
const codes = (result: ReadingResult, rep = 0) => result.reps[rep]?.why.map(({ code }) => code);

describe('a made body', () => {
  it.each([
    [0.4, 'early-turn-out'],
    [-0.4, 'expected-turn-in'],
    [0, 'holds-still'],
  ] as const)('whose turn changes by %d° a degree from 60° on is read as %s', (slope, code) => {
    const result = deriveReading(inputOf([madeRep('left', from60(slope))]));
    expect(result.code).toBe(code);
    expect(result.set).toBe('belt+thigh');
    expect(Math.abs((result.figures?.d ?? NaN) - 30 * slope)).toBeLessThan(1);
    expect(result.provisional).toBe(false);
    expect(result.settle).toEqual([]);
  });

  it('starts to turn where it was made to', () => {
    const onset = deriveReading(inputOf([early])).onset;
    expect(Math.abs((onset?.mean ?? NaN) - 60)).toBeLessThan(7);
    expect(onset?.low).toBeLessThanOrEqual(60);
    expect(onset?.high).toBeGreaterThanOrEqual(60);
  });

  it('describes the way back past 90° only where a rep reaches 100°', () => {
    const result = deriveReading(inputOf([madeRep('left', from60(0.4))]));
    expect(result.returnPast90?.to).toBeGreaterThan(100);
    expect(result.returnPast90?.change).toBeGreaterThan(5);
  });
});

describe('the drawn course', () => {
  const result = deriveReading(inputOf([early, madeRep('left', from60(0.3), { id: 'b' })]));
  const at = (lift: number) => result.course.find((point) => Number(point.lift) === lift);

  it('is closed at 60° and exactly d ± 1.96 u at 90°', () => {
    const gate = at(60);
    const end = at(90);
    expect((gate?.high ?? NaN) - (gate?.low ?? NaN)).toBeCloseTo(0, 9);
    const { d = NaN, uC = NaN } = result.figures ?? {};
    expect((end?.turn ?? NaN) - (gate?.turn ?? NaN)).toBeCloseTo(d, 9);
    expect((end?.high ?? NaN) - (end?.turn ?? NaN)).toBeCloseTo(1.96 * uC, 9);
    expect((end?.turn ?? NaN) - (end?.low ?? NaN)).toBeCloseTo(1.96 * uC, 9);
  });

  it('is exactly the shrunken d under the assumption too', () => {
    const assumed = deriveReading(inputOf([early], { set: 'belt', thighTurnsLittle: true }));
    const point = (lift: number) => assumed.course.find((each) => Number(each.lift) === lift);
    const { d = NaN, uC = NaN, lambda = NaN } = assumed.figures ?? {};
    expect(lambda).toBeLessThan(1);
    expect((point(90)?.turn ?? NaN) - (point(60)?.turn ?? NaN)).toBeCloseTo(d, 9);
    expect((point(90)?.high ?? NaN) - (point(90)?.turn ?? NaN)).toBeCloseTo(1.96 * uC, 9);
    expect(assumed.warnings.map(({ warning }) => warning.code)).toContain('assumed-thigh');
  });

  it('is the weighted mean of the reps', () => {
    const shares = result.reps.map(({ fit }) => fit?.share ?? NaN);
    expect((shares[0] ?? NaN) + (shares[1] ?? NaN)).toBeCloseTo(1, 12);
    const value = (curve: ReadingResult['course']) =>
      curve.find((point) => Number(point.lift) === 80)?.turn ?? NaN;
    const mean = result.reps.reduce(
      (sum, { curve }, i) => sum + (shares[i] ?? NaN) * value(curve),
      0,
    );
    expect(value(result.course)).toBeCloseTo(mean, 9);
  });
});

describe('the same input', () => {
  it('gives the same result to the last digit, and another seed for another input', () => {
    const a = deriveReading(inputOf([early]));
    const b = deriveReading(JSON.parse(JSON.stringify(inputOf([early]))) as ReadingInput);
    expect(b).toEqual(a);
    expect(a.inputHash).toMatch(/^[0-9a-f]{64}$/);
    expect(deriveReading(inputOf([early, early])).inputHash).not.toBe(a.inputHash);
  });
});

describe('the landmark set', () => {
  it('is the richest that has a usable rep', () => {
    const belt = withoutMarks(early, ['thigh-tip']);
    const bare = withoutMarks(early, ['thigh-tip', 'belt-tip']);
    expect(deriveReading(inputOf([belt])).set).toBe('belt');
    expect(deriveReading(inputOf([bare])).set).toBe('bare');
    expect(deriveReading(inputOf([withCamera(early, { thighPointerMm: null })])).set).toBe('belt');
  });

  it('leaves out reps without it, and says what they could be used with', () => {
    const belt = withoutMarks({ ...early, id: 'b' }, ['thigh-tip']);
    const result = deriveReading(inputOf([early, belt]));
    expect(result.set).toBe('belt+thigh');
    expect(result.reps[1]?.used).toBe(false);
    expect(result.reps[1]?.why[0]).toEqual({ code: 'poorer-set', set: 'belt' });
    expect(codes(result, 1)).toContain('landmarks-missing');
    expect(result.figures?.d).toBeCloseTo(result.reps[0]?.fit?.change.value ?? NaN, 12);
  });

  it('counts the assumption with belt alone', () => {
    const result = deriveReading(inputOf([early], { thighTurnsLittle: true }));
    expect(result.thighTurnsLittle).toBe(false);
    expect(result.figures?.lambda).toBeNull();
  });

  it('takes the practice’s own systematic error for its set', () => {
    const own = (set: 'belt' | 'belt+thigh') =>
      deriveReading(inputOf([early], { ownSystematic: { set, u: degrees(3.2), lifts: 10 } }));
    const assumed = deriveReading(inputOf([early])).figures?.uC0 ?? NaN;
    expect(own('belt+thigh').figures?.uC0).toBeGreaterThan(assumed + 0.5);
    expect(Math.abs((own('belt').figures?.uC0 ?? NaN) - assumed)).toBeLessThan(0.1);
  });
});

describe('what is missing', () => {
  it.each([
    ['scale-missing', { mmPerPx: null }, 'give-scale'],
    ['distance-missing', { distanceMm: null }, 'give-distance'],
    ['view-cannot-show-turn', { view: 'back' }, 'film-from-front'],
  ] as const)('is named: %s', (code, camera, settle) => {
    const result = deriveReading(inputOf([withCamera(early, camera)]));
    expect(result).toMatchObject({ code: 'not-measurable', line: 1, figures: null, set: null });
    expect(codes(result)).toContain(code);
    expect(result.settle.map((each) => each.code)).toContain(settle);
  });

  it('is named for a pointer length where nothing else can be read', () => {
    const rep = withoutMarks(withCamera(early, { beltPointerMm: null }), ['outline-lifted']);
    const result = deriveReading(inputOf([rep], { set: 'belt' }));
    expect(codes(result)).toContain('belt-pointer-length-missing');
    expect(result.settle).toContainEqual({ code: 'give-pointer-length', pointer: 'belt' });
  });

  it('keeps lift and substitutions where only the turn is missing', () => {
    const result = deriveReading(inputOf([withoutMarks(early, ['belt-tip', 'outline-lifted'])]));
    expect(result.code).toBe('not-measurable');
    expect(result.reps[0]?.frames.some(({ lift }) => lift !== null)).toBe(true);
    expect(result.reps[0]?.frames.every(({ turn }) => turn === null)).toBe(true);
    expect(
      result.reps[0]?.substitutions.find(({ measure }) => measure === 'heel-rise')?.change,
    ).toBe(0);
  });

  it('tells a lift that stops short', () => {
    const low = {
      ...early,
      frames: early.frames.filter((_, i) => i < 12 || i > 45 || i % 40 < 28),
    };
    const short = deriveReading(inputOf([{ ...low, frames: low.frames.filter((_, i) => i < 26) }]));
    expect(short.code).toBe('lift-stops-short');
    expect(short.settle.map(({ code }) => code)).toContain('lift-higher');
  });
});

describe('what would settle a reading that is not settled', () => {
  const unsettled = deriveReading(inputOf([madeRep('left', from60(0.1))], { set: 'bare' }));

  it('is another rep, a richer set, and more marks at the ends of the window', () => {
    expect([2, 7]).toContain(unsettled.line);
    const of = (code: string) => unsettled.settle.find((each) => each.code === code);
    const from = unsettled.figures?.uC0 ?? NaN;
    expect(of('another-rep')).toMatchObject({ from });
    const rep = of('another-rep');
    expect(rep?.code === 'another-rep' && rep.u < from).toBe(true);
    const sets = unsettled.settle.flatMap((each) => (each.code === 'richer-set' ? [each.set] : []));
    expect(sets).toContain('belt+thigh');
    expect(of('mark-frames')).toMatchObject({ rep: 'made', from: 54, to: 66, more: 1 });
  });
});

describe('reps that do not count', () => {
  it('stay visible with the coach’s reason and change nothing else', () => {
    const out: RepInput = { ...madeRep('left', from60(-0.4), { id: 'b' }), excluded: 'hopped' };
    const result = deriveReading(inputOf([early, out]));
    expect(result.reps[1]).toMatchObject({
      used: false,
      why: [{ code: 'excluded', reason: 'hopped' }],
    });
    expect(result.reps[1]?.frames.length).toBeGreaterThan(0);
    expect(result.reps[0]?.fit?.share).toBe(1);
  });

  it('are those of the other side', () => {
    const result = deriveReading(inputOf([madeRep('right', from60(0.4))]));
    expect(codes(result)).toContain('other-side');
    expect(result.code).toBe('not-measurable');
  });

  it('are those whose times do not rise', () => {
    const [first, ...rest] = early.frames;
    if (!first) throw new Error('no frames');
    const result = deriveReading(inputOf([{ ...early, frames: [...rest, first] }]));
    expect(result.reps[0]?.why[0]?.code).toBe('bad-timestamps');
    expect(result.reps[0]?.frames).toEqual([]);
    const twice = deriveReading(inputOf([{ ...early, frames: [first, first, ...rest] }]));
    expect(twice.reps[0]?.why[0]).toMatchObject({ fault: { code: 'time-repeated', at: 1 } });
  });
});

describe('tracked marks', () => {
  const tracked = (looked: boolean) =>
    mapMarks(early, (mark) => ({ ...mark, source: 'tracked', looked }));

  it('make a reading provisional until they are looked at', () => {
    expect(deriveReading(inputOf([tracked(false)])).provisional).toBe(true);
    expect(deriveReading(inputOf([tracked(true)])).provisional).toBe(false);
  });

  it('count with more error than marks by hand', () => {
    const hand = deriveReading(inputOf([early])).figures?.uR ?? NaN;
    const looked = deriveReading(inputOf([tracked(true)])).figures?.uR ?? NaN;
    expect(looked / hand).toBeGreaterThan(1.5);
  });

  it('cannot be told from coarse ones by luck: marks on a small picture count with its scale', () => {
    const coarse = mapMarks(early, (mark) => ({ ...mark, scale: 2 }));
    const fine = deriveReading(inputOf([early])).figures?.uR ?? NaN;
    expect((deriveReading(inputOf([coarse])).figures?.uR ?? NaN) / fine).toBeGreaterThan(1.7);
  });
});

describe('a mirrored clip', () => {
  /** Left and right of the picture swapped, as a selfie camera records it. */
  const selfie = (rep: RepInput): RepInput =>
    withCamera(
      mapMarks(rep, (mark) => ({
        ...mark,
        point: { u: rep.camera.width - mark.point.u, v: mark.point.v },
      })),
      { mirrored: true },
    );

  it.each([
    ['left', 0.4, 'early-turn-out'],
    ['right', 0.4, 'early-turn-out'],
    ['left', -0.4, 'expected-turn-in'],
    ['right', -0.4, 'expected-turn-in'],
  ] as const)(
    'of someone standing on the %s leg, %d° a degree, is read as %s',
    (side, slope, code) => {
      const rep = madeRep(side, from60(slope));
      const read = (reps: RepInput[]) => deriveReading(inputOf(reps, { supportSide: side }));
      const [straight, mirrored] = [read([rep]), read([selfie(rep)])];
      expect(mirrored.code).toBe(code);
      expect(mirrored.figures?.d).toBeCloseTo(straight.figures?.d ?? NaN, 6);
      expect(mirrored.warnings.map(({ warning }) => warning.code)).toEqual(['mirrored']);
    },
  );
});

describe('warnings', () => {
  it('come with their figure and the reps they concern', () => {
    const rep = withCamera(early, {
      lensHeightMm: null,
      mirrored: true,
      plumbTilt: degrees(4),
      offFront: degrees(-25),
      framesPerSecond: 24,
      exposureMs: 30,
    });
    const { warnings } = deriveReading(inputOf([rep]));
    const of = (code: string) => warnings.find(({ warning }) => warning.code === code);
    expect(of('lens-height-missing')).toMatchObject({
      warning: { liftHalfWidth: 7 },
      reps: ['a'],
    });
    expect(of('plumb-off')?.warning).toMatchObject({ by: 4, limit: 3 });
    expect(of('camera-off-front')?.warning).toMatchObject({ by: -25 });
    expect(of('slow-frame-rate')?.warning).toMatchObject({ framesPerSecond: 24 });
    expect(of('mirrored')).toBeDefined();
    expect(of('smear')).toBeDefined();
    expect(deriveReading(inputOf([early])).warnings).toEqual([]);
  });

  it('stand once for several reps', () => {
    const slow = (id: string) => withCamera({ ...early, id }, { framesPerSecond: 25 });
    const { warnings } = deriveReading(inputOf([slow('a'), slow('b')]));
    expect(warnings).toHaveLength(1);
    expect(warnings[0]?.reps).toEqual(['a', 'b']);
  });
});
