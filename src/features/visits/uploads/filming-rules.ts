import type { Visit } from '#shared/contracts/visits.ts';
import { ACHIEVED } from '#shared/measures/achieved.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import {
  FILMING_LIMITS as LIMITS,
  isSlow,
  shownAlongLongEdge,
} from '#shared/measures/filming-limits.ts';
import { type Gates, gatesOf, type Protocol, STANDARD_GATES } from '#shared/protocol/protocol.ts';
import type { Warning } from '#shared/reading/reasons.ts';
import type { LookedAtClip } from '#src/video/look-at-file.ts';
import { decimal, metres } from '#src/ui/figures.ts';
import { betweenGates, studiedBetween } from '#src/ui/gate-words.ts';
import type { ClipDetails } from './upload-item.ts';

/** What is known of a clip before it is sent: its file, how it was filmed, and the person. */
export interface Chosen {
  readonly look: LookedAtClip;
  readonly details: ClipDetails;
  readonly filming: Visit['filming'];
  readonly bodyHeightMm: number | null;
  /** The practice's; null until it is known. */
  readonly protocol: Protocol | null;
}

/** A sentence with its figure, its limit and what to do; null where nothing is wrong or nothing can be told. */
type Rule = (chosen: Chosen) => string | null;

export const perSecond = ({ frameRate }: LookedAtClip): number | null =>
  frameRate === null ? null : frameRate.kind === 'constant' ? frameRate.fps : frameRate.averageFps;

export const gatesOfPractice = ({ protocol }: Pick<Chosen, 'protocol'>): Gates | null =>
  protocol && gatesOf(protocol);

/** What the practice asks for. */
export const rateAskedFor = ({ protocol }: Pick<Chosen, 'protocol'>): number =>
  protocol?.framesPerSecond ?? LIMITS.goodFramesPerSecond.value;

/** Whole frames while a quick lift passes the gates; a wider window takes it longer in proportion. */
const framesBetween = (fps: number, { from, to }: Gates): number =>
  Math.floor(
    (fps * LIMITS.quickestPassSeconds.value * (to - from)) /
      (STANDARD_GATES.to - STANDARD_GATES.from),
  );

const distances = ({ width, height }: LookedAtClip): string => {
  const to = Math.max(width, height) >= 3840 ? LIMITS.bestTo4kMm : LIMITS.bestToMm;
  return `${decimal(LIMITS.bestFromMm.value / 1000)} to ${decimal(to.value / 1000)} m`;
};

const LENS = `through a phone’s main lens (${LIMITS.lensAngle.value}° along the long edge is assumed)`;

const tooNear: Rule = ({ look, filming: { distanceMm } }) =>
  distanceMm !== null && distanceMm < LIMITS.nearMm.value
    ? `Filmed from ${metres(distanceMm)}: nearer than ${metres(LIMITS.nearMm.value)} the picture is too steep. Film again from ${distances(look)}.`
    : null;

const tooCoarse: Rule = ({ look, filming: { distanceMm } }) => {
  if (distanceMm === null) return null;
  const longEdge = Math.max(look.width, look.height);
  const mmPerPx = shownAlongLongEdge(distanceMm) / longEdge;
  const farthest = (LIMITS.coarse.value * longEdge * distanceMm) / shownAlongLongEdge(distanceMm);
  if (mmPerPx <= LIMITS.coarse.value) return null;
  const nearer = farthest >= LIMITS.nearMm.value ? `from ${metres(farthest)} or nearer, or ` : '';
  return `At ${metres(distanceMm)} one pixel is about ${decimal(mmPerPx)} mm of the body ${LENS}; above ${decimal(LIMITS.coarse.value)} mm marks are too coarse. Film ${nearer}with more pixels (1080p or 4K).`;
};

const slow: Rule = (chosen) => {
  const fps = perSecond(chosen.look);
  const gates = gatesOfPractice(chosen);
  return fps !== null && isSlow(fps)
    ? `${decimal(fps, 0)} frames per second; below ${LIMITS.framesPerSecond.value} a quick lift passes ${betweenGates(gates)} in ${framesBetween(fps, gates ?? STANDARD_GATES)} frames. Film at ${rateAskedFor(chosen)}.`
    : null;
};

const mirrored: Rule = ({ details }) =>
  details.mirrored
    ? `Mirrored: left and right are put right again. Check that the ${details.supportSide ?? 'right and left'} leg named here is the athlete’s own, not the picture’s.`
    : null;

/**
 * What of each warning of a reading can be said before the clip is sent. Null: only the picture or the marks
 * can tell. Warnings of what the set-up lacks stand together in `lacksOf`.
 */
export const BEFORE_SENDING = {
  'camera-off-front': null,
  'plumb-off': null,
  'too-near': tooNear,
  'too-coarse': tooCoarse,
  'slow-frame-rate': slow,
  mirrored,
  'lens-height-missing': (chosen) => lensLack(chosen),
  smear: null,
  'few-quiet-frames': (chosen) => tooShort(chosen),
  'assumed-thigh': null,
  'gates-not-studied': null,
  'limit-lowered': null,
  'tracked-not-looked-at': null,
} satisfies Record<Warning['code'], Rule | null>;

/** Zero needs quiet frames: a clip shorter than standing still and one slow lift has none to spare. */
const tooShort: Rule = ({ look }) => {
  const length = Number(look.length);
  const least = LIMITS.stillSeconds.value + LIMITS.riseSeconds.value;
  return length < least
    ? `${decimal(length)} s: three still seconds and a slow lift of two take ${least}. Film again, and start before the athlete stands still.`
    : null;
};

const lensLack: Rule = ({ details, filming }) =>
  details.view === 'front' && filming.lensHeightMm === null
    ? `the lens height (lift is known to ±\u00a0${CONSTANTS.liftModelErrorNoLens.value}° instead of ±\u00a0${CONSTANTS.liftModelError.value}°)`
    : null;

const percent = (share: number): string => `${decimal(100 * share, 0)}\u00a0%`;

/** What the set-up does not say, each with its price. */
const lacksOf = (chosen: Chosen): string[] => {
  const { details, filming, bodyHeightMm } = chosen;
  const { bare, 'belt+thigh': both } = ACHIEVED;
  const lacks = [
    filming.distanceMm === null ? 'the distance (no lift and no turn without it)' : null,
    BEFORE_SENDING['lens-height-missing'](chosen),
    filming.rodMm === null && bodyHeightMm === null
      ? `a rod or the body height (${percent(LIMITS.scaleError.value)} off the scale makes the turn ${percent(LIMITS.turnErrorByScale.value)} wrong)`
      : null,
    details.view === 'front' && filming.beltPointerMm === null
      ? `pointer lengths (one rep tells a change of turn from none beyond ${bare.toldFromNone.one}° without pointers, beyond ${both.toldFromNone.one}° with both${studiedBetween(gatesOfPractice(chosen))})`
      : null,
  ];
  return lacks.filter((lack) => lack !== null);
};

const listed = (parts: readonly string[]): string =>
  parts.length < 2 ? parts.join('') : `${parts.slice(0, -1).join(', ')} and ${parts.at(-1) ?? ''}`;

const lacking: Rule = (chosen) => {
  const lacks = lacksOf(chosen);
  return lacks.length === 0
    ? null
    : `The set-up lacks ${listed(lacks)}. Write down what you know under “3 Film” before you send: clips take it along.`;
};

const doesNotFit: Rule = ({ look, filming: { distanceMm }, bodyHeightMm }) => {
  if (distanceMm === null || bodyHeightMm === null) return null;
  const shown = (shownAlongLongEdge(distanceMm) * look.height) / Math.max(look.width, look.height);
  return shown < bodyHeightMm
    ? `From ${metres(distanceMm)} the picture is about ${metres(shown)} high ${LENS}; the athlete is ${metres(bodyHeightMm)} tall. Step back until feet and shoulders are in it.`
    : null;
};

/** What is weak about how a clip was filmed, most serious first, without its frame rate. Nothing of it blocks. */
export const filmingAdvice = (chosen: Chosen): string[] =>
  [tooNear, doesNotFit, tooCoarse, tooShort, mirrored, lacking].flatMap(
    (rule) => rule(chosen) ?? [],
  );
