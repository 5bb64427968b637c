import * as z from 'zod';
import { id, moment } from './primitives.ts';
import { bytes, route } from './route.ts';

/** The film of a replay link with drawing and reading in its picture, for the athlete to keep. */
export const keptFilm = z
  .object({
    /**
     * `asked`: being made. `head-first`: it is made once the film with the hidden head is there. `failed`: given up
     * until a person asks again.
     */
    state: z.enum(['asked', 'head-first', 'ready', 'failed']),
    bytes: z.int().positive().nullable(),
    /** What it says is what stood then. */
    madeAt: moment.nullable(),
    /** How often it was taken by the link. */
    taken: z.int(),
    lastTakenAt: moment.nullable(),
  })
  .meta({ id: 'KeptFilm' });
export type KeptFilm = z.infer<typeof keptFilm>;

/** What the athlete's page says of it; none until it is made. */
export const filmToKeep = z
  .object({ bytes: z.int().positive(), madeAt: moment })
  .meta({ id: 'FilmToKeep' });

export const keptFilmRoutes = {
  keptFilm: route({
    method: 'get',
    path: '/api/replays/:id/kept-film',
    summary: 'The film to keep of a live link, MP4.',
    audience: 'staff',
    params: z.object({ id }),
    status: 200,
    answer: bytes(['video/mp4'], true),
    problems: [
      'not-found',
      'not-as-it-stands',
      'consent-missing',
      'consent-withdrawn',
      'clip-missing-in-storage',
      'range-not-satisfiable',
    ],
  }),
  takeFilm: route({
    method: 'get',
    path: '/api/r/:token/kept-film',
    summary: 'The same for the athlete, by the link. Each time is counted.',
    audience: 'link',
    params: z.object({ token: z.string().regex(/^[A-Za-z0-9_-]{43}$/) }),
    status: 200,
    answer: bytes(['video/mp4'], true),
    problems: ['not-found', 'pass-phrase-needed', 'clip-not-ready', 'range-not-satisfiable'],
  }),
};
