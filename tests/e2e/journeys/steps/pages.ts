import type { Page } from '@playwright/test';
import { paths } from '#src/ui/paths.ts';
import { CODES } from './code-pages.ts';
import type { PageOfProduct } from './page-of-product.ts';
import { COACH, OWNER, SUPERVISOR } from './people.ts';
import type { Shown } from './shown.ts';

const heading = (name: string | RegExp) => (page: Page) =>
  page.getByRole('heading', { level: 1, name });
const text = (words: string | RegExp) => (page: Page) => page.getByText(words).first();
const clip = (page: Page) => page.locator('canvas[data-frame]');
const pathOf = (link: string) => new URL(link).pathname;

const FRONT: readonly PageOfProduct[] = [
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
    stands: clip,
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

const ATHLETES: readonly PageOfProduct[] = [
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

const VISITS: readonly PageOfProduct[] = [
  {
    name: 'a visit with everything',
    who: COACH,
    address: ({ quill }) => paths.visit(quill.visitId),
    stands: text('Open the Bench'),
  },
  {
    name: 'a visit with the safety check still to do',
    who: COACH,
    address: ({ beginner }) => paths.visit(beginner.visitId),
    stands: (page) => page.getByRole('button', { name: 'Record the safety check' }),
  },
  {
    name: 'a visit whose clips were refused',
    who: COACH,
    address: ({ refused }) => paths.visit(refused.visitId),
    stands: text('refused'),
  },
  {
    name: 'the call by eye',
    who: COACH,
    address: ({ brook }) => paths.call(brook.visitId, 'left'),
    stands: (page) => page.getByRole('button', { name: 'Save the call' }),
  },
  {
    name: 'the Bench',
    who: COACH,
    address: ({ quill }) => paths.bench(quill.clipId),
    stands: clip,
  },
  {
    name: 'the Bench with a box around the head',
    who: COACH,
    address: ({ quill }) => paths.bench(quill.clipId),
    stands: (page) => page.getByRole('button', { name: /^Box around the head/ }),
    then: async (page) => {
      await page.getByRole('button', { name: 'Head', exact: true }).click();
      await page.getByRole('button', { name: /^Put a box on frame/ }).click();
    },
  },
  {
    name: 'the Bench before the call by eye',
    who: COACH,
    address: ({ brook }) => `${paths.bench(brook.clipId)}?rep=4`,
    stands: clip,
  },
  {
    name: 'the Bench of a refused clip',
    who: COACH,
    address: ({ refused }) => paths.bench(refused.clipId),
    stands: text('This clip was refused'),
  },
];

const reading = (
  name: string,
  said: string,
  of: Exclude<keyof Shown, 'newcomerId' | 'beginner' | 'setUpId' | 'links'>,
  side: 'left' | 'right',
): PageOfProduct => ({
  name: `a reading: ${name}`,
  who: COACH,
  address: (shown) => paths.reading(shown[of].visitId, side),
  stands: heading(said),
});

const READINGS: readonly PageOfProduct[] = [
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
    address: ({ lindgren }) => paths.planStart(lindgren.visitId, 'right'),
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

const REPLAYS: readonly PageOfProduct[] = [
  {
    name: 'a replay',
    who: null,
    address: ({ links }) => pathOf(links.open),
    stands: heading('Your right hip turns out early'),
  },
  {
    name: 'a replay with a plan, the answer about pain open',
    who: null,
    address: ({ links }) => pathOf(links.open),
    then: async (page) => {
      await page.getByRole('button', { name: 'Say how it feels' }).click();
      await page.getByRole('button', { name: '6', exact: true }).click();
    },
    stands: text('Where? Tap all that hurt.'),
  },
  {
    name: 'a replay behind a pass phrase',
    who: null,
    address: ({ links }) => pathOf(links.locked),
    stands: heading('Your replay asks for a pass phrase'),
    says: /401/,
  },
  {
    name: 'a replay that was ended',
    who: null,
    address: ({ links }) => pathOf(links.ended),
    stands: heading('This link no longer opens anything'),
    says: /404/,
  },
];

/** Every page of the product, in the order of the job. */
export const PAGES: readonly PageOfProduct[] = [
  ...FRONT,
  ...CODES,
  ...ATHLETES,
  ...VISITS,
  ...READINGS,
  ...REPLAYS,
];
