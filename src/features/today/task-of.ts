import type { Waiting } from '#shared/contracts/today.ts';
import { distance, moment } from '#src/ui/days.ts';
import { inWords } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { PAIN_PLACE_WORDS } from '#src/ui/pain-words.ts';
import { reviewClipPath, reviewDetail, reviewTitle } from '#src/ui/review-words.ts';
import { supportWords } from '#src/ui/words.ts';

export type TaskGroup =
  | 'pain'
  | 'retest'
  | 'review'
  | 'back'
  | 'sides'
  | 'call'
  | 'mark'
  | 'again'
  | 'answer'
  | 'film'
  | 'retry'
  | 'prepare'
  | 'lapse';

/** One row of Today: what waits, when it came or ends, and the exact place that opens. */
export type Task = {
  key: string;
  group: TaskGroup;
  title: string;
  detail: string;
  when: string;
  action: { label: string; to: string };
  /** 0–100 while something runs; null where it is not known. Left out where nothing runs. */
  progress?: number | null;
};

const sideOf = (side: 'left' | 'right' | null) =>
  side === null ? 'both sides' : supportWords(side);
const repOf = (number: number | null) => (number === null ? '' : `, rep ${number}`);
/** Comments can be long: the row shows enough to know which one it is. */
const opening = (text: string) =>
  text.length > 72 ? `${text.slice(0, 72).replace(/[\s,;:]+\S*$/, '')} …` : text;

export function taskOf(item: Waiting): Task {
  const who = item.athlete.name;
  switch (item.kind) {
    case 'call-missing':
      return {
        key: `call ${item.visitId} ${item.side}`,
        group: 'call',
        title: `${who}, ${sideOf(item.side)}`,
        detail: 'Say what you saw before any figure is shown.',
        when: `filmed ${moment(item.at)}`,
        action: { label: 'Make the call', to: paths.call(item.visitId, item.side) },
      };
    case 'rep-unmarked':
      return {
        key: `mark ${item.clipId} ${item.repNumber ?? ''}`,
        group: 'mark',
        title: `${who}, ${sideOf(item.side)}${repOf(item.repNumber)}`,
        detail:
          item.repNumber === null ? 'Name the reps, then mark them.' : 'No frame is marked yet.',
        when: `filmed ${moment(item.at)}`,
        action: { label: 'Mark it', to: paths.bench(item.clipId) },
      };
    case 'clip-preparing':
      return {
        key: `prepare ${item.clipId}`,
        group: 'prepare',
        title: `${who}, ${item.name}`,
        detail:
          item.progress === null
            ? 'Waits for its turn.'
            : `Being prepared, ${Math.round(item.progress)} %.`,
        when: `sent ${moment(item.at)}`,
        action: { label: 'Open the visit', to: `${paths.visit(item.visitId)}#clip-${item.clipId}` },
        progress: item.progress,
      };
    case 'clip-refused':
      return {
        key: `film ${item.clipId}`,
        group: 'film',
        title: `${who}, ${item.name}`,
        detail: item.sentence,
        when: `sent ${moment(item.at)}`,
        action: { label: 'Open the visit', to: `${paths.visit(item.visitId)}#clip-${item.clipId}` },
      };
    case 'clip-held':
      return {
        key: `retry ${item.clipId}`,
        group: 'retry',
        title: `${who}, ${item.name}`,
        detail: item.sentence,
        when: `sent ${moment(item.at)}`,
        action: { label: 'Try again', to: `${paths.visit(item.visitId)}#clip-${item.clipId}` },
      };
    case 'reading-ready':
      return {
        key: `review ${item.visitId} ${item.side}`,
        group: 'review',
        title: `${who}, ${sideOf(item.side)}`,
        detail: `“${item.label}”${item.signedOff ? ', signed off: make the replay or the plan.' : ''}`,
        when: moment(item.at),
        action: { label: 'Open the reading', to: paths.reading(item.visitId, item.side) },
      };
    case 'to-review': {
      const { visitId, side } = item;
      return {
        key: `to-review ${visitId} ${side}`,
        group: 'sides',
        title: reviewTitle(item),
        detail: reviewDetail(item),
        when: `since ${moment(item.at)}`,
        action: {
          label: 'Review',
          to: reviewClipPath(item) ?? `${paths.reading(visitId, side)}#sign-off`,
        },
      };
    }
    case 'sent-back':
      return {
        key: `back ${item.visitId} ${item.side}`,
        group: 'back',
        title: `${who}, ${sideOf(item.side)}`,
        detail: `${item.by.name}: “${opening(item.reason)}”`,
        when: moment(item.at),
        action: {
          label: 'Mend it',
          to: `${paths.reading(item.visitId, item.side)}#sign-off`,
        },
      };
    case 'comment-open':
      return {
        key: `answer ${item.commentId}`,
        group: 'answer',
        title: `${item.by.name}: “${opening(item.body)}”`,
        detail: `${who}, frame ${item.frame}.`,
        when: moment(item.at),
        action: {
          label: 'Answer',
          to: paths.bench(item.clipId, { frame: item.frame, comment: item.commentId }),
        },
      };
    case 'second-marking-asked': {
      const frames = `${inWords(item.frames)} ${item.frames === 1 ? 'frame' : 'frames'}`;
      return {
        key: `again ${item.secondMarkingId}`,
        group: 'again',
        title: `${who}, ${sideOf(item.side)}${repOf(item.repNumber)}`,
        detail: item.mine
          ? `Begun by you: ${frames} to mark again, without sight of the first marks.`
          : `${item.askedBy.name} asks you to mark ${frames} again, without sight of the first marks.`,
        when: `asked ${moment(item.at)}`,
        action: { label: 'Mark again', to: paths.secondMarking(item.secondMarkingId) },
      };
    }
    case 'pain-reported':
      return {
        key: `pain ${item.planId}`,
        group: 'pain',
        title: `${who}, ${sideOf(item.side)}`,
        detail: `It hurts, ${item.level} of 10: ${item.places.map((place) => PAIN_PLACE_WORDS[place]).join(', ')}.`,
        when: `said ${moment(item.at)}`,
        action: { label: 'Look at it', to: `${paths.plan(item.planId)}#pain` },
      };
    case 'retest-due':
      return {
        key: `retest ${item.planId}`,
        group: 'retest',
        title: `${who}, ${sideOf(item.side)}`,
        detail: 'Film again with the same set-up.',
        when: distance(item.due),
        action: { label: 'Open the plan', to: paths.plan(item.planId) },
      };
    case 'deletion-due':
      return {
        key: `delete ${item.athlete.id}`,
        group: 'lapse',
        title: `Deletion of ${who}`,
        detail: 'Filming was withdrawn: clips are closed. Only a new consent takes it back.',
        when: distance(item.due),
        action: { label: 'Open the consent', to: `${paths.athlete(item.athlete.id)}#consent` },
      };
    case 'consent-lapses':
      return {
        key: `lapse ${item.athlete.id}`,
        group: 'lapse',
        title: `Consent of ${who}`,
        detail: 'No filming after that day.',
        when: distance(item.until),
        action: { label: 'Ask again', to: paths.newConsent(item.athlete.id) },
      };
    case 'link-lapses':
      return {
        key: `lapse ${item.replayId}`,
        group: 'lapse',
        title: `Replay link of ${who}`,
        detail: 'Make a new one, or let it lapse.',
        when: distance(item.expiresAt.slice(0, 10)),
        action: {
          label: 'Open the links',
          to: `${paths.reading(item.visitId, item.side)}#replay`,
        },
      };
  }
}
