import { paths } from '#src/ui/paths.ts';
import type { PageOfProduct } from '../page-of-product.ts';
import { COACH, OWNER, SUPERVISOR } from '../people.ts';
import { heading, text } from './known-by.ts';

/** What the practice has set, and what Redshank says of itself. */
export const PRACTICE: readonly PageOfProduct[] = [
  {
    name: 'the method',
    who: COACH,
    address: () => paths.method(),
    stands: heading(/./),
  },
  {
    name: 'the licences',
    who: COACH,
    address: () => paths.licences(),
    stands: heading('Licences'),
  },
  {
    name: 'the practice, to read',
    who: COACH,
    address: () => paths.practice(),
    stands: text('Saved ways of filming'),
  },
  {
    name: 'the practice, to change',
    who: OWNER,
    address: () => paths.practice(),
    stands: (page) => page.getByLabel(/^How athletes reach you/),
  },
  {
    name: 'the audit trail',
    who: OWNER,
    address: () => paths.audit(),
    stands: text(/^\d+ entries$/),
  },
  {
    name: 'the audit trail, where nothing fits',
    who: OWNER,
    address: () => `${paths.audit()}?to=2020-01-01`,
    stands: text('No entry fits'),
  },
  {
    name: 'the reliability of a practice',
    who: SUPERVISOR,
    address: () => paths.reliability(),
    stands: text('Calls by eye'),
  },
  {
    name: 'the protocol, to read',
    who: COACH,
    address: () => paths.protocol(),
    stands: text('holds now'),
  },
  {
    name: 'the protocol, to change',
    who: OWNER,
    address: () => paths.protocol(),
    stands: (page) => page.getByLabel('Lower gate', { exact: true }),
  },
  {
    name: 'the consent wording, to change',
    who: OWNER,
    address: () => paths.consentWording(),
    stands: (page) => page.getByLabel('To everybody', { exact: true }),
  },
  {
    name: 'the retention',
    who: OWNER,
    address: () => paths.retention(),
    stands: text('Nobody was erased yet.'),
  },
  {
    name: 'the set-ups',
    who: COACH,
    address: () => paths.setUps(),
    stands: text('not used yet'),
  },
  {
    name: 'the exercises',
    who: COACH,
    address: () => paths.exercises(),
    stands: heading('Exercises'),
  },
];
