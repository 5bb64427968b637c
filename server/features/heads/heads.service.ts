import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import type { headBody, HeadPage } from '#shared/contracts/heads.ts';
import { headGrowth } from '#shared/head/head-track.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { caseloadOf, found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { type ClipInSight, clipInSight, needFrames } from '../clips/clip-in-sight.ts';
import { lockClip } from '../clips/jobs/lock-clip.ts';
import { audit } from '../audit/audit.ts';
import { hiddenReplaysAreStale } from '../replays/hidden-copies.ts';
import { currentHead } from './current-head.ts';
import { Head } from './head.entity.ts';
import { presentHead } from './heads.presenter.ts';

type Of = Unit<UserActor>;

const pageOf = async ({ em, actor }: Of, { clip, athlete }: ClipInSight): Promise<HeadPage> => {
  const head = await currentHead(em, clip.id);
  return {
    head: head && presentHead(head, clip),
    may: { save: can(actor, 'head.save', caseloadOf(athlete)) },
  };
};

export const headPage = async (unit: Of, clipId: string): Promise<HeadPage> =>
  pageOf(unit, await clipInSight(unit, clipId, 'athlete.read'));

/**
 * Adds a version after the current one. Nobody has looked at it yet, so nothing is shown by it.
 * @throws Problem 'edited-meanwhile' where another was made since
 */
export const saveHead = async (
  unit: Of,
  clipId: string,
  body: z.output<typeof headBody>,
): Promise<HeadPage> => {
  const { em, actor } = unit;
  const sight = await clipInSight(unit, clipId, 'head.save');
  const { clip, athlete } = sight;
  const frames = [...body.drawn, ...body.followed].map(({ frame }) => frame);
  needFrames(clip, body.fromFrame, body.toFrame, ...frames);
  // two who change it at once change it one after the other
  await lockClip(em, clipId);
  const before = (await currentHead(em, clipId))?.version ?? 0;
  if (before !== body.after) throw new Problem('edited-meanwhile');
  const { fromFrame, toFrame, drawn, followed } = body;
  const head = em.create(Head, {
    clip,
    version: before + 1,
    ...{ fromFrame, toFrame, drawn, followed },
    growth: headGrowth(clip.frameRate?.minPerSecond ?? null),
    by: em.getReference(User, actor.id),
  });
  audit(unit, 'head.save', head.id, {
    athlete: athlete.id,
    clip: clipId,
    version: head.version,
  });
  await em.flush();
  return pageOf(unit, sight);
};

/**
 * A person has looked at this version; the first look counts. Replays that hide the head are made by it from now on.
 * @throws Problem 'edited-meanwhile' where another version was made since
 */
export const lookedAtHead = async (
  unit: Of,
  clipId: string,
  version: number,
): Promise<HeadPage> => {
  const { em, actor } = unit;
  const sight = await clipInSight(unit, clipId, 'head.look');
  await lockClip(em, clipId);
  const head = found(await currentHead(em, clipId));
  if (head.version !== version) throw new Problem('edited-meanwhile');
  if (!head.lookedAt) {
    const lookedBy = await em.findOneOrFail(User, { id: actor.id });
    em.assign(head, { lookedBy, lookedAt: new Date() });
    audit(unit, 'head.look', head.id, { athlete: sight.athlete.id, clip: clipId, version });
    await em.flush();
    await hiddenReplaysAreStale(unit, clipId);
  }
  return pageOf(unit, sight);
};
