import { describe, expect, it } from 'vitest';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import type { Warning } from '#shared/reading/reasons.ts';
import { degrees } from '#shared/geometry/units.ts';
import { seconds } from '#shared/timing/units.ts';
import type { LookedAtClip } from '#src/video/look-at-file.ts';
import { BEFORE_SENDING, type Chosen, filmingAdvice } from './filming-rules.ts';

const constant = (fps: number) => ({ kind: 'constant' as const, fps, gaps: 0 });

type Change = {
  look?: Partial<LookedAtClip>;
  details?: Partial<Chosen['details']>;
  filming?: Partial<Chosen['filming']>;
  bodyHeightMm?: number | null;
  protocol?: Chosen['protocol'];
};
const chosen = (change: Change = {}): Chosen => ({
  look: {
    outcome: 'clip',
    container: 'mov',
    codec: 'hevc',
    width: 1080,
    height: 1920,
    rotation: 90,
    length: seconds(7.2),
    frameRate: constant(60),
    frames: 432,
    hdr: false,
    decodableHere: false,
    cutShort: false,
    ...change.look,
  },
  details: { view: 'front', supportSide: 'left', mirrored: false, ...change.details },
  filming: {
    distanceMm: 3000,
    lensHeightMm: 950,
    rodMm: 1200,
    beltPointerMm: 135,
    thighPointerMm: 125,
    ...change.filming,
  },
  bodyHeightMm: change.bodyHeightMm === undefined ? 1740 : change.bodyHeightMm,
  protocol: change.protocol === undefined ? STANDARD_PROTOCOL : change.protocol,
});

/** Beyond the limit, just within it, and what is said; null: nothing before the clip is sent. */
type Case = { beyond: Change; within: Change; says: string } | null;

// a warning without its case does not compile
const CASES = {
  'camera-off-front': null,
  'plumb-off': null,
  'too-near': {
    beyond: { filming: { distanceMm: 1650 } },
    within: { filming: { distanceMm: LIMITS.nearMm.value } },
    says: 'Filmed from 1.65 m: nearer than 2.00 m the picture is too steep. Film again from 2.5 to 3.5 m.',
  },
  'too-coarse': {
    beyond: { filming: { distanceMm: 4000 } },
    within: { look: { width: 2160, height: 3840 }, filming: { distanceMm: 4000 } },
    says: 'At 4.00 m one pixel is about 2.9 mm of the body through a phone’s main lens (69° along the long edge is assumed); above 2.5 mm marks are too coarse. Film from 3.49 m or nearer, or with more pixels (1080p or 4K).',
  },
  'slow-frame-rate': {
    beyond: { look: { frameRate: constant(24) } },
    within: { look: { frameRate: constant(29.97) } },
    says: '24 frames per second; below 30 a quick lift passes from 60° to 90° in 3 frames. Film at 60.',
  },
  mirrored: {
    beyond: { details: { mirrored: true } },
    within: {},
    says: 'Mirrored: left and right are put right again. Check that the left leg named here is the athlete’s own, not the picture’s.',
  },
  'lens-height-missing': {
    beyond: { filming: { lensHeightMm: null } },
    within: { filming: { lensHeightMm: null }, details: { view: 'lifted-side' } },
    says: 'the lens height (lift is known to ± 7° instead of ± 2°)',
  },
  smear: null,
  'few-quiet-frames': {
    beyond: { look: { length: seconds(3.4) } },
    within: { look: { length: seconds(5) } },
    says: '3.4 s: three still seconds and a slow lift of two take 5. Film again, and start before the athlete stands still.',
  },
  'assumed-thigh': null,
  'gates-not-studied': null,
  'limit-lowered': null,
  'tracked-not-looked-at': null,
} satisfies Record<Warning['code'], Case>;

const plain = (words: string | null) => words?.replaceAll('\u00a0', ' ') ?? null;

describe('what of a reading’s warnings is said before a clip is sent', () => {
  it.each(Object.entries(CASES) as [Warning['code'], Case][])('%s', (code, known) => {
    const rule = BEFORE_SENDING[code];
    expect(rule === null).toBe(known === null);
    if (rule === null || known === null) return;
    expect(plain(rule(chosen(known.beyond)))).toBe(known.says);
    expect(rule(chosen(known.within))).toBeNull();
  });

  it('needs figures: without them nothing is guessed', () => {
    expect(BEFORE_SENDING['too-near'](chosen({ filming: { distanceMm: null } }))).toBeNull();
    expect(BEFORE_SENDING['too-coarse'](chosen({ filming: { distanceMm: null } }))).toBeNull();
    expect(BEFORE_SENDING['slow-frame-rate'](chosen({ look: { frameRate: null } }))).toBeNull();
  });

  it('does not send someone nearer than the nearest distance for the sake of pixels', () => {
    const small = chosen({ look: { width: 540, height: 960 } });
    expect(BEFORE_SENDING['too-coarse'](small)).toMatch(/too coarse\. Film with more pixels/);
  });
});

describe('the practice’s protocol', () => {
  const slow = { frameRate: constant(24) };
  const own = {
    ...STANDARD_PROTOCOL,
    gateFrom: degrees(50),
    gateTo: degrees(95),
    framesPerSecond: 120,
  };

  it('gives the gates, the frames between them and the frame rate that is asked for', () => {
    expect(BEFORE_SENDING['slow-frame-rate'](chosen({ look: slow, protocol: own }))).toBe(
      '24 frames per second; below 30 a quick lift passes from 50° to 95° in 5 frames. Film at 120.',
    );
  });

  it('is not guessed while it is not known', () => {
    expect(BEFORE_SENDING['slow-frame-rate'](chosen({ look: slow, protocol: null }))).toBe(
      '24 frames per second; below 30 a quick lift passes from gate to gate in 3 frames. Film at 60.',
    );
  });

  it('says of the study’s figures that they hold for other gates', () => {
    const filming = { beltPointerMm: null };
    const [lacks] = filmingAdvice(chosen({ filming, protocol: own }));
    expect(lacks).toContain('° with both, worked out for 60° to 90°).');
    expect(filmingAdvice(chosen({ filming }))[0]).toContain('° with both).');
  });
});

describe('the way of filming', () => {
  it('is not spoken of where it is good', () => {
    expect(filmingAdvice(chosen())).toEqual([]);
  });

  it('is told at once where much of the set-up is not written down, each with its price', () => {
    const bare = chosen({
      filming: {
        distanceMm: null,
        lensHeightMm: null,
        rodMm: null,
        beltPointerMm: null,
        thighPointerMm: null,
      },
      bodyHeightMm: null,
    });
    expect(filmingAdvice(bare).map(plain)).toEqual([
      `The set-up lacks the distance (no lift and no turn without it), the lens height (lift is known to ± 7° instead of ± 2°), a rod or the body height (15 % off the scale makes the turn 20 % wrong) and pointer lengths (one rep tells a change of turn from none beyond ${ACHIEVED.bare.toldFromNone.one}° without pointers, beyond ${ACHIEVED['belt+thigh'].toldFromNone.one}° with both). Write down what you know under “3 Film” before you send: clips take it along.`,
    ]);
  });

  it('asks a side clip for no lens height and no pointers', () => {
    const side = chosen({
      details: { view: 'lifted-side' },
      filming: { lensHeightMm: null, beltPointerMm: null },
    });
    expect(filmingAdvice(side)).toEqual([]);
  });

  it('knows a person who does not fit the picture', () => {
    const [near, fits, ...more] = filmingAdvice(chosen({ filming: { distanceMm: 1200 } }));
    expect(near).toMatch(/^Filmed from 1\.20 m/);
    expect(fits).toMatch(/about 1\.65 m high .* the athlete is 1\.74 m tall/);
    expect(more).toEqual([]);
    const lying = { width: 1920, height: 1080 };
    expect(filmingAdvice(chosen({ look: lying, filming: { distanceMm: 2200 } }))[0]).toMatch(
      /about 1\.70 m high/,
    );
    expect(filmingAdvice(chosen({ look: lying }))).toEqual([]);
  });
});
