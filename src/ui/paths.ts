import type { Side } from '#shared/contracts/primitives.ts';

/** Addresses of the pages. The route table in app and every link are made from these. */
export const paths = {
  today: () => '/',
  signIn: () => '/sign-in',
  forgot: () => '/forgot',
  reset: (token: string) => `/reset/${token}`,
  join: (token: string) => `/join/${token}`,
  start: () => '/start',
  confirmEmail: (token: string) => `/confirm-email/${token}`,
  account: () => '/account',
  athletes: () => '/athletes',
  newAthlete: () => '/athletes/new',
  athlete: (id: string) => `/athletes/${id}`,
  editAthlete: (id: string) => `/athletes/${id}/edit`,
  newConsent: (athleteId: string) => `/athletes/${athleteId}/consents/new`,
  /** A retest is filmed like an earlier visit. */
  newVisit: (athleteId: string, like?: string) =>
    `/athletes/${athleteId}/visits/new${like === undefined ? '' : `?like=${like}`}`,
  visit: (id: string) => `/visits/${id}`,
  call: (visitId: string, side: Side) => `/visits/${visitId}/sides/${side}/call`,
  reading: (visitId: string, side: Side) => `/visits/${visitId}/sides/${side}`,
  /** What a plan of this side could start from. */
  planStart: (visitId: string, side: Side) => `/visits/${visitId}/sides/${side}/plan`,
  plan: (id: string) => `/plans/${id}`,
  /** The exercises, at one of them where it is given. */
  exercises: (at?: string) => `/practice/exercises${at === undefined ? '' : `#${at}`}`,
  /** The Bench, at a frame (from 0) and a comment where they are given. */
  bench: (
    clipId: string,
    at: { frame?: number; comment?: string; comments?: boolean; again?: number } = {},
  ) => {
    const search = new URLSearchParams();
    if (at.frame !== undefined) search.set('frame', String(at.frame));
    if (at.comment !== undefined) search.set('comment', at.comment);
    // all of them, beside the clip
    if (at.comments) search.set('comment', 'all');
    // the number of a rep that is to be marked again
    if (at.again !== undefined) {
      search.set('rep', String(at.again));
      search.set('again', String(at.again));
    }
    return `/clips/${clipId}${search.size === 0 ? '' : `?${search}`}`;
  },
  /** Frames marked again without sight of the first marks. */
  secondMarking: (id: string) => `/second-markings/${id}`,
  /** What waits for a reviewer's word. */
  review: () => '/review',
  /** Two reps, sides or visits of one athlete beside each other; each end as `visit.side` or `visit.side.rep`. */
  compare: (at: { athlete?: string; first?: string; second?: string } = {}) => {
    const search = new URLSearchParams(
      Object.entries(at).filter((entry): entry is [string, string] => entry[1] !== undefined),
    );
    return `/compare${search.size === 0 ? '' : `?${search}`}`;
  },
  practice: () => '/practice',
  people: () => '/practice/people',
  consentWording: () => '/practice/consent',
  retention: () => '/practice/retention',
  audit: () => '/practice/audit',
  reliability: () => '/practice/reliability',
  protocol: () => '/practice/protocol',
  setUps: () => '/practice/set-ups',
  licences: () => '/licences',
  /** How numbers are made, at a measure or a section where it is given. */
  method: (at?: string) => (at === undefined ? '/method' : `/method#${at}`),
} as const;
