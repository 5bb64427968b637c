import type { UserActor } from '#shared/access/actors.ts';
import { annotationCollection, urn } from '#shared/exports/annotations.ts';
import { webVtt } from '#shared/exports/cues.ts';
import { spanOfFrames } from '#shared/exports/media-fragment.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { athleteInSight } from '../../athletes/athlete-in-sight.ts';
import type { Athlete } from '../../athletes/athlete.entity.ts';
import { Consent } from '../../athletes/consent.entity.ts';
import { audit } from '../../audit/audit.ts';
import { Clip } from '../../clips/clip.entity.ts';
import { keptFilmKey } from '../../clips/clip-files.ts';
import { Comment } from '../../comments/comment.entity.ts';
import { COMMENT_ORDER } from '../../comments/comments.presenter.ts';
import { SCAN_ENDINGS } from '../../consents/send-scan.ts';
import { scanKey } from '../../consents/scans.service.ts';
import { type Addresses, annotatedComment, annotatedRep } from '../../exports/annotated.ts';
import { framesCsv } from '../../exports/exported-reps.ts';
import { KeptFilm } from '../../replays/film/kept-film.entity.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import { timesOfClip } from '../../reps/reps.presenter.ts';
import { reportKey } from '../../reports/report-files.ts';
import { Report } from '../../reports/report.entity.ts';
import { storedReps } from '../../reps/stored-reps.ts';
import { Visit } from '../../visits/visit.entity.ts';
import type { HeldFile } from './held-file.ts';
import { heldRows } from './held-rows.ts';
import { readme } from './readme.ts';

type Of = Unit<UserActor>;

export interface AthleteExport {
  /** Says nothing of the person. */
  readonly name: string;
  readonly files: readonly HeldFile[];
}

const json = (name: string, value: unknown): HeldFile => ({
  name,
  text: `${JSON.stringify(value, null, 2)}\n`,
});

/** Tables that people look for by a plain name. */
const PLAIN: Record<string, string> = {
  athlete: 'athlete.json',
  consent: 'consents.json',
  call: 'calls.json',
  reading: 'readings.json',
  replay: 'links.json',
};

const endingOf = (name: string): string =>
  /\.[A-Za-z0-9]{1,5}$/.exec(name)?.[0].toLowerCase() ?? '';

const commentsOf = (em: Of['em'], clip: Clip): Promise<Comment[]> =>
  em.find(Comment, { clip: clip.id }, { populate: ['by'], orderBy: COMMENT_ORDER });

const trackOf = (clip: Clip, comments: readonly Comment[]): string =>
  webVtt(
    comments.flatMap((comment) => {
      const span = spanOfFrames(timesOfClip(clip), comment.fromFrame, comment.toFrame);
      const speaker = comment.by.unwrap().name;
      return span ? [{ id: comment.id, span, speaker, text: comment.body }] : [];
    }),
  );

const reportsOf = async (
  em: Of['em'],
  visit: Visit,
  folder: string,
  athlete: Athlete,
): Promise<HeldFile[]> => {
  const reports = await em.find(
    Report,
    { visit: visit.id, state: 'ready' },
    { orderBy: { number: 'asc' } },
  );
  return reports.map(({ id, number, practiceId }) => ({
    name: `${folder}/report-${number}.pdf`,
    key: reportKey(practiceId, athlete.id, id),
  }));
};

/** Films that were made for the athlete to keep. */
const filmsOf = async (em: Of['em'], visit: Visit, folder: string): Promise<HeldFile[]> => {
  const films = await em.find(
    KeptFilm,
    { replay: { visit: visit.id }, state: 'ready' },
    { populate: ['replay.rep'], orderBy: { madeAt: 'asc', id: 'asc' } },
  );
  return films.map(({ id, practiceId, replay }, n) => ({
    name: `${folder}/film-to-keep-${n + 1}.mp4`,
    key: keptFilmKey(practiceId, (replay.unwrap().rep.unwrap() as Rep).clip.id, id),
  }));
};

/** What was filmed on one day: clips as they were sent, and what was said about them in open formats. */
const visitFiles = async (
  { em }: Of,
  visit: Visit,
  folder: string,
  athlete: Athlete,
  to: Addresses,
): Promise<HeldFile[]> => {
  const clips = (await em.find(
    Clip,
    { visit: visit.id },
    { populate: ['frames'], orderBy: { uploadedAt: 'asc', id: 'asc' } },
  )) as Clip[];
  const ready = clips.filter(({ state }) => state === 'ready');
  const reps = await storedReps(em, ready, athlete);
  const files: HeldFile[] = clips.map((clip, n) => ({
    name: `${folder}/clip-${n + 1}${endingOf(clip.name)}`,
    key: clip.files.original,
  }));
  const said = [];
  for (const clip of ready) {
    const comments = await commentsOf(em, clip);
    if (comments.length > 0)
      files.push({
        name: `${folder}/clip-${clips.indexOf(clip) + 1}-comments.vtt`,
        text: trackOf(clip, comments),
      });
    said.push(
      ...reps
        .filter(({ rep }) => rep.clip.id === clip.id)
        .flatMap((each) => annotatedRep(each, to)),
      ...comments.flatMap((each) => annotatedComment(each, timesOfClip(clip), to)),
    );
  }
  const marked = reps.filter(({ marks }) => marks.length > 0);
  if (marked.length > 0)
    files.push({ name: `${folder}/frames.csv`, text: framesCsv(marked, visit.day) });
  if (said.length > 0)
    files.push(
      json(
        `${folder}/annotations.jsonld`,
        annotationCollection(urn(visit.id), `Visit of ${visit.day}`, said),
      ),
    );
  files.push(...(await reportsOf(em, visit, folder, athlete)));
  files.push(...(await filmsOf(em, visit, folder)));
  return files;
};

/** When links were opened, and what else the audit trail says of this person: ids and codes. */
const trail = async (em: Of['em'], athleteId: string): Promise<HeldFile[]> => {
  const rows = await em.execute<{ action: string }[]>(
    `select at, actor, role, action, subject, subject_id, detail from audit_entry
     where athlete_id = ? order by at, id`,
    [athleteId],
  );
  return [
    json(
      'link-openings.json',
      rows.filter(({ action }) => action === 'replay.open' || action === 'replay.film-taken'),
    ),
    json('audit.json', rows),
  ];
};

const scans = async (em: Of['em'], athleteId: string): Promise<HeldFile[]> => {
  const consents = await em.find(Consent, { athlete: athleteId }, { populate: ['athlete'] });
  return (consents as Consent[]).flatMap((consent) =>
    consent.scan
      ? [
          {
            name: `consents/${consent.id}.${SCAN_ENDINGS[consent.scan.type]}`,
            key: scanKey(consent, consent.scan),
          },
        ]
      : [],
  );
};

/** Everything that is held about one athlete, whatever they have consented to: it is theirs. */
export const exportOfAthlete = async (
  unit: Of,
  id: string,
  to: Addresses,
): Promise<AthleteExport> => {
  const { em } = unit;
  const athlete = await athleteInSight(unit, id, 'athlete.export');
  const files: HeldFile[] = [];
  for (const [table, rows] of await heldRows(em, id))
    files.push(json(PLAIN[table] ?? `rows/${table}.json`, rows));
  files.push(...(await trail(em, id)), ...(await scans(em, id)));
  const visits = (await em.find(
    Visit,
    { athlete: id },
    { orderBy: { day: 'asc', createdAt: 'asc', id: 'asc' } },
  )) as Visit[];
  for (const [n, visit] of visits.entries())
    files.push(...(await visitFiles(unit, visit, `visits/${n + 1}-${visit.day}`, athlete, to)));
  const day = new Date().toISOString().slice(0, 10);
  audit(unit, 'athlete.export', id, { athlete: id, clips: files.filter((f) => 'key' in f).length });
  await em.flush();
  return { name: `${day}-athlete.zip`, files: [readme(files, day), ...files] };
};
