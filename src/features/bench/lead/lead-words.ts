import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Suggestion } from '../model/first-frames.ts';
import type { Tally } from '../model/led.ts';

/** `7 placed, 2 tracked and not yet looked at, 1 hidden, 3 to go`. */
export const tallyWords = ({ placed, hidden, tracked, toGo }: Tally): string => {
  const parts = [
    placed > 0 ? `${placed} placed` : toGo > 0 && tracked === 0 ? 'nothing placed' : null,
    tracked > 0 ? `${tracked} tracked and not yet looked at` : null,
    hidden > 0 ? `${hidden} hidden` : null,
    toGo > 0 ? `${toGo} to go` : null,
  ].filter((part) => part !== null);
  return parts.join(', ');
};

/** Typical random error of one such mark, whole px of the phone's picture. */
export const typicalErrorPx = (id: LandmarkId, sourceOverPicture: number): number => {
  const { errorClass } = landmark(id);
  const { anatomicalError, pointerError, randomPart, outlineFactor } = CONSTANTS;
  const px =
    errorClass === 'pointer'
      ? pointerError.value
      : anatomicalError.value * (errorClass === 'outline' ? outlineFactor.value : 1);
  return Math.max(1, Math.round(px * randomPart.value * Math.max(1, sourceOverPicture)));
};

export const whyWords = (why: Suggestion['why'], { from, to }: Gates): string => {
  switch (why) {
    case 'quiet':
      return 'both feet down: five quiet frames make the zero';
    case 'look-for-rise':
      return 'to find where the thigh rises';
    case 'near-from':
      return `near ${from}°, where the change begins to count`;
    case 'near-to':
      return `near ${to}°, where the change ends`;
    case 'between':
      return 'between the gates';
  }
};

/** `Three quiet frames`; for counts in running text. */
export const countWords = (count: number, what: string): string =>
  `${capital(inWords(count))} ${what}${count === 1 ? '' : 's'}`;
