import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { Missing } from '#shared/measures/missing.ts';

const names = (ids: readonly LandmarkId[]): string => {
  const [first] = ids;
  if (first === undefined) return '';
  // the measure beside it names the foot
  const label = landmark(first)
    .label.toLowerCase()
    .replace(/ of the support foot$/, '');
  return ids.length === 1 ? label : `${label} and ${ids.length - 1} more`;
};

/** Why a value is not there, short enough for a cell of the table. */
export const missingWords = (missing: Missing): string => {
  switch (missing.code) {
    case 'landmark-not-marked':
      return `mark ${names(missing.landmarks)}`;
    case 'landmark-hidden':
      return `hidden: ${names(missing.landmarks)}`;
    case 'no-quiet-stance':
      return 'mark three quiet frames first';
    case 'scale-missing':
      return 'give the scale';
    case 'distance-missing':
      return 'give the distance';
    case 'belt-pointer-length-missing':
      return 'give the belt pointer’s length';
    case 'thigh-pointer-length-missing':
      return 'give the thigh pointer’s length';
    case 'body-height-missing':
      return 'body height not known';
    case 'toe-direction-missing':
      return 'side of the camera not known';
    case 'view-cannot-show-it':
      return 'not seen in this view';
    case 'only-between-lifts':
      return `from ${missing.from}° to ${missing.to}° of lift`;
    case 'not-in-side-clip':
      return 'side clip not marked';
    case 'marks-coincide':
      return 'marks lie on each other';
  }
};

/** What would have to be filled in before it can be measured; the set-up holds it. */
export const isSetUp = ({ code }: Missing): boolean =>
  code === 'scale-missing' ||
  code === 'distance-missing' ||
  code === 'belt-pointer-length-missing' ||
  code === 'thigh-pointer-length-missing';
