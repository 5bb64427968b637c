import type { FoundRep, NoReps } from '#shared/course/find-reps.ts';
import { landmark } from '#shared/landmarks/table.ts';
import { REFUSAL_WORDS } from '#src/tracking/errors.ts';
import { capital, decimal, inWords } from '#src/ui/figures.ts';
import type { Run, Said } from './following.ts';

export const saidWords = (said: Said): string =>
  said.is === 'snapped'
    ? `${landmark(said.landmark).label}: set to the middle of the dot. Escape keeps your touch.`
    : `${landmark(said.landmark).label}: ${REFUSAL_WORDS[said.code]}`;

/** `3 reps found: right, right and right leg.` */
export const foundWords = (found: readonly FoundRep[]): string => {
  const count = (side: FoundRep['supportSide']) =>
    found.filter(({ supportSide }) => supportSide === side).length;
  const [left, right] = [count('left'), count('right')];
  const reps = `${capital(inWords(found.length))} ${found.length === 1 ? 'rep' : 'reps'} found`;
  if (left === 0) return `${reps}, standing on the right leg.`;
  if (right === 0) return `${reps}, standing on the left leg.`;
  return `${reps}: ${inWords(left)} on the left leg, ${inWords(right)} on the right.`;
};

const seconds = (ms: number): string => `${decimal(ms / 1000)} s`;

/** Why no rep is proposed, and what to do. */
export const noRepsWords = (none: NoReps): string => {
  switch (none.code) {
    case 'ankles-not-followed':
      return `No rep was found: both ankles could be followed together for ${seconds(none.known)} only. Touch both ankles on a frame where they are clear, or name the reps by hand.`;
    case 'no-lift':
      return `No rep was found: no foot rises more than ${Math.round(none.height / 10)} cm, and a lift takes ${Math.round(none.needed / 10)} cm. Check both ankles, or name the reps by hand.`;
    case 'lifts-cut-off':
      return 'No rep was found: the clip begins or ends while a foot is up, or the ankle was lost there. Name the rep by hand, or film from both feet to both feet.';
    case 'never-still':
      return 'Feet rise, but nobody stands still before: there is no zero to measure from. Name the reps by hand, or film again and stand still for three seconds first.';
  }
};

export const runWords = (run: Extract<Run, { is: 'following' }>): string =>
  run.held ? 'Waits while you step.' : `${Math.round((100 * run.done) / Math.max(1, run.total))} %`;
