import { DEMO_ACCOUNTS, PENNYWORT } from './accounts.ts';
import type { AthleteStory, PracticeStory } from './story.ts';

/** The caseload of Tilda Marsh: nothing of it is seen from Greywater Row. */
const ATHLETES: readonly AthleteStory[] = [
  {
    givenName: 'Ash',
    familyName: 'Calder',
    age: 61,
    heightMm: 1740,
    sport: 'Orienteering',
    consent: { purposes: ['assessment', 'sharing-by-link'], daysLeft: 200 },
    visits: [
      {
        daysAgo: 8,
        clips: [
          {
            name: 'first-test.webm',
            source: {
              rendered: 'bare-still',
              supportSide: 'right',
              named: [0, 1],
              marked: [],
              seed: 1,
              spreadPx: 3,
            },
          },
        ],
        calls: [],
      },
    ],
  },
];

export const PENNYWORT_STORY: PracticeStory = {
  id: PENNYWORT,
  name: 'Pennywort Mill',
  contact: 'Pennywort Mill, office: 0555 0187',
  coach: DEMO_ACCOUNTS.foreignCoach,
  supervisor: null,
  owner: null,
  athletes: ATHLETES,
};
