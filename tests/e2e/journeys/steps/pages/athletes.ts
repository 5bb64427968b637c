import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from '../page-of-product.ts';
import { COACH } from '../people.ts';
import { heading, text } from './known-by.ts';

/** Athletes and their forms. */
export const ATHLETES: readonly PageOfProduct[] = [
  {
    name: 'the athletes',
    who: COACH,
    address: () => paths.athletes(),
    stands: text(/^\d+ athletes$/),
  },
  {
    name: 'a search that finds nobody',
    who: COACH,
    address: () => `${paths.athletes()}?q=zzz`,
    stands: text('Nobody fits'),
  },
  {
    name: 'the form for an athlete',
    who: COACH,
    address: () => paths.newAthlete(),
    stands: heading('Add an athlete'),
  },
  {
    name: 'an athlete with visits',
    who: COACH,
    address: ({ quill }) => paths.athlete(quill.athleteId),
    stands: text('Recorded by'),
  },
  {
    name: 'an athlete without consent or visit',
    who: COACH,
    address: ({ newcomerId }) => paths.athlete(newcomerId),
    stands: text('No visit yet'),
  },
  {
    name: 'the form that changes an athlete',
    who: COACH,
    address: ({ quill }) => paths.editAthlete(quill.athleteId),
    stands: (page) => page.getByLabel('Given name'),
  },
  {
    name: 'the form for a consent',
    who: COACH,
    address: ({ newcomerId }) => paths.newConsent(newcomerId),
    stands: heading('Record a consent'),
  },
  {
    name: 'the form for a visit',
    who: COACH,
    address: ({ beginner }) => paths.newVisit(beginner.athleteId),
    stands: heading('New visit'),
  },
];
