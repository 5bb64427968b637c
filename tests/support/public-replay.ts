import type { PublicReplay } from '#shared/contracts/replays.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';

export const replayToken = 'A'.repeat(43);

/** Marks of a body that stands; `lifted` is how far the lifted knee has come up, px. */
const marks = (lifted: number) =>
  [
    ['asis-support', 480, 900],
    ['asis-lifted', 620, 900],
    ['belt-tip', 550, 905],
    ['kneecap', 480, 1250],
    ['thigh-tip', 482, 1200],
    ['lifted-knee', 620, 1250 - lifted],
    ['ankle-support', 480, 1600],
    ['ankle-lifted', 620, 1600 - lifted],
  ].map(([landmark, u, v]) => ({
    landmark: String(landmark),
    u: Number(u),
    v: Number(v),
    looked: true,
  }));

/** What a link answers: 100 frames at 50 a second, marked on five of them. */
export const aPublicReplay = (change: Partial<PublicReplay> = {}): PublicReplay => ({
  athleteGivenName: 'Ines',
  practice: { name: 'Greywater Row', contact: 'reception: 01632 960 114' },
  coachName: 'Maren Okafor',
  visitDay: '2026-03-03',
  side: 'right',
  view: 'front',
  width: 1080,
  height: 1920,
  frames: {
    count: 100,
    timeBase: { num: 1, den: 50 },
    ticks: Array.from({ length: 100 }, (_, n) => n),
  },
  head: 'shown',
  film: null,
  fromFrame: 5,
  toFrame: 95,
  gates: STANDARD_GATES,
  moments: { quiet: 10, from: 40, to: 50, top: 60 },
  overlay: [
    { frame: 10, marks: marks(0), lift: 3, liftPlusMinus: 3, turn: 0, turnPlusMinus: 5 },
    { frame: 40, marks: marks(200), lift: 60, liftPlusMinus: 3, turn: 2, turnPlusMinus: 5 },
    { frame: 50, marks: marks(320), lift: 90, liftPlusMinus: 3, turn: 9, turnPlusMinus: 5 },
    { frame: 60, marks: marks(360), lift: 104, liftPlusMinus: 3, turn: 11, turnPlusMinus: 5 },
    { frame: 80, marks: marks(350), lift: 100, liftPlusMinus: 3, turn: 10, turnPlusMinus: 5 },
  ],
  course: null,
  before: null,
  reading: {
    code: 'early-turn-out',
    label: 'Turns out early',
    change: 6.8,
    plusMinus: 3.6,
    probability: 0.998,
    repsUsed: 3,
    repsAgreeing: 3,
  },
  call: { seen: 'early', confidence: 'fairly-sure' },
  message: 'Watch the stick on your belt.',
  plan: null,
  comments: [
    {
      body: 'Here it begins to drift.',
      fromFrame: 40,
      toFrame: 44,
      shape: { kind: 'ring', u: 550, v: 900, radius: 60 },
      by: 'Tobias Lindqvist',
    },
  ],
  expiresAt: '2026-04-02T10:00:00Z',
  ...change,
});
