import type { Warning } from '#shared/reading/reasons.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { FILMING_LIMITS as LIMITS } from '#shared/measures/filming-limits.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { capital, decimal, degrees, inWords, metres } from '#src/ui/figures.ts';
import { gateRange, outOfHundred } from '#src/ui/gate-words.ts';
import { landmarkNames } from './landmark-words.ts';

const distances = `${decimal(LIMITS.bestFromMm.value / 1000)} to ${decimal(LIMITS.bestToMm.value / 1000)} m`;

/** What weakens a reading, with its figure, and what to do about it. */
export const warningWords = (warning: Warning): string => {
  switch (warning.code) {
    case 'camera-off-front':
      return `The camera stood ${degrees(Math.abs(warning.by), 0)} off the front; more than ${degrees(warning.limit, 0)} bends the turn. Put both heels on a line square to the camera.`;
    case 'plumb-off':
      return `The picture hangs ${degrees(Math.abs(warning.by))} off the plumb line; ${degrees(warning.limit, 0)} is allowed. The marks were turned back by that; set the phone up straight next time.`;
    case 'too-near':
      return `The camera stood ${metres(warning.distanceMm)} away; nearer than ${metres(warning.limitMm)} the picture is too steep. Stand ${distances} away.`;
    case 'too-coarse':
      return `One pixel is ${decimal(warning.mmPerPx)} mm on the body; above ${decimal(warning.limit)} mm the marks are too coarse. Film nearer or in a higher resolution.`;
    case 'slow-frame-rate':
      return `${decimal(warning.framesPerSecond, 0)} frames a second; below ${decimal(warning.limit, 0)} the way from gate to gate has few frames. Film at ${LIMITS.goodFramesPerSecond.value}.`;
    case 'mirrored':
      return 'The clip is mirrored, as selfie cameras make it. It was turned back; check that the support side is right.';
    case 'lens-height-missing':
      return `The height of the lens is not known: lift is uncertain by ${degrees(warning.liftHalfWidth, 0)} instead of ${degrees(CONSTANTS.liftModelError.value, 0)}. Measure it from the floor and write it into the set-up.`;
    case 'smear':
      return `${warning.landmark === null ? 'A dot' : capital(landmarkNames([warning.landmark]))} is smeared over ${decimal(warning.px)} pixels in one exposure; more than ${decimal(warning.limit, 0)} hides where its middle is. More light, or a shorter shutter, makes it sharper.`;
    case 'few-quiet-frames':
      return `${capital(inWords(warning.have))} quiet frames are marked; ${inWords(warning.recommended)} make zero firmer.`;
    case 'assumed-thigh':
      return `The planted thigh is taken as turning little (± ${degrees(1.96 * warning.sd, 0)}), not measured.`;
    case 'gates-not-studied':
      return `The turn is read from ${gateRange(warning)} of lift. The errors that Redshank assumes, and how well it finds an early turn, were worked out for ${gateRange(STANDARD_GATES)} only: take the ± and the probability here as a guide.`;
    case 'limit-lowered':
      return `This protocol is content with ${outOfHundred(warning.limit)} in 100 where the study asked for ${outOfHundred(warning.studied)}: more readings are wrong.`;
    case 'tracked-not-looked-at':
      return `${warning.frames} ${warning.frames === 1 ? 'frame rests' : 'frames rest'} on tracked marks that nobody has looked at: the reading is provisional.`;
  }
};
