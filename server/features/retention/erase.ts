import type { EntityManager } from '@mikro-orm/postgresql';
import type { ErasureReason } from '#shared/contracts/retention.ts';
import { tell } from '../../events/tell.ts';
import { enqueue } from '../../jobs/job.ts';
import type { Doer } from '../audit/audit.ts';
import { audit } from '../audit/audit.ts';
import { User } from '../accounts/user.entity.ts';
import { athletePrefix } from '../athletes/athlete-files.ts';
import { Athlete } from '../athletes/athlete.entity.ts';
import { clipPrefix } from '../clips/clip-files.ts';
import { Erasure } from './erasure.entity.ts';
import { ERASE_FILES } from './jobs/erase-files-type.ts';

interface Of {
  readonly em: EntityManager;
  readonly actor: Doer & { readonly practiceId: string };
}

type Held = {
  visits: number;
  clips: string[] | null;
  uploads: string[] | null;
  others: string[] | null;
  bytes: string;
};

const heldOf = async (em: EntityManager, athleteId: string): Promise<Held> => {
  const [held] = await em.execute<Held[]>(
    `with v as (select id from visit where athlete_id = ?),
       c as (select id, bytes from clip where visit_id in (select id from v))
     select (select count(*)::int from v) as visits,
       (select array_agg(id::text) from c) as clips,
       (select array_agg(id::text) from upload where visit_id in (select id from v)) as uploads,
       (select array_agg(id::text) from (
         select id from v union select id from rep where clip_id in (select id from c)
         union select id from replay where visit_id in (select id from v)
         union select b.id from replay_before b join replay r on r.id = b.replay_id
           where r.visit_id in (select id from v)
         union select id from report where visit_id in (select id from v)
         union select m.id from second_marking m join rep r on r.id = m.rep_id where r.clip_id in (select id from c)
       ) o) as others,
       (select coalesce(sum(bytes), 0)::text from c) as bytes`,
    [athleteId],
  );
  if (!held) throw new Error('One row was asked for.');
  return held;
};

/** Jobs that name what goes: their rows carry its ids. */
const forgetJobs = (em: EntityManager, ids: readonly string[]) =>
  em.execute(
    `delete from job_outbox o where exists (
       select from jsonb_each_text(o.payload) part where part.value = any (?::text[]))`,
    [`{${ids.join(',')}}`],
  );

/**
 * Erases an athlete: every row goes in this unit of work, by the foreign keys that lead to the athlete, so that
 * nothing half gone can ever be seen; what remains is a tombstone that names the files, and the job that deletes them.
 */
export const eraseAthlete = async (
  unit: Of,
  athlete: Athlete,
  why: ErasureReason,
): Promise<Erasure> => {
  const { em, actor } = unit;
  const { id, practiceId } = athlete;
  const coachId = athlete.coach.id;
  await em.execute('select 1 from athlete where id = ? for update', [id]);
  const { visits, clips: clipIds, uploads, others, bytes } = await heldOf(em, id);
  const clips = clipIds ?? [];
  const erasure = em.create(Erasure, {
    athleteId: id,
    why,
    askedBy: actor.kind === 'user' ? em.getReference(User, actor.id) : null,
    visits,
    clips: clips.length,
    bytes: Number(bytes),
    prefixes: [athletePrefix(practiceId, id), ...clips.map((clip) => clipPrefix(practiceId, clip))],
    uploads: uploads ?? [],
  });
  await forgetJobs(em, [id, ...clips, ...(uploads ?? []), ...(others ?? [])]);
  audit(unit, 'athlete.erase', id, { athlete: id, why, visits, clips: clips.length });
  await em.flush();
  await em.nativeDelete(Athlete, { id });
  await enqueue(unit, ERASE_FILES, { erasureId: erasure.id });
  await em.flush();
  await tell(unit, { coachId }, { type: 'consent', athleteId: id });
  return erasure;
};
