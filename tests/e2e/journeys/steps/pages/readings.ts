import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from '../page-of-product.ts';
import { COACH } from '../people.ts';
import type { Shown } from '../shown.ts';
import { heading, text } from './known-by.ts';

const reading = (
  name: string,
  said: string,
  of: Exclude<keyof Shown, 'newcomerId' | 'beginner' | 'setUpId' | 'planId' | 'links'>,
  side: 'left' | 'right',
): PageOfProduct => ({
  name: `a reading: ${name}`,
  who: COACH,
  address: (shown) => paths.reading(shown[of].visitId, side),
  stands: heading(said),
});

/** Readings and the plans that follow from them. */
export const READINGS: readonly PageOfProduct[] = [
  reading('turns out early', 'Turns out early', 'quill', 'right'),
  reading('provisional', 'Turns out early', 'brook', 'right'),
  reading('turns in on time', 'Turns in on time', 'lindgren', 'left'),
  reading('can’t tell yet', 'Can’t tell yet', 'weir', 'right'),
  reading('lift stops short', 'Lift stops short', 'fell', 'left'),
  reading('not measurable', /Not measurable/.source, 'quillAside', 'right'),
  {
    name: 'a reading before its call',
    who: COACH,
    address: ({ brook }) => paths.reading(brook.visitId, 'left'),
    stands: text('The call by eye comes before the figures'),
    says: /409/,
  },
  {
    name: 'what a plan could start from',
    who: COACH,
    address: ({ lindgren }) => paths.planStart(lindgren.visitId, 'left'),
    stands: text('What was found'),
  },
  {
    name: 'a plan that was given',
    who: COACH,
    address: ({ planId }) => paths.plan(planId),
    stands: text('given to the athlete'),
  },
  {
    name: 'a plan, an exercise being changed',
    who: COACH,
    address: ({ planId }) => paths.plan(planId),
    then: (page) =>
      page
        .getByRole('button', { name: /^Change / })
        .first()
        .click(),
    stands: text('Your own cue'),
  },
];
