import { describe, expect, it } from 'vitest';
import { type ClipGeometry, clipGeometry } from '#shared/contracts/clips.ts';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import type { FrameMarks, MarksByFrame, MarkValue } from '#shared/landmarks/commands.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import type { Warning } from '#shared/reading/reasons.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { degrees } from '#shared/geometry/units.ts';
import { type ReadingRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { type MeasuredClip, repInputOf } from './engine-input.ts';

const made = madeRep('left', (lift) => 0.2 * Math.max(0, lift - 60));
const times: number[] = [];
for (const { frame, time } of made.frames) times[frame] = time;

/** What differs in the stored rows. */
interface Rows {
  readonly clip?: Partial<MeasuredClip>;
  readonly geometry?: Partial<ClipGeometry>;
  readonly tracked?: boolean;
  /** Moved by hand to there. */
  readonly quietEnd?: number;
  readonly rules?: Partial<ReadingRules>;
  readonly assumption?: boolean;
}

const geometry: ClipGeometry = {
  scale: { from: 'typed', mmPerPx: made.camera.mmPerPx ?? NaN },
  distanceMm: made.camera.distanceMm,
  lensHeightMm: made.camera.lensHeightMm,
  beltPointerMm: made.camera.beltPointerMm,
  thighPointerMm: 115,
  plumb: null,
  floorLine: null,
  shutter: null,
};

const marksOf = ({ tracked, assumption }: Rows): MarksByFrame => {
  const left: readonly LandmarkId[] = assumption ? ['thigh-tip', 'strap-inner', 'strap-outer'] : [];
  return new Map<FrameIndex, FrameMarks>(
    made.frames.map(({ frame, marks }) => [
      frame,
      Object.fromEntries(
        Object.entries(marks).flatMap(([id, mark]): [string, MarkValue][] =>
          mark.hidden || left.some((each) => each === id)
            ? []
            : [
                [
                  id,
                  {
                    to: 'point',
                    point: mark.point,
                    source: tracked ? 'tracked' : 'hand',
                    looked: !tracked,
                    confidence: null,
                    pictureLongEdge: 1920,
                  },
                ],
              ],
        ),
      ),
    ]),
  );
};

/** The warnings of the reading that stored rows give, all the way through. */
const warningsOf = (rows: Rows): readonly Warning[] => {
  const given = clipGeometry.parse({ ...geometry, ...rows.geometry });
  const rep = repInputOf({
    rep: {
      id: 'r',
      supportSide: 'left',
      view: 'front',
      boundaries: {
        quietStart: null,
        quietEnd: rows.quietEnd === undefined ? null : { frame: rows.quietEnd, by: 'hand' },
        footOff: null,
        top: null,
        topEnd: null,
        footDown: null,
      },
      excluded: null,
    },
    clip: {
      width: 1080,
      height: 1920,
      geometry: given,
      mmPerPx: made.camera.mmPerPx,
      frameRate: { perSecond: 60, variable: false, minPerSecond: 60, maxPerSecond: 60 },
      mirrored: false,
      cameraStood: 'front',
      ...rows.clip,
    },
    times: Array.from(times, (time) => milliseconds(time ?? NaN)),
    marks: marksOf(rows),
    bodyHeightMm: 1720,
  });
  if (!rep) throw new Error('The clip has no size.');
  const { warnings } = deriveReading(
    {
      engine: 2,
      supportSide: 'left',
      set: null,
      thighTurnsLittle: rows.assumption ?? false,
      markError: ASSUMED_MARK_ERROR,
      ownSystematic: null,
      rules: { ...STANDARD_RULES, ...rows.rules },
      reps: [rep],
    },
    50,
  );
  return warnings.map(({ warning }) => warning);
};

/** Heels 200 px apart, the right one 30 px higher: 3000 / 900 times 0.15 is the tangent. */
const OFF = { a: { u: 440, v: 1410 }, b: { u: 640, v: 1380 } };

// a warning that no stored row makes does not compile
const ROWS = {
  'camera-off-front': [{ geometry: { floorLine: OFF } }, { limit: 20 }],
  'plumb-off': [
    { geometry: { plumb: { top: { u: 500, v: 100 }, bottom: { u: 560, v: 1100 } } } },
    { limit: 3 },
  ],
  'too-near': [{ geometry: { distanceMm: 1900 } }, { distanceMm: 1900, limitMm: 2000 }],
  'too-coarse': [{ clip: { mmPerPx: 2.6 } }, { mmPerPx: 2.6, limit: 2.5 }],
  'slow-frame-rate': [
    {
      clip: { frameRate: { perSecond: 24, variable: false, minPerSecond: 24, maxPerSecond: 24 } },
    },
    { framesPerSecond: 24, limit: 30 },
  ],
  mirrored: [{ clip: { mirrored: true } }, {}],
  'lens-height-missing': [{ geometry: { lensHeightMm: null } }, { liftHalfWidth: 7 }],
  smear: [
    { geometry: { shutter: { from: 'smear', a: { u: 10, v: 20 }, b: { u: 14, v: 23 } } } },
    { px: 5, landmark: null, limit: 3 },
  ],
  'few-quiet-frames': [{ quietEnd: 9 }, { have: 4, recommended: 5 }],
  'assumed-thigh': [{ assumption: true }, { sd: 4 }],
  'gates-not-studied': [
    { rules: { gateFrom: degrees(50), gateTo: degrees(80), liftShort: degrees(75) } },
    { from: 50, to: 80 },
  ],
  'limit-lowered': [{ rules: { early: 0.9 } }, { limit: 0.9, studied: 0.95 }],
  'tracked-not-looked-at': [{ tracked: true }, {}],
} satisfies Record<Warning['code'], [Rows, object]>;

describe('stored rows', () => {
  it('of a well filmed clip warn of nothing', () => {
    expect(warningsOf({})).toEqual([]);
  });

  it.each(Object.entries(ROWS) as [Warning['code'], [Rows, object]][])(
    'make the warning %s, with its figure',
    (code, [rows, figures]) => {
      const found = warningsOf(rows).find((warning) => warning.code === code);
      expect(found).toMatchObject({ code, ...figures });
    },
  );

  it('with a typed shutter tell which mark moves furthest while it is open', () => {
    const open = (perSecond: number) =>
      warningsOf({ geometry: { shutter: { from: 'typed', perSecond } } });
    const [slow] = open(30);
    expect(slow).toMatchObject({ code: 'smear', limit: 3 });
    expect(slow?.code === 'smear' && slow.landmark).toBeTruthy();
    expect(open(1000)).toEqual([]);
  });

  it.each([
    ['without the lens height', { lensHeightMm: null }],
    ['without the distance', { distanceMm: null }],
    ['on touches that lie on each other', { floorLine: { a: OFF.a, b: OFF.a } }],
  ])('tell nothing of the floor line %s', (_, change) => {
    const codes = warningsOf({ geometry: { floorLine: OFF, ...change } }).map(({ code }) => code);
    expect(codes).not.toContain('camera-off-front');
  });
});
