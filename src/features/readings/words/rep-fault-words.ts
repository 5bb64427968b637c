import type { RepFault } from '#shared/reading/reasons.ts';
import { inWords } from '#src/ui/figures.ts';
import { VIEW_WORDS } from '#src/ui/words.ts';
import { EXCLUSION_WORDS } from './exclusion-words.ts';
import { landmarkNames, SET_WORDS } from './landmark-words.ts';
import { liftRange } from './settle-words.ts';

const frames = (count: number): string => `${inWords(count)} ${count === 1 ? 'frame' : 'frames'}`;

/** Why a rep does not count, as the end of 'rep 4 left out: …'. */
export const repFaultWords = (fault: RepFault): string => {
  switch (fault.code) {
    case 'excluded':
      return EXCLUSION_WORDS[fault.reason];
    case 'bad-timestamps':
      return `the times of its frames do not rise at place ${fault.fault.at + 1}`;
    case 'marks-implausible':
      return `marks that cannot be right: ${landmarkNames(fault.landmarks)}`;
    case 'no-frames':
      return 'no frame of it is marked';
    case 'other-side':
      return 'it stands on the other leg';
    case 'view-cannot-show-turn':
      return `the turn cannot be measured in this view (${VIEW_WORDS[fault.view]})`;
    case 'scale-missing':
      return 'its clip has no scale';
    case 'distance-missing':
      return 'the distance of the camera is not known';
    case 'belt-pointer-length-missing':
      return 'the length of the belt pointer is not known';
    case 'thigh-pointer-length-missing':
      return 'the length of the thigh pointer is not known';
    case 'landmarks-missing':
      return `not marked: ${landmarkNames(fault.landmarks)}`;
    case 'no-foot-off':
      return 'no frame shows where the foot leaves the floor after a quiet stance';
    case 'few-quiet':
      return `${frames(fault.have)} of the quiet stance marked, ${inWords(fault.need)} needed`;
    case 'few-near-60':
    case 'few-near-90':
    case 'few-across-window':
      return `${frames(fault.have)} marked with a lift ${liftRange(fault.from ?? 0, fault.to ?? 180)}, ${inWords(fault.need)} needed`;
    case 'few-in-rise':
      return `${frames(fault.have)} of the rise marked, ${inWords(fault.need)} needed`;
    case 'marks-coincide':
      return 'marks lie on each other where they should be apart';
    case 'poorer-set':
      return `it carries only ${SET_WORDS[fault.set]}; the others carry more`;
  }
};

/** Faults beside which no other matters: more marks would not help. */
const DECISIVE: ReadonlySet<RepFault['code']> = new Set([
  'excluded',
  'other-side',
  'view-cannot-show-turn',
  'no-frames',
]);

/** The faults worth saying: one that decides stands alone. */
export const faultsToSay = (faults: readonly RepFault[]): readonly RepFault[] => {
  const decisive = faults.find(({ code }) => DECISIVE.has(code));
  return decisive ? [decisive] : faults;
};
