import type { Missing } from '#shared/measures/missing.ts';
import { degrees } from '#src/ui/figures.ts';
import { VIEW_WORDS } from '#src/ui/words.ts';
import { landmarkNames } from './landmark-words.ts';

/** Why a value of the table is not there. */
export const missingWords = (missing: Missing): string => {
  switch (missing.code) {
    case 'landmark-not-marked':
      return `not marked: ${landmarkNames(missing.landmarks)}`;
    case 'landmark-hidden':
      return `cannot be seen: ${landmarkNames(missing.landmarks)}`;
    case 'no-quiet-stance':
      return 'no quiet stance to compare with';
    case 'scale-missing':
      return 'the scale is not known';
    case 'distance-missing':
      return 'the distance of the camera is not known';
    case 'belt-pointer-length-missing':
      return 'the length of the belt pointer is not known';
    case 'thigh-pointer-length-missing':
      return 'the length of the thigh pointer is not known';
    case 'body-height-missing':
      return 'the body height is not known';
    case 'toe-direction-missing':
      return 'it is not known which way the toes point';
    case 'view-cannot-show-it':
      return `not seen in this view (${VIEW_WORDS[missing.view]})`;
    case 'only-between-lifts':
      return `only given for a lift from ${degrees(missing.from, 0)} to ${degrees(missing.to, 0)}`;
    case 'not-in-side-clip':
      return 'the side clip has no marks around this moment';
    case 'marks-coincide':
      return 'marks lie on each other';
  }
};
