import type { WordingTexts } from '#shared/contracts/consents.ts';
import { PURPOSE_WORDS } from '#src/ui/words.ts';

/** The parts of a wording, in the order in which they are read out. */
export const PASSAGES: readonly {
  readonly key: keyof WordingTexts;
  readonly label: string;
  readonly hint: string;
}[] = [
  {
    key: 'intro',
    label: 'To everybody',
    hint: 'What is filmed, and that each yes can be taken back.',
  },
  {
    key: 'assessment',
    label: PURPOSE_WORDS.assessment,
    hint: 'Who keeps the clips and who looks at them.',
  },
  {
    key: 'supervision',
    label: PURPOSE_WORDS.supervision,
    hint: 'Who else looks at clips, marks and readings.',
  },
  { key: 'teaching', label: PURPOSE_WORDS.teaching, hint: 'To whom it is shown, and how.' },
  {
    key: 'sharing-by-link',
    label: PURPOSE_WORDS['sharing-by-link'],
    hint: 'What the link shows, and to whom.',
  },
  {
    key: 'minors',
    label: 'Where the athlete is under 18',
    hint: 'Guardian and the child’s own yes.',
  },
  {
    key: 'withdrawal',
    label: 'How it is taken back',
    hint: 'Whom to tell, what stops at once, and when all is deleted.',
  },
];

/** Which parts differ between two versions, by their names. */
export const changedPassages = (before: WordingTexts, after: WordingTexts): string[] =>
  PASSAGES.filter(({ key }) => before[key].trim() !== after[key].trim()).map(({ label }) => label);
