import type { HeldFile } from './held-file.ts';

const WHAT: readonly (readonly [RegExp, string])[] = [
  [/^athlete\.json$/, 'the person: name, birth, height, sport, cautions, contact'],
  [/^consents\.json$/, 'consents: who gave them, purposes, until when, what was withdrawn when'],
  [/^consents\//, 'the scan of the paper of a consent, named by its id'],
  [/^calls\.json$/, 'calls by eye: seen by the coach, not measured'],
  [/^readings\.json$/, 'readings with their inputs, figures and uncertainty; degrees, pixels, mm'],
  [/^links\.json$/, 'links to replays, without the secret that opens them'],
  [/^link-openings\.json$/, 'when links were opened'],
  [/^audit\.json$/, 'what was done with this person’s data, by ids and codes'],
  [/^rows\//, 'every other table that holds something of this person, row by row'],
  [/clip-\d+(\.[a-z0-9]+)?$/, 'a clip as it was sent, without its place'],
  [
    /film-to-keep-\d+\.mp4$/,
    'a film with drawing and reading in its picture, as it was made to be kept',
  ],
  [/report-\d+\.pdf$/, 'a report of the visit for the referring clinician'],
  [/comments\.vtt$/, 'comments on a clip as a track for players (WebVTT)'],
  [/frames\.csv$/, 'marked frames with their figures (CSV, RFC 4180)'],
  [/annotations\.jsonld$/, 'reps, marks and comments (W3C Web Annotation, JSON-LD)'],
];

const whatOf = (name: string): string => WHAT.find(([test]) => test.test(name))?.[1] ?? '';

/** What lies in the archive, file by file, for whoever opens it without us. */
export const readme = (files: readonly HeldFile[], day: string): HeldFile => ({
  name: 'README.txt',
  text: [
    `All that Redshank held about one athlete on ${day}.`,
    '',
    'Times are ISO 8601 in UTC. Angles are in degrees, lengths in mm, places in pixels of the upright picture.',
    'Figures are measured on a film and stand beside their uncertainty; they are no diagnosis.',
    'Other people appear by their id; the coach and whoever commented by name where a format asks for it.',
    '',
    ...files.map(({ name }) => `${name}\n    ${whatOf(name)}`),
    '',
  ].join('\n'),
});
