import type { UserActor } from '#shared/access/actors.ts';
import { type Annotated, annotationCollection, urn } from '#shared/exports/annotations.ts';
import { webVtt } from '#shared/exports/cues.ts';
import { spanOfFrames } from '#shared/exports/media-fragment.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Clip } from '../clips/clip.entity.ts';
import { clipInSight, frameCountOf } from '../clips/clip-in-sight.ts';
import { Comment } from '../comments/comment.entity.ts';
import { COMMENT_ORDER } from '../comments/comments.presenter.ts';
import { audit } from '../audit/audit.ts';
import { repInSight } from '../reps/rep-in-sight.ts';
import { timesOfClip } from '../reps/reps.presenter.ts';
import { type NumberedRep, storedReps } from '../reps/stored-reps.ts';
import { visitInSight } from '../visits/visit-in-sight.ts';
import { type Addresses, annotatedComment, annotatedRep } from './annotated.ts';
import { framesCsv, needCalled } from './exported-reps.ts';

type Of = Unit<UserActor>;

/** A text to save, and a name for it that says nothing of the person. */
export interface ExportedFile {
  readonly name: string;
  readonly text: string;
}

const repToExport = async (unit: Of, repId: string) => {
  const sight = await repInSight(unit, repId, 'athlete.read');
  frameCountOf(sight.clip);
  const reps = await storedReps(unit.em, [sight.clip], sight.athlete);
  const stored = reps.find(({ rep }) => rep.id === repId);
  if (!stored) throw new Error('A rep that was read is one of its clip.');
  const { id: visitId, day } = sight.clip.visit.unwrap();
  return { ...sight, stored, visitId, day, name: `${day}-rep-${stored.number}` };
};

const readyClips = (em: Of['em'], visitId: string): Promise<Clip[]> =>
  em.find(
    Clip,
    { visit: visitId, state: 'ready' },
    { populate: ['frames'], orderBy: { uploadedAt: 'asc', id: 'asc' } },
  );

const visitToExport = async (unit: Of, visitId: string) => {
  const { visit, athlete } = await visitInSight(unit, visitId, 'athlete.read');
  const clips = await readyClips(unit.em, visitId);
  const reps = await storedReps(unit.em, clips, athlete);
  return { athlete, day: visit.day, clips, reps };
};

const sidesOf = (reps: readonly NumberedRep[]) => new Set(reps.map(({ rep }) => rep.supportSide));

/** @throws Problem 'call-first' until somebody has said what they saw on that side */
export const framesOfRep = async (unit: Of, repId: string): Promise<ExportedFile> => {
  const { athlete, stored, visitId, day, name } = await repToExport(unit, repId);
  await needCalled(unit.em, visitId, sidesOf([stored]));
  audit(unit, 'rep.export', repId, { athlete: athlete.id, as: 'csv' });
  await unit.em.flush();
  return { name: `${name}.csv`, text: framesCsv([stored], day) };
};

/** @throws Problem 'call-first' until somebody has said what they saw on each side that has marks */
export const framesOfVisit = async (unit: Of, visitId: string): Promise<ExportedFile> => {
  const { athlete, day, reps } = await visitToExport(unit, visitId);
  const marked = reps.filter(({ marks }) => marks.length > 0);
  await needCalled(unit.em, visitId, sidesOf(marked));
  audit(unit, 'visit.export', visitId, { athlete: athlete.id, as: 'csv' });
  await unit.em.flush();
  return { name: `${day}-visit.csv`, text: framesCsv(marked, day) };
};

const commentsOf = (em: Of['em'], clips: readonly Clip[]): Promise<Comment[]> =>
  em.find(
    Comment,
    { clip: { $in: clips.map(({ id }) => id) } },
    { populate: ['by'], orderBy: COMMENT_ORDER },
  );

const jsonLd = (id: string, label: string, items: readonly Annotated[]): string =>
  `${JSON.stringify(annotationCollection(urn(id), label, items), null, 2)}\n`;

/** A rep, its marks, and the comments that touch it. */
export const annotationsOfRep = async (
  unit: Of,
  repId: string,
  to: Addresses,
): Promise<ExportedFile> => {
  const { athlete, stored, rep, clip, name } = await repToExport(unit, repId);
  const times = timesOfClip(clip);
  const comments = (await commentsOf(unit.em, [clip])).filter(
    ({ fromFrame, toFrame }) => fromFrame <= rep.endFrame && toFrame >= rep.startFrame,
  );
  const items = [
    ...annotatedRep(stored, to),
    ...comments.flatMap((comment) => annotatedComment(comment, times, to)),
  ];
  audit(unit, 'rep.export', repId, { athlete: athlete.id, as: 'web-annotation' });
  await unit.em.flush();
  return { name: `${name}.jsonld`, text: jsonLd(repId, `Rep ${stored.number}`, items) };
};

/** Everything that is said about the clips of a visit, clip by clip. */
export const annotationsOfVisit = async (
  unit: Of,
  visitId: string,
  to: Addresses,
): Promise<ExportedFile> => {
  const { athlete, day, clips, reps } = await visitToExport(unit, visitId);
  const comments = await commentsOf(unit.em, clips);
  const items = clips.flatMap((clip) => [
    ...reps.filter(({ rep }) => rep.clip.id === clip.id).flatMap((each) => annotatedRep(each, to)),
    ...comments
      .filter((comment) => comment.clip.id === clip.id)
      .flatMap((comment) => annotatedComment(comment, timesOfClip(clip), to)),
  ]);
  audit(unit, 'visit.export', visitId, { athlete: athlete.id, as: 'web-annotation' });
  await unit.em.flush();
  return { name: `${day}-visit.jsonld`, text: jsonLd(visitId, `Visit of ${day}`, items) };
};

/** The comments of a clip as a track that players show. */
export const commentTrack = async (unit: Of, clipId: string): Promise<ExportedFile> => {
  const { clip, athlete } = await clipInSight(unit, clipId, 'athlete.read', { frames: true });
  frameCountOf(clip);
  const times = timesOfClip(clip);
  const cues = (await commentsOf(unit.em, [clip])).flatMap((comment) => {
    const span = spanOfFrames(times, comment.fromFrame, comment.toFrame);
    const speaker = comment.by.unwrap().name;
    return span ? [{ id: comment.id, span, speaker, text: comment.body }] : [];
  });
  audit(unit, 'clip.export', clipId, { athlete: athlete.id, as: 'webvtt' });
  await unit.em.flush();
  return { name: `${clip.visit.unwrap().day}-comments.vtt`, text: webVtt(cues) };
};
