import * as z from 'zod';
import { athletePlan } from './athlete-plan.ts';
import { call } from './calls.ts';
import { comment, shownShape } from './comments.ts';
import { frameTable } from './clips.ts';
import { email, frameIndex, id, moment, personRef, side, text, view } from './primitives.ts';
import { gates } from './protocol.ts';
import { bytes, json, none, route } from './route.ts';
import { readingCode } from './readings.ts';
import { filmToKeep, keptFilm } from './kept-film.ts';
import {
  earlierLift,
  overlayMarks,
  publicHead,
  replayCourse,
  replayMoments,
} from './replay-parts.ts';

export const replayBody = z
  .object({
    visitId: id,
    side,
    /** The rep that is played. */
    repId: id,
    /** An earlier visit whose lift of the same side is shown beside this one; null: none. */
    beforeVisitId: id.nullable().default(null),
    /** The marked span, both inclusive; the whole rep where left out. */
    fromFrame: frameIndex.optional(),
    toFrame: frameIndex.optional(),
    showReading: z.boolean().default(true),
    showCall: z.boolean().default(true),
    /** Serve only a copy on which the head is hidden. Refused until a box covers every frame and a person looked. */
    hideHead: z.boolean().default(false),
    /** A sentence of the coach's own to the athlete. */
    message: text(1000, 0).default(''),
    days: z.int().min(1).max(180).default(30),
    passPhrase: z.string().min(6, 'At least 6 characters.').max(100).nullable().default(null),
  })
  .meta({ id: 'ReplayBody' });

/**
 * `to-be-looked-at`: the box was changed, and nothing is shown until somebody has looked at it.
 * `failed`: the copy could not be made, and nothing is shown until a person asks for it again.
 */
const headState = z.enum(['shown', 'hidden', 'being-prepared', 'failed', 'to-be-looked-at']);

export const replay = z
  .object({
    id,
    visitId: id,
    side,
    repId: id,
    fromFrame: frameIndex,
    toFrame: frameIndex,
    showReading: z.boolean(),
    showCall: z.boolean(),
    head: headState,
    /** The earlier lift beside it; null where there is none, or its clip is gone. */
    before: z.object({ visitId: id, visitDay: z.iso.date(), head: headState }).nullable(),
    /** Null where none was asked for. */
    film: keptFilm.nullable(),
    message: z.string(),
    passPhrase: z.boolean(),
    state: z.enum(['live', 'lapsed', 'revoked']),
    openings: z.int(),
    lastOpenedAt: moment.nullable(),
    expiresAt: moment,
    by: personRef,
    at: moment,
  })
  .meta({ id: 'Replay' });
export type Replay = z.infer<typeof replay>;

/** What the athlete's page gets: this and nothing else of the practice. */
export const publicReplay = z
  .object({
    athleteGivenName: z.string(),
    practice: z.object({ name: z.string(), contact: z.string() }),
    coachName: z.string(),
    visitDay: z.iso.date(),
    side,
    view,
    /** Size of the upright source frame, px; overlay coordinates are in it. */
    width: z.int(),
    height: z.int(),
    frames: frameTable,
    fromFrame: frameIndex,
    toFrame: frameIndex,
    head: publicHead,
    /** Lifts between which the hip was looked at. */
    gates,
    moments: replayMoments,
    overlay: overlayMarks,
    course: replayCourse.nullable(),
    /** The lift of an earlier visit, to be shown beside this one. */
    before: earlierLift.nullable(),
    reading: z
      .object({
        code: readingCode,
        label: z.string(),
        change: z.number().nullable(),
        plusMinus: z.number().nullable(),
        probability: z.number().nullable(),
        repsUsed: z.int(),
        repsAgreeing: z.int(),
      })
      .nullable(),
    call: call.pick({ seen: true, confidence: true }).nullable(),
    message: z.string(),
    /** What to do until the retest; null where none was given. */
    plan: athletePlan.nullable(),
    comments: z.array(
      comment
        .pick({ body: true, fromFrame: true, toFrame: true })
        .extend({ by: z.string(), shape: shownShape.nullable() }),
    ),
    /** To be taken home; null where there is none, or not yet. */
    film: filmToKeep.nullable(),
    expiresAt: moment,
  })
  .meta({ id: 'PublicReplay' });
export type PublicReplay = z.infer<typeof publicReplay>;

const params = z.object({ id });
/** 256 random bits, base64url. */
const token = z.string().regex(/^[A-Za-z0-9_-]{43}$/);

export const sendReplayBody = z
  .object({
    /** The end of the address, which only whoever made the link still has. */
    token,
    /** Where it goes; not kept. */
    email,
  })
  .meta({ id: 'SendReplay' });
const linkParams = z.object({ token });

export const replayRoutes = {
  listReplays: route({
    method: 'get',
    path: '/api/replays',
    summary: 'The replay links of a visit or of an athlete, newest first.',
    audience: 'staff',
    query: z
      .object({ visitId: id.optional(), athleteId: id.optional() })
      .refine(({ visitId, athleteId }) => (visitId === undefined) !== (athleteId === undefined), {
        message: 'Name either a visit or an athlete.',
      }),
    status: 200,
    answer: json(z.object({ items: z.array(replay) })),
    problems: ['not-found'],
  }),
  makeReplay: route({
    method: 'post',
    path: '/api/replays',
    summary: 'Make a replay link. The address is in this answer and nowhere else afterwards.',
    audience: 'staff',
    body: replayBody,
    status: 201,
    answer: json(z.object({ replay, url: z.string() })),
    problems: [
      'not-found',
      'not-allowed',
      'consent-missing',
      'consent-withdrawn',
      'call-first',
      'clip-not-ready',
      'frame-out-of-range',
      'head-not-covered',
      'head-not-looked-at',
    ],
  }),
  sendReplay: route({
    method: 'post',
    path: '/api/replays/:id/letter',
    summary:
      'Send the address of a link that was just made by e-mail. Neither address is kept. The answer comes once the mail server has taken the letter.',
    audience: 'staff',
    params,
    body: sendReplayBody,
    status: 204,
    answer: none,
    problems: [
      'not-found',
      'not-allowed',
      'consent-missing',
      'consent-withdrawn',
      'link-gone',
      'letter-not-sent',
      'too-many-tries',
    ],
  }),
  revokeReplay: route({
    method: 'post',
    path: '/api/replays/:id/revoke',
    summary: 'Kill a replay link at once.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(replay),
    problems: ['not-found', 'not-allowed'],
  }),
  hideHeadAgain: route({
    method: 'post',
    path: '/api/replays/:id/hide-head',
    summary:
      'Make the copy with the hidden head again, after that failed. Otherwise nothing changes.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(replay),
    problems: ['not-found', 'not-allowed'],
  }),
  makeFilm: route({
    method: 'post',
    path: '/api/replays/:id/kept-film',
    summary:
      'Have the film to keep made, as things stand now; the link hands it to the athlete. An earlier one is replaced.',
    audience: 'staff',
    params,
    status: 202,
    answer: json(replay),
    problems: ['not-found', 'not-allowed', 'consent-missing', 'consent-withdrawn', 'link-gone'],
  }),
  openReplay: route({
    method: 'get',
    path: '/api/r/:token',
    summary:
      'The athlete’s replay. Any failure is the same 404; a live link with a pass phrase asks for it.',
    audience: 'link',
    params: linkParams,
    status: 200,
    answer: json(publicReplay),
    problems: ['not-found', 'pass-phrase-needed', 'too-many-tries'],
  }),
  unlockReplay: route({
    method: 'post',
    path: '/api/r/:token/unlock',
    summary: 'Give the pass phrase; the answer sets a cookie for this link only.',
    audience: 'link',
    params: linkParams,
    body: z.object({ passPhrase: z.string().min(1).max(100) }).meta({ id: 'Unlock' }),
    status: 204,
    answer: none,
    problems: ['not-found', 'pass-phrase-needed', 'too-many-tries'],
  }),
  replayFilm: route({
    method: 'get',
    path: '/api/r/:token/film',
    summary:
      'Whether the link still opens, and whether there is a film to play. Opens nothing by itself.',
    audience: 'link',
    params: linkParams,
    status: 200,
    answer: json(z.object({ head: publicReplay.shape.head }).meta({ id: 'ReplayFilm' })),
    problems: ['not-found', 'pass-phrase-needed'],
  }),
  replayVideo: route({
    method: 'get',
    path: '/api/r/:token/video',
    summary: 'The small copy that the replay plays; answers ranges.',
    audience: 'link',
    params: linkParams,
    status: 200,
    answer: bytes(['video/mp4'], true),
    problems: ['not-found', 'pass-phrase-needed', 'clip-not-ready', 'range-not-satisfiable'],
  }),
  replayBeforeVideo: route({
    method: 'get',
    path: '/api/r/:token/before/video',
    summary: 'The small copy of the earlier lift beside it; answers ranges.',
    audience: 'link',
    params: linkParams,
    status: 200,
    answer: bytes(['video/mp4'], true),
    problems: ['not-found', 'pass-phrase-needed', 'clip-not-ready', 'range-not-satisfiable'],
  }),
  replayPoster: route({
    method: 'get',
    path: '/api/r/:token/poster',
    summary: 'One picture of the replay.',
    audience: 'link',
    params: linkParams,
    status: 200,
    answer: bytes(['image/jpeg']),
    problems: ['not-found', 'pass-phrase-needed', 'clip-not-ready'],
  }),
};
