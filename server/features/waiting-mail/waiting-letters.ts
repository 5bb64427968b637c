import type { WaitingMailKind } from '#shared/contracts/waiting-mail.ts';
import { type Letter, written } from '../../mail/letter.ts';

const SAYS = {
  'to-review': ['A side waits for your review', 'A coach has handed a side in for review.'],
  'sent-back': [
    'A side came back to you',
    'A reviewer has sent a side back to you, with a reason.',
  ],
  comment: ['A comment waits for you', 'Somebody has commented on a clip, or answered you.'],
  'second-marking': [
    'A second marking waits for you',
    'Somebody asks you to mark some frames again, without sight of the first marks.',
  ],
  pain: [
    'An athlete says that something hurts',
    'It was answered beside a plan of yours. Look at it before the next exercise.',
  ],
} as const satisfies Record<WaitingMailKind, readonly [subject: string, sentence: string]>;

/** Names nobody who was filmed and no finding: letters lie about. */
export const waitingLetter = (
  kind: WaitingMailKind,
  { practice, home, path }: { practice: string; home: string; path: string },
): Letter => {
  const [subject, sentence] = SAYS[kind];
  return written(
    `${subject}, ${practice}`,
    sentence,
    `Open it:\n${home}${path}`,
    `Everything that waits stands in Today:\n${home}/`,
    `To get no more letters of this kind, turn them off in your account:\n${home}/account#letters`,
  );
};
