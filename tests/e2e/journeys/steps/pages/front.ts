import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from '../page-of-product.ts';
import { COACH, OWNER, SUPERVISOR } from '../people.ts';
import { clip, heading, text } from './known-by.ts';

/** What stands before and beside the work: the ways in, Today, the queue. */
export const FRONT: readonly PageOfProduct[] = [
  {
    name: 'the sign-in page',
    who: null,
    address: () => paths.signIn(),
    stands: heading('Sign in'),
  },
  {
    name: 'a forgotten password',
    who: null,
    address: () => paths.forgot(),
    stands: heading('Forgotten password'),
  },
  {
    name: 'a link in a letter that opens nothing',
    who: null,
    address: () => paths.reset('gone'),
    stands: heading('This link opens nothing'),
    says: /410/,
  },
  {
    name: 'a new practice',
    who: null,
    address: () => paths.start(),
    stands: heading('Start a practice'),
  },
  {
    name: 'one’s own account',
    who: COACH,
    address: () => paths.account(),
    stands: text('this one'),
  },
  {
    name: 'the people of a practice',
    who: OWNER,
    address: () => paths.people(),
    stands: text('In the practice'),
  },
  {
    name: 'Today of a coach',
    who: COACH,
    address: () => paths.today(),
    stands: text(/things wait for you/),
  },
  {
    name: 'Today of a supervisor',
    who: SUPERVISOR,
    address: () => paths.today(),
    stands: text(/wait/),
  },
  {
    name: 'the review queue',
    who: SUPERVISOR,
    address: () => paths.review(),
    stands: text('Reading and sign-off'),
  },
  {
    name: 'a comparison of two reps',
    who: COACH,
    address: ({ quill }) =>
      paths.compare({ first: `${quill.visitId}.right`, second: `${quill.visitId}.right` }),
    stands: (page) => clip(page).first(),
  },
  {
    name: 'a comparison of nobody yet',
    who: COACH,
    address: () => paths.compare(),
    stands: text('Choose an athlete first'),
  },
  {
    name: 'a page that does not exist',
    who: COACH,
    address: () => '/nowhere',
    stands: heading('Nothing here'),
  },
];
