import type { Me } from '#shared/contracts/accounts.ts';
import type { Athlete, Consent } from '#shared/contracts/athletes.ts';
import { NO_BOUNDARIES, type Rep } from '#shared/contracts/reps.ts';
import type { FirstSteps } from '#shared/contracts/today.ts';
import type { Clip } from '#shared/contracts/clips.ts';
import {
  SAFETY_QUESTIONS,
  type SetUp,
  type Visit,
  type VisitRow,
} from '#shared/contracts/visits.ts';

/** Answers of the interface for component tests: invented people, one of each kind. */
const uuid = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
export const coachId = uuid(1);
export const otherId = uuid(2);
export const athleteId = uuid(100);
export const visitId = uuid(200);
export const clipId = uuid(300);
export const consentId = uuid(400);
export const setUpId = uuid(500);
export const repId = (n: number) => uuid(700 + n);

const coach = { id: coachId, name: 'Maren Okafor' };
const at = '2026-03-03T16:20:00Z';

export const aMe = (role: Me['user']['role'] = 'coach'): Me => ({
  user: { ...coach, email: 'coach@greywater-row.example', role },
  practice: { id: uuid(3), name: 'Greywater Row' },
  session: { id: uuid(4), expiresAt: '2026-04-03T16:20:00Z' },
  codeMissing: false,
});

/** A practice in which nothing was done yet. */
export const noSteps: FirstSteps = {
  contact: false,
  consent: false,
  clip: false,
  call: false,
  athleteId: null,
};

export const anAthlete = (change: Partial<Athlete> = {}): Athlete => ({
  id: athleteId,
  givenName: 'Ines',
  familyName: 'Marlow',
  birthDate: '2004-05-02',
  minor: false,
  heightMm: 1740,
  sport: 'hurdles',
  cautions: '',
  contactEmail: null,
  coach,
  consentedTo: ['assessment'],
  consentUntil: '2099-01-11',
  assentMissing: false,
  deletionDue: null,
  lastVisit: null,
  visitCount: 0,
  version: 1,
  createdAt: at,
  ...change,
});

export const aConsent = (change: Partial<Consent> = {}): Consent => ({
  id: consentId,
  givenBy: 'athlete',
  guardianName: null,
  guardianRelation: null,
  assent: false,
  purposes: ['assessment'],
  held: ['assessment'],
  withdrawals: [],
  wording: null,
  scan: null,
  validFrom: '2026-01-12',
  validUntil: '2099-01-11',
  how: '',
  state: 'valid',
  recordedBy: coach,
  recordedAt: at,
  withdrawnAt: null,
  ...change,
});

export const aSafety = (change: Partial<NonNullable<Visit['safety']>> = {}) => ({
  answers: Object.fromEntries(SAFETY_QUESTIONS.map((question) => [question, false])) as NonNullable<
    Visit['safety']
  >['answers'],
  chaperone: null,
  clearedBy: null,
  mayFilm: true,
  askedBy: coach,
  askedAt: at,
  ...change,
});

export const aVisit = (change: Partial<Visit> = {}): Visit => ({
  id: visitId,
  day: '2026-03-03',
  note: '',
  athlete: { id: athleteId, name: 'Ines Marlow', minor: false, heightMm: 1740 },
  coach,
  safety: null,
  filming: {
    distanceMm: null,
    lensHeightMm: null,
    rodMm: null,
    beltPointerMm: null,
    thighPointerMm: null,
  },
  setUpName: null,
  version: 1,
  ...change,
});

export const aVisitRow = (change: Partial<VisitRow> = {}): VisitRow => ({
  id: visitId,
  day: '2026-03-03',
  coach,
  clipCount: 1,
  sides: [],
  ...change,
});

export const aSetUp = (change: Partial<SetUp> = {}): SetUp => ({
  id: setUpId,
  name: 'Room 2, floor mark',
  distanceMm: 3000,
  lensHeightMm: 950,
  rodMm: 1200,
  beltPointerMm: 135,
  thighPointerMm: 125,
  lastUsed: null,
  ...change,
});

export const aClip = (change: Partial<Clip> = {}): Clip => ({
  id: clipId,
  visitId,
  name: 'IMG_2291.MOV',
  state: 'ready',
  progress: null,
  secondsLeft: null,
  preparedSeconds: null,
  refusal: null,
  trouble: null,
  view: 'front',
  cameraStood: 'front',
  supportSide: 'right',
  mirrored: false,
  bytes: 48_000_000,
  width: 1080,
  height: 1920,
  durationSeconds: 7.2,
  frameRate: { perSecond: 240, variable: false, minPerSecond: 240, maxPerSecond: 240 },
  copy: { width: 1080, height: 1920, allIntra: true, bytes: 9_000_000 },
  geometry: {
    scale: null,
    distanceMm: 3000,
    lensHeightMm: 950,
    beltPointerMm: 135,
    thighPointerMm: 125,
    plumb: null,
    floorLine: null,
    shutter: null,
  },
  mmPerPx: null,
  repCount: 0,
  uploadedBy: coach,
  uploadedAt: at,
  version: 1,
  ...change,
});

/** The rep of that number, of the clip. */
export const aRep = (n: number): Rep => ({
  id: repId(n),
  clipId,
  number: n,
  supportSide: 'right',
  view: 'front',
  startFrame: (n - 1) * 301,
  endFrame: n * 301 - 1,
  boundaries: NO_BOUNDARIES,
  excluded: null,
  excludedNote: '',
  quietFrom: null,
  liftFrom: null,
  clapFrame: null,
  tieFault: null,
  markedFrames: 30,
  version: 1,
});
