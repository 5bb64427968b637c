import type { Warning } from '#shared/reading/reasons.ts';
import { decimal, degrees, inWords, metres } from '#src/ui/figures.ts';
import { landmarkNames } from './landmark-words.ts';

/** What weakens a reading, with its figure, and what to do about it. */
export const warningWords = (warning: Warning): string => {
  switch (warning.code) {
    case 'camera-off-front':
      return `The camera stood ${degrees(warning.by, 0)} off the front; more than ${degrees(warning.limit, 0)} bends the turn. Put both heels on a line square to the camera.`;
    case 'plumb-off':
      return `The picture hangs ${degrees(warning.by)} off the plumb line; ${degrees(warning.limit, 0)} is allowed. The marks were turned back by that.`;
    case 'too-near':
      return `The camera stood ${metres(warning.distanceMm)} away; nearer than ${metres(warning.limitMm)} the picture is too steep. Stand 2.5 to 3.5 m away.`;
    case 'too-coarse':
      return `One pixel is ${decimal(warning.mmPerPx)} mm on the body; above ${decimal(warning.limit)} mm the marks are too coarse. Film nearer or in a higher resolution.`;
    case 'slow-frame-rate':
      return `${decimal(warning.framesPerSecond, 0)} frames a second; below ${decimal(warning.limit, 0)} the way from 60° to 90° has few frames. Film at 60.`;
    case 'mirrored':
      return 'The clip is mirrored, as selfie cameras make it. It was turned back; check that the support side is right.';
    case 'lens-height-missing':
      return `The height of the lens is not known: lift is uncertain by ${degrees(warning.liftHalfWidth, 0)} instead of 2°.`;
    case 'smear':
      return `${landmarkNames([warning.landmark]).replace(/^./, (first) => first.toUpperCase())} is smeared over ${decimal(warning.px)} pixels in one exposure. More light makes it sharper.`;
    case 'few-quiet-frames':
      return `${inWords(warning.have).replace(/^./, (first) => first.toUpperCase())} quiet frames are marked; ${inWords(warning.recommended)} make zero firmer.`;
    case 'assumed-thigh':
      return `The planted thigh is taken as turning little (± ${degrees(1.96 * warning.sd, 0)}), not measured.`;
    case 'tracked-not-looked-at':
      return `${warning.frames} ${warning.frames === 1 ? 'frame rests' : 'frames rest'} on tracked marks that nobody has looked at: the reading is provisional.`;
  }
};
