import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { type RouteName, routes } from '#shared/contracts/routes.ts';

/** What the `:id` of a route names. A route that is missing here fails the type check. */
export const NAMES: Record<RouteNameWithId, keyof Ids> = {
  endSession: 'session',
  withdrawInvitation: 'invitation',
  changePerson: 'person',
  deactivatePerson: 'person',
  reactivatePerson: 'person',
  resetCodes: 'person',
  handOver: 'person',
  athlete: 'athlete',
  editAthlete: 'athlete',
  listConsents: 'athlete',
  recordConsent: 'athlete',
  withdrawConsent: 'consent',
  withdrawPurposes: 'athlete',
  addConsentScan: 'consent',
  consentScan: 'consent',
  deleteConsentScan: 'consent',
  eraseAthlete: 'athlete',
  exportAthlete: 'athlete',
  listVisits: 'athlete',
  addVisit: 'athlete',
  visit: 'visit',
  editVisit: 'visit',
  answerSafety: 'visit',
  deleteSetUp: 'setUp',
  uploadClip: 'visit',
  openUpload: 'visit',
  cancelUpload: 'upload',
  clip: 'clip',
  editClip: 'clip',
  deleteClip: 'clip',
  usePart: 'clip',
  prepareAgain: 'clip',
  clipVideo: 'clip',
  clipPoster: 'clip',
  clipStrip: 'clip',
  clipSheet: 'clip',
  clipFrame: 'clip',
  listReps: 'clip',
  addRep: 'clip',
  editRep: 'rep',
  deleteRep: 'rep',
  listMarks: 'rep',
  saveMarks: 'rep',
  listSecondMarkings: 'rep',
  startSecondMarking: 'rep',
  secondMarking: 'secondMarking',
  saveSecondMarks: 'secondMarking',
  finishSecondMarking: 'secondMarking',
  discardSecondMarking: 'secondMarking',
  bench: 'clip',
  sayHere: 'clip',
  listCalls: 'visit',
  recordCall: 'visit',
  sideReading: 'visit',
  sideReview: 'visit',
  handIn: 'visit',
  decideReview: 'visit',
  setAssumption: 'visit',
  renewReading: 'visit',
  planStart: 'visit',
  makePlan: 'visit',
  listPlans: 'athlete',
  plan: 'plan',
  givePlan: 'plan',
  stopPlan: 'plan',
  seePain: 'plan',
  editPlan: 'plan',
  planAgain: 'planToChange',
  listComments: 'clip',
  addComment: 'clip',
  editComment: 'comment',
  deleteComment: 'comment',
  sendReplay: 'replay',
  revokeReplay: 'replay',
  hideHeadAgain: 'replay',
  makeFilm: 'replay',
  keptFilm: 'replay',
  listReports: 'visit',
  makeReport: 'visit',
  makeReportAgain: 'failedReport',
  reportFile: 'report',
  repFrames: 'rep',
  visitFrames: 'visit',
  repAnnotations: 'rep',
  visitAnnotations: 'visit',
  clipComments: 'clip',
  head: 'clip',
  saveHead: 'clip',
  lookedAtHead: 'clip',
};
export type RouteNameWithId = {
  [N in RouteName]: (typeof routes)[N] extends { path: `${string}:id${string}` } ? N : never;
}[RouteName];

/** Of nobody. */
const NO_CALL = '00000000-0000-4000-8000-000000000000';

/** Bodies that would do something if the thing could be seen. */
export const BODIES: Partial<Record<RouteName, object>> = {
  invite: { email: 'new@test.example', role: 'coach' },
  setRetention: { keepMonths: 24, withdrawalDays: 30 },
  changePractice: { name: 'Test Practice', contact: '' },
  setOwnersCode: { needed: false },
  changeProtocol: { after: 1, values: STANDARD_PROTOCOL, note: 'As it is.' },
  changeConsentWording: {
    after: 1,
    texts: {
      intro: 'What this is about.',
      assessment: 'What is filmed.',
      supervision: 'Who looks at it.',
      teaching: 'Who learns from it.',
      'sharing-by-link': 'Who gets a link.',
      minors: 'Who signs for a child.',
      withdrawal: 'How to end it.',
    },
    note: 'As it is.',
  },
  addSetUp: {
    name: 'The hall',
    distanceMm: 3000,
    lensHeightMm: 1000,
    rodMm: null,
    beltPointerMm: null,
    thighPointerMm: null,
  },
  addAthlete: { givenName: 'Wren', familyName: 'Alder', birthDate: '1999-04-01' },
  editAthlete: { version: 1, sport: 'x' },
  recordConsent: { givenBy: 'athlete', purposes: ['assessment'], validUntil: '2999-01-01' },
  eraseAthlete: { name: 'x' },
  withdrawPurposes: { purposes: ['teaching'] },
  changePerson: { role: 'coach' },
  handOver: { to: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01' },
  editVisit: { version: 1, note: 'x' },
  answerSafety: {
    answers: {
      'pain-today': false,
      'hip-replacement-or-limits': false,
      'weight-bearing-limits': false,
      'recent-surgery-or-fracture': false,
      'falls-or-poor-balance': false,
      'vertigo-or-dizziness': false,
      'nerve-symptoms': false,
      'confidential-any': false,
    },
    supportWithinReach: true,
    knowsWhenToStop: true,
  },
  openUpload: { name: 'a.mp4', bytes: 10, view: 'front' },
  editClip: { version: 1, mirrored: true },
  addRep: { supportSide: 'left', startFrame: 0, endFrame: 10 },
  editRep: { version: 1, excludedNote: 'x' },
  saveMarks: {
    commands: [
      {
        id: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01',
        frame: 1,
        landmark: 'asis-support',
        baseRevision: 0,
        set: { to: 'hidden' },
      },
    ],
  },
  saveSecondMarks: {
    commands: [
      {
        id: '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c02',
        frame: 1,
        landmark: 'asis-support',
        baseRevision: 0,
        set: { to: 'hidden' },
      },
    ],
  },
  recordCall: { seen: 'early', confidence: 'sure' },
  setAssumption: { on: true },
  makePlan: { from: 'call' },
  givePlan: { version: 1 },
  editPlan: { version: 1, note: 'x' },
  planAgain: { version: 1, from: 'call' },
  addComment: { body: 'x', fromFrame: 0, toFrame: 0 },
  editComment: { body: 'x' },
  setWaitingMail: { kind: 'comment', on: false },
  handIn: { about: { kind: 'call', id: NO_CALL } },
  decideReview: { verdict: 'sign-off', about: { kind: 'call', id: NO_CALL } },
  sendReplay: { token: 'a'.repeat(43), email: 'wren@test.example' },
  sayHere: { here: true },
  saveHead: {
    after: 0,
    fromFrame: 0,
    toFrame: 10,
    drawn: [{ frame: 1, box: { left: 10, top: 10, width: 100, height: 100 } }],
    followed: [],
  },
  lookedAtHead: { version: 1 },
};

/** A thing of each kind that a route can name. */
export type Ids = Record<
  | 'session'
  | 'invitation'
  | 'person'
  | 'athlete'
  | 'consent'
  | 'visit'
  | 'setUp'
  | 'upload'
  | 'clip'
  | 'rep'
  | 'secondMarking'
  | 'comment'
  | 'plan'
  | 'planToChange'
  | 'report'
  | 'failedReport'
  | 'replay',
  string
>;

/** Ending a session that is not one's own does nothing and says nothing. */
export const SILENT: ReadonlySet<RouteNameWithId> = new Set(['endSession']);

/** The address of a route for the thing it names; of a visit its right side, of a clip its first frame. */
export const addressOf = (name: RouteNameWithId, ids: Ids): string =>
  routes[name].path
    .replace(':id', ids[NAMES[name]])
    .replace(':side', 'right')
    .replace(':index', '0');

/** What a link may add; of a link that opens nothing it is not even looked at. */
export const LINK_BODIES: Partial<Record<RouteName, object>> = {
  unlockReplay: { passPhrase: 'heron reed' },
  tickExercise: { exercise: 'foot-tripod', day: '2026-03-03', done: true },
  answerPain: {
    day: '2026-03-03',
    level: 4,
    places: ['knee'],
    which: 'left',
    time: null,
    exercise: null,
  },
};
