import type * as z from 'zod';
import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { commentBody, commentEdit, Shape } from '#shared/contracts/comments.ts';
import { measureById } from '#shared/measures/registry.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { found, need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { audit } from '../audit/audit.ts';
import { needOpen } from '../athletes/consent-gate.ts';
import { clipInSight, needFrames } from '../clips/clip-in-sight.ts';
import { peopleFor } from '../people/people-for.ts';
import { writeOf } from '../waiting-mail/mail-choices.ts';
import { Comment } from './comment.entity.ts';
import { COMMENT_ORDER } from './comments.presenter.ts';

type Of = Unit<UserActor>;

const tellComments = ({ em, actor }: Of, athlete: Athlete, clipId: string) =>
  tell(
    { em, actor },
    { coachId: athlete.coach.id },
    {
      type: 'comments',
      clipId,
      byUserId: actor.id,
    },
  );

/** The comments of a clip, by moment. */
export const commentsOfClip = async (unit: Of, clipId: string): Promise<Comment[]> => {
  await clipInSight(unit, clipId, 'athlete.read');
  return await unit.em.find(
    Comment,
    { clip: clipId },
    { populate: ['by', 'resolvedBy'], orderBy: COMMENT_ORDER },
  );
};

/** An angle is a measure that is listed, or it is not shown at all. */
const needMeasure = (shape: Shape | null): void => {
  if (shape?.kind === 'measure' && !measureById(shape.measure))
    throw new Problem('invalid-input', undefined, [
      { path: 'body.shape.measure', message: 'Choose one of the measures.' },
    ]);
};

/** Comments at a frame or a span; an answer stands where the comment it answers stands. */
export const addComment = async (
  unit: Of,
  clipId: string,
  body: z.output<typeof commentBody>,
): Promise<Comment> => {
  const { em, actor } = unit;
  const { clip, athlete } = await clipInSight(unit, clipId, 'comment.add');
  const answered = body.answerTo
    ? found(await em.findOne(Comment, { id: body.answerTo, clip: clipId }))
    : null;
  const place = answered ?? body;
  needFrames(clip, place.fromFrame, place.toFrame);
  needMeasure(body.shape);
  const comment = em.create(Comment, {
    clip,
    // an answer to an answer joins the same thread
    answerTo: answered ? (answered.answerTo ?? answered.id) : null,
    body: body.body,
    fromFrame: place.fromFrame,
    toFrame: place.toFrame,
    shape: body.shape,
    shared: body.shared,
    by: em.getReference(User, actor.id),
  });
  audit(unit, 'comment.add', comment.id, { athlete: athlete.id, clip: clipId });
  await em.flush();
  await em.populate(comment, ['by']);
  await tellComments(unit, athlete, clipId);
  await writeToThread(unit, athlete, comment);
  return comment;
};

/** The athlete's coach, and whoever has written in the thread, as far as they may still see it. */
const writeToThread = async (unit: Of, athlete: Athlete, comment: Comment): Promise<void> => {
  const { em } = unit;
  const head = comment.answerTo ?? comment.id;
  const thread = await em.find(Comment, { $or: [{ id: head }, { answerTo: head }] });
  const may = (await peopleFor(em, athlete, 'comment.add')).map(({ id }) => id);
  const wanted = new Set([athlete.coach.id, ...thread.map(({ by }) => by.id)]);
  await writeOf(
    unit,
    may.filter((id) => wanted.has(id)),
    {
      kind: 'comment',
      aboutId: comment.clip.id,
      path: `/clips/${comment.clip.id}?frame=${comment.fromFrame}&comment=${head}`,
    },
  );
};

const commentInSight = async (
  { em, actor }: Of,
  id: string,
  action: Action,
): Promise<{ comment: Comment; athlete: Athlete }> => {
  const comment = found(
    await em.findOne(Comment, { id }, { populate: ['clip.visit.athlete', 'by', 'resolvedBy'] }),
  );
  const athlete = comment.clip.unwrap().visit.unwrap().athlete.unwrap() as Athlete;
  const resource = {
    kind: 'comment',
    practiceId: comment.practiceId,
    coachId: athlete.coach.id,
    byUserId: comment.by.id,
  } as const;
  need(actor, action, resource, athlete.id);
  await needOpen({ em, actor }, athlete, action);
  return { comment: comment, athlete };
};

/** Changes one's own words or their sharing; resolving is open to all who may read. */
export const editComment = async (
  unit: Of,
  id: string,
  { body, shared, resolved }: z.output<typeof commentEdit>,
): Promise<Comment> => {
  const { em, actor } = unit;
  const words = body !== undefined || shared !== undefined;
  const { comment, athlete } = await commentInSight(
    unit,
    id,
    words ? 'comment.edit' : 'comment.resolve',
  );
  if (body !== undefined && body !== comment.body) {
    comment.body = body;
    comment.editedAt = new Date();
  }
  if (shared !== undefined) comment.shared = shared;
  const about = { athlete: athlete.id, clip: comment.clip.id };
  if (words) audit(unit, 'comment.edit', id, about);
  if (resolved !== undefined && resolved !== Boolean(comment.resolvedAt)) {
    comment.resolvedBy = resolved ? em.getReference(User, actor.id, { wrapped: true }) : null;
    comment.resolvedAt = resolved ? new Date() : null;
    audit(unit, 'comment.resolve', id, { ...about, resolved });
  }
  await em.flush();
  await em.populate(comment, ['resolvedBy']);
  await tellComments(unit, athlete, comment.clip.id);
  return comment;
};

/** Takes back one's own comment, as long as nobody has answered it. */
export const deleteComment = async (unit: Of, id: string): Promise<void> => {
  const { comment, athlete } = await commentInSight(unit, id, 'comment.delete');
  const answers = await unit.em.count(Comment, { answerTo: id });
  if (answers > 0)
    throw new Problem(
      'not-as-it-stands',
      'Somebody has answered this comment: resolve it instead.',
    );
  audit(unit, 'comment.delete', id, { athlete: athlete.id, clip: comment.clip.id });
  unit.em.remove(comment);
  await unit.em.flush();
  await tellComments(unit, athlete, comment.clip.id);
};
