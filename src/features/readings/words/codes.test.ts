import { describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import type { Missing } from '#shared/measures/missing.ts';
import type { Reason, RepFault, Settle, Warning } from '#shared/reading/reasons.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { missingWords } from './missing-words.ts';
import { reasonWords } from './reason-words.ts';
import { faultsToSay, repFaultWords } from './rep-fault-words.ts';
import { settleWords } from './settle-words.ts';
import { warningWords } from './warning-words.ts';

type Codes<T extends { readonly code: string }> = Record<T['code'], readonly [T, string]>;
const few = { have: 1, need: 2, from: degrees(84), to: degrees(96) };

// a code without its sentence does not compile
const FAULTS = {
  excluded: [{ code: 'excluded', reason: 'hopped' }, 'hopped'],
  'bad-timestamps': [
    {
      code: 'bad-timestamps',
      fault: { code: 'time-repeated', at: 4, time: milliseconds(80) },
    },
    'the times of its frames do not rise at place 5',
  ],
  'marks-implausible': [
    { code: 'marks-implausible', landmarks: ['belt-tip'] },
    'marks that cannot be right: tip of the belt pointer',
  ],
  'no-frames': [{ code: 'no-frames' }, 'no frame of it is marked'],
  'other-side': [{ code: 'other-side' }, 'it stands on the other leg'],
  'view-cannot-show-turn': [
    { code: 'view-cannot-show-turn', view: 'back' },
    'the turn cannot be measured in this view (back view)',
  ],
  'scale-missing': [{ code: 'scale-missing' }, 'its clip has no scale'],
  'distance-missing': [{ code: 'distance-missing' }, 'the distance of the camera is not known'],
  'belt-pointer-length-missing': [
    { code: 'belt-pointer-length-missing' },
    'the length of the belt pointer is not known',
  ],
  'thigh-pointer-length-missing': [
    { code: 'thigh-pointer-length-missing' },
    'the length of the thigh pointer is not known',
  ],
  'landmarks-missing': [
    {
      code: 'landmarks-missing',
      landmarks: ['belt-tip', 'lifted-knee', 'kneecap', 'ankle-support'],
    },
    'not marked: tip of the belt pointer; middle of the lifted knee and 2 more',
  ],
  'no-foot-off': [
    { code: 'no-foot-off' },
    'no frame shows where the foot leaves the floor after a quiet stance',
  ],
  'few-quiet': [
    { code: 'few-quiet', have: 1, need: 3, from: null, to: null },
    'one frame of the quiet stance marked, three needed',
  ],
  'few-near-60': [
    { ...few, code: 'few-near-60' },
    'one frame marked with a lift from 84° to 96°, two needed',
  ],
  'few-near-90': [
    { ...few, code: 'few-near-90', have: 0 },
    'no frames marked with a lift from 84° to 96°, two needed',
  ],
  'few-across-window': [
    { ...few, code: 'few-across-window' },
    'one frame marked with a lift from 84° to 96°, two needed',
  ],
  'few-in-rise': [
    { ...few, code: 'few-in-rise', have: 5, need: 7 },
    'five frames of the rise marked, seven needed',
  ],
  'marks-coincide': [
    { code: 'marks-coincide' },
    'marks lie on each other where they should be apart',
  ],
  'poorer-set': [
    { code: 'poorer-set', set: 'bare' },
    'it carries only bare landmarks, without pointers; the others carry more',
  ],
} satisfies Codes<RepFault>;

const REASONS = {
  'no-usable-rep': [
    { code: 'no-usable-rep', reps: 3 },
    'None of the three reps of this side can be measured.',
  ],
  'lift-under-85': [
    { code: 'lift-under-85', reps: 2, of: 3, highest: degrees(82.4) },
    '2 of 3 reps stayed under 85° of lift; the highest reached 82°. The turn is read up to 90°.',
  ],
  'too-uncertain': [
    { code: 'too-uncertain', u: degrees(6.4), limit: degrees(6) },
    'With these landmarks the change of turn is known to 6.4° (one standard uncertainty). Above 6° nothing is read from it.',
  ],
  'early-probable': [
    { code: 'early-probable', p: 0.9987, limit: 0.95 },
    'The probability that the hip turns out by more than 1° is 99.8 in 100; a reading needs 95.',
  ],
  'before-60-probable': [
    { code: 'before-60-probable', p: 0.981, limit: 0.975, pNotBack: 0.86, limitNotBack: 0.8 },
    'The probability that the hip turned out by more than 8° already from 30° to 60° of lift is 98 in 100; a reading needs 97.5. It does not come back before 90°: 86 in 100, 80 needed.',
  ],
  'turn-in-probable': [
    { code: 'turn-in-probable', p: 0.96, limit: 0.95 },
    'The probability that the hip turns in by more than 1° is 96 in 100; a reading needs 95.',
  ],
  'flat-probable': [
    { code: 'flat-probable', p: 0.85, limit: 0.8 },
    'The probability that the hip turns by less than 5° either way is 85 in 100; this reading needs 80.',
  ],
  'nothing-probable-enough': [
    { code: 'nothing-probable-enough', pEarly: 0.949, pIn: 0.02, pFlat: 0.799 },
    'No answer is probable enough: turning out 94, turning in 2, within 5° either way 79 in 100. A reading needs 95 for a turn, 80 for holding still.',
  ],
} satisfies Codes<Reason>;

const WARNINGS = {
  'camera-off-front': [
    { code: 'camera-off-front', by: degrees(-27), limit: degrees(20) },
    'The camera stood 27° off the front; more than 20° bends the turn. Put both heels on a line square to the camera.',
  ],
  'plumb-off': [
    { code: 'plumb-off', by: degrees(4.2), limit: degrees(3) },
    'The picture hangs 4.2° off the plumb line; 3° is allowed. The marks were turned back by that; set the phone up straight next time.',
  ],
  'too-near': [
    { code: 'too-near', distanceMm: 1650, limitMm: 2000 },
    'The camera stood 1.65 m away; nearer than 2.00 m the picture is too steep. Stand 2.5 to 3.5 m away.',
  ],
  'too-coarse': [
    { code: 'too-coarse', mmPerPx: 3.1, limit: 2.5 },
    'One pixel is 3.1 mm on the body; above 2.5 mm the marks are too coarse. Film nearer or in a higher resolution.',
  ],
  'slow-frame-rate': [
    { code: 'slow-frame-rate', framesPerSecond: 24, limit: 30 },
    '24 frames a second; below 30 the way from gate to gate has few frames. Film at 60.',
  ],
  mirrored: [
    { code: 'mirrored' },
    'The clip is mirrored, as selfie cameras make it. It was turned back; check that the support side is right.',
  ],
  'lens-height-missing': [
    { code: 'lens-height-missing', liftHalfWidth: degrees(7) },
    'The height of the lens is not known: lift is uncertain by 7° instead of 2°. Measure it from the floor and write it into the set-up.',
  ],
  smear: [
    { code: 'smear', px: 5.25, landmark: 'belt-tip', limit: 3 },
    'Tip of the belt pointer is smeared over 5.3 pixels in one exposure; more than 3 hides where its middle is. More light, or a shorter shutter, makes it sharper.',
  ],
  'few-quiet-frames': [
    { code: 'few-quiet-frames', have: 3, recommended: 5 },
    'Three quiet frames are marked; five make zero firmer.',
  ],
  'assumed-thigh': [
    { code: 'assumed-thigh', sd: degrees(4) },
    'The planted thigh is taken as turning little (± 8°), not measured.',
  ],
  'gates-not-studied': [
    { code: 'gates-not-studied', from: degrees(50), to: degrees(80) },
    'The turn is read from 50° to 80° of lift. The errors that Redshank assumes, and how well it finds an early turn, were worked out for 60° to 90° only: take the ± and the probability here as a guide.',
  ],
  'limit-lowered': [
    { code: 'limit-lowered', limit: 0.925, studied: 0.95 },
    'This protocol is content with 92.5 in 100 where the study asked for 95: more readings are wrong.',
  ],
  'tracked-not-looked-at': [
    { code: 'tracked-not-looked-at', frames: 1 },
    '1 frame rests on tracked marks that nobody has looked at: the reading is provisional.',
  ],
} satisfies Codes<Warning>;

const SETTLES = {
  'mark-frames': [
    { code: 'mark-frames', rep: 'b', from: degrees(84), to: degrees(96), more: 2 },
    'Mark two more frames of rep b with a lift from 84° to 96°',
  ],
  'mark-quiet-frames': [
    { code: 'mark-quiet-frames', rep: 'b', more: 1 },
    'Mark one more quiet frame of rep b',
  ],
  'give-scale': [{ code: 'give-scale' }, 'Give the scale: two ends of the rod, or the body height'],
  'give-distance': [{ code: 'give-distance' }, 'Give the distance from the lens to the athlete'],
  'give-pointer-length': [
    { code: 'give-pointer-length', pointer: 'thigh' },
    'Give the length of the thigh pointer',
  ],
  'mark-landmarks': [
    { code: 'mark-landmarks', rep: 'b', landmarks: ['belt-tip'] },
    'Mark on rep b: tip of the belt pointer',
  ],
  'film-from-front': [{ code: 'film-from-front' }, 'Film the lift from the front'],
  'lift-higher': [
    { code: 'lift-higher', reached: degrees(76), needed: degrees(85) },
    'Lift higher: 76° was reached, 85° is needed',
  ],
  'stand-still-first': [
    { code: 'stand-still-first' },
    'Stand still for three seconds first, then film again',
  ],
  'another-rep': [{ code: 'another-rep', u: degrees(3), from: degrees(4) }, 'Add another rep'],
  'richer-set': [
    { code: 'richer-set', set: 'belt+thigh', u: degrees(2.8), from: degrees(4.5) },
    'Film once more with belt and thigh pointers',
  ],
} satisfies Codes<Settle>;

const MISSING = {
  'landmark-not-marked': [
    { code: 'landmark-not-marked', landmarks: ['toe-support'] },
    'not marked: toe of the support foot',
  ],
  'landmark-hidden': [
    { code: 'landmark-hidden', landmarks: ['heel-support'] },
    'cannot be seen: heel of the support foot',
  ],
  'no-quiet-stance': [{ code: 'no-quiet-stance' }, 'no quiet stance to compare with'],
  'scale-missing': [{ code: 'scale-missing' }, 'the scale is not known'],
  'distance-missing': [{ code: 'distance-missing' }, 'the distance of the camera is not known'],
  'belt-pointer-length-missing': [
    { code: 'belt-pointer-length-missing' },
    'the length of the belt pointer is not known',
  ],
  'thigh-pointer-length-missing': [
    { code: 'thigh-pointer-length-missing' },
    'the length of the thigh pointer is not known',
  ],
  'body-height-missing': [{ code: 'body-height-missing' }, 'the body height is not known'],
  'toe-direction-missing': [
    { code: 'toe-direction-missing' },
    'it is not known which way the toes point',
  ],
  'view-cannot-show-it': [
    { code: 'view-cannot-show-it', view: 'front' },
    'not seen in this view (front view)',
  ],
  'only-between-lifts': [
    { code: 'only-between-lifts', from: degrees(75), to: degrees(105) },
    'only given for a lift from 75° to 105°',
  ],
  'not-in-side-clip': [
    { code: 'not-in-side-clip' },
    'the side clip has no marks around this moment',
  ],
  'marks-coincide': [{ code: 'marks-coincide' }, 'marks lie on each other'],
} satisfies Codes<Missing>;

describe('every code has its sentence', () => {
  it.each(Object.values(FAULTS))('rep: %o', (fault, words) => {
    expect(repFaultWords(fault)).toBe(words);
  });
  it.each(Object.values(REASONS))('reason: %o', (reason, words) => {
    expect(reasonWords(reason, STANDARD_RULES)).toBe(words);
  });
  it.each(Object.values(WARNINGS))('warning: %o', (warning, words) => {
    expect(warningWords(warning).replaceAll('\u00a0', ' ')).toBe(words);
  });
  it.each(Object.values(SETTLES))('settle: %o', (settle, words) => {
    expect(settleWords(settle, (id) => `rep ${id}`).act).toBe(words);
  });
  it.each(Object.values(MISSING))('missing: %o', (missing, words) => {
    expect(missingWords(missing)).toBe(words);
  });
});

describe('what else is said', () => {
  it('says what an act brings, as the ± that is shown', () => {
    const [another] = SETTLES['another-rep'];
    expect(settleWords(another, () => '').gain).toBe('±\u00a07.8° would become about ±\u00a05.9°');
  });

  it('says one fault alone where no other matters', () => {
    const [few60] = FAULTS['few-near-60'];
    const [view] = FAULTS['view-cannot-show-turn'];
    expect(faultsToSay([few60, view])).toEqual([view]);
    expect(faultsToSay([few60])).toEqual([few60]);
  });

  it('says a smear that was measured on the picture without a landmark', () => {
    expect(warningWords({ code: 'smear', px: 8, landmark: null, limit: 3 })).toMatch(
      /^A dot is smeared over 8\.0 pixels/,
    );
  });

  it('says what a wrong scale costs', () => {
    expect(settleWords({ code: 'give-scale' }, () => '').gain).toBe(
      'Without it no turn can be computed; a scale that is 15 % off makes it 20 % wrong.',
    );
  });

  it('has a sentence for a side without any rep that could count', () => {
    expect(reasonWords({ code: 'no-usable-rep', reps: 0 }, STANDARD_RULES)).toBe(
      'No rep of this side counts: none was filmed from the front, or each was left out.',
    );
    expect(reasonWords({ code: 'no-usable-rep', reps: 1 }, STANDARD_RULES)).toBe(
      'The one rep of this side cannot be measured.',
    );
  });
});
