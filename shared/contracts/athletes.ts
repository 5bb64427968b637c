import * as z from 'zod';
import {
  day,
  email,
  id,
  millimetres,
  moment,
  pageOf,
  pageQuery,
  personRef,
  text,
  version,
} from './primitives.ts';
import { consentScan, purpose, wordingRef } from './consents.ts';
import { bytes, json, route } from './route.ts';

const athleteFields = {
  givenName: text(80),
  familyName: text(80),
  birthDate: day.refine(
    (value) => value <= new Date().toISOString().slice(0, 10) && value > '1900',
    {
      message: 'Write a date of birth in the past.',
    },
  ),
  /** Standing body height; gives the scale where no rod stands in the picture. */
  heightMm: millimetres(700, 2400).nullable().default(null),
  sport: text(80, 0).default(''),
  /** Shown wherever exercises or filming are planned. */
  cautions: text(1000, 0).default(''),
  contactEmail: email.nullable().default(null),
};

export const athleteBody = z.object(athleteFields).meta({ id: 'AthleteBody' });
export const athleteEdit = z
  .object({
    ...athleteFields,
    heightMm: millimetres(700, 2400).nullable(),
    sport: text(80, 0),
    cautions: text(1000, 0),
    contactEmail: email.nullable(),
    version,
  })
  .partial()
  .required({ version: true })
  .meta({ id: 'AthleteEdit' });

export const consentBody = z
  .object({
    givenBy: z.enum(['athlete', 'guardian']),
    /** The guardian's name; null where the athlete gave it. */
    guardianName: text(160).nullable().default(null),
    guardianRelation: text(80).nullable().default(null),
    /** A minor's own yes, beside the guardian's. */
    assent: z.boolean().default(false),
    purposes: z.array(purpose).min(1, 'Choose at least one purpose.').max(4),
    validUntil: day,
    /** The wording that was read out or shown; null: not known. */
    wordingId: id.nullable().default(null),
    /** How it was given, for a later reader: on paper, on the tablet … */
    how: text(200, 0).default(''),
  })
  .refine((value) => value.givenBy !== 'guardian' || value.guardianName !== null, {
    path: ['guardianName'],
    message: 'Write who gave the consent.',
  })
  .refine((value) => value.purposes.includes('assessment'), {
    path: ['purposes'],
    message: 'Without consent to filming and assessment there is nothing to record.',
  })
  .meta({ id: 'ConsentBody' });
export const NO_ASSENT = 'Without the athlete’s own yes nothing is recorded and nothing is filmed.';
/** What the form of a minor asks for beside the rest; whether the athlete is one the server looks up itself. */
export const minorsConsentBody = consentBody.refine(({ assent }) => assent, {
  path: ['assent'],
  message: NO_ASSENT,
});

export const consentState = z.enum(['valid', 'lapsed', 'withdrawn', 'assent-missing']).meta({
  id: 'ConsentState',
  description:
    'assent-missing: a guardian’s for a minor whose own yes was not recorded; it does not count.',
});
export const consent = z
  .object({
    id,
    givenBy: z.enum(['athlete', 'guardian']),
    guardianName: z.string().nullable(),
    guardianRelation: z.string().nullable(),
    assent: z.boolean(),
    purposes: z.array(purpose),
    /** What of it still holds. */
    held: z.array(purpose),
    withdrawals: z.array(z.object({ purpose, at: moment })),
    wording: wordingRef.nullable(),
    scan: consentScan.nullable(),
    validFrom: day,
    validUntil: day,
    how: z.string(),
    state: consentState,
    recordedBy: personRef,
    recordedAt: moment,
    withdrawnAt: moment.nullable(),
  })
  .meta({ id: 'Consent' });
export type Consent = z.infer<typeof consent>;

export const athlete = z
  .object({
    id,
    givenName: z.string(),
    familyName: z.string(),
    birthDate: day,
    minor: z.boolean(),
    heightMm: z.number().nullable(),
    sport: z.string(),
    cautions: z.string(),
    contactEmail: z.string().nullable(),
    coach: personRef,
    /** What the valid consents together allow today; empty where there is none. */
    consentedTo: z.array(purpose),
    consentUntil: day.nullable(),
    /** A minor's own yes is all that their consent to filming lacks. */
    assentMissing: z.boolean(),
    /** The consent to filming was withdrawn: clips are closed, and all is deleted on this day. */
    deletionDue: day.nullable(),
    lastVisit: day.nullable(),
    visitCount: z.int(),
    version,
    createdAt: moment,
  })
  .meta({ id: 'Athlete' });
export type Athlete = z.infer<typeof athlete>;

export const athleteListQuery = z.object({
  q: z.string().trim().max(80).default(''),
  coach: id.optional(),
  consent: z.enum(['valid', 'none']).optional(),
  sort: z.enum(['name', '-name', 'lastVisit', '-lastVisit']).default('name'),
  ...pageQuery,
});

const params = z.object({ id });

export const athleteRoutes = {
  listAthletes: route({
    method: 'get',
    path: '/api/athletes',
    summary: 'The athletes that this person may see: search, filter, sort, page.',
    audience: 'staff',
    query: athleteListQuery,
    status: 200,
    answer: json(
      pageOf(athlete).extend({
        /** Whose athletes this person may see, for the filter; a coach sees only their own and gets none. */
        coaches: z.array(personRef),
      }),
    ),
  }),
  addAthlete: route({
    method: 'post',
    path: '/api/athletes',
    summary: 'Add an athlete to one’s own caseload.',
    audience: 'staff',
    body: athleteBody,
    status: 201,
    answer: json(athlete),
    problems: ['not-allowed'],
  }),
  athlete: route({
    method: 'get',
    path: '/api/athletes/:id',
    summary: 'One athlete.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(athlete),
    problems: ['not-found'],
  }),
  editAthlete: route({
    method: 'patch',
    path: '/api/athletes/:id',
    summary: 'Change what is known of an athlete.',
    audience: 'staff',
    params,
    body: athleteEdit,
    status: 200,
    answer: json(athlete),
    problems: ['not-found', 'not-allowed', 'edited-meanwhile'],
  }),
  listConsents: route({
    method: 'get',
    path: '/api/athletes/:id/consents',
    summary: 'Every consent ever recorded for an athlete, newest first.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(consent) })),
    problems: ['not-found'],
  }),
  recordConsent: route({
    method: 'post',
    path: '/api/athletes/:id/consents',
    summary: 'Record a consent. A minor’s must come from a guardian.',
    audience: 'staff',
    params,
    body: consentBody,
    status: 201,
    answer: json(consent),
    problems: ['not-found', 'not-allowed', 'edited-meanwhile'],
  }),
  withdrawConsent: route({
    method: 'post',
    path: '/api/consents/:id/withdraw',
    summary: 'Withdraw a whole consent; what rested on it stops at once.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(consent),
    problems: ['not-found', 'not-allowed'],
  }),
  withdrawPurposes: route({
    method: 'post',
    path: '/api/athletes/:id/withdrawals',
    summary:
      'Withdraw purposes from every consent that holds them. Filming takes all others with it, closes what was filmed and schedules its deletion.',
    audience: 'staff',
    params,
    body: z.object({ purposes: z.array(purpose).min(1).max(4) }).meta({ id: 'WithdrawalBody' }),
    status: 200,
    answer: json(athlete),
    problems: ['not-found', 'not-allowed'],
  }),
  addConsentScan: route({
    method: 'post',
    path: '/api/consents/:id/scan',
    summary:
      'Put the scan of the paper beside a consent: PDF, JPEG or PNG, up to 10 MB. It takes the place of one that is there.',
    audience: 'staff',
    params,
    body: z.object({}).meta({ id: 'ConsentScanFields' }),
    multipart: { file: 'scan' },
    status: 201,
    answer: json(consent),
    problems: [
      'not-found',
      'not-allowed',
      'body-too-large',
      'unsupported-media-type',
      'upload-incomplete',
      'storage-full',
    ],
  }),
  consentScan: route({
    method: 'get',
    path: '/api/consents/:id/scan',
    summary: 'The scan of the paper, as a file to save.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(['application/pdf', 'image/jpeg', 'image/png']),
    problems: ['not-found', 'clip-missing-in-storage'],
  }),
  deleteConsentScan: route({
    method: 'delete',
    path: '/api/consents/:id/scan',
    summary: 'Take the scan away from a consent.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(consent),
    problems: ['not-found', 'not-allowed'],
  }),
};
