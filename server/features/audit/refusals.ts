import type { UserActor } from '#shared/access/actors.ts';
import { loggedError } from '../../http/logging.ts';
import type { Refusal } from '../../http/need.ts';
import type { Ground } from '../../main/ground.ts';
import { audit } from './audit.ts';

/** Of one person in an hour: enough to see that somebody tries, too few to fill the trail. */
const AT_MOST = 60;

/**
 * Writes down what somebody of the practice asked for that is not theirs: once an hour for the same thing. A thing of
 * another practice looks like one that does not exist, and is not written down.
 */
export const noteRefusals =
  ({ inPractice, log }: Pick<Ground, 'inPractice' | 'log'>) =>
  async (actor: UserActor, { tried, athleteId }: Refusal, id: string | null): Promise<void> => {
    const subjectId = id ?? actor.practiceId;
    // what was asked for is undone by now, so this has a transaction of its own
    await inPractice(actor, async (unit) => {
      const [{ all, same } = { all: 0, same: 0 }] = await unit.em.execute<
        { all: number; same: number }[]
      >(
        `select count(*)::int as all,
            (count(*) filter (where subject_id = ? and detail->>'tried' = ?))::int as same
          from audit_entry where by_user = ? and action = 'access.refuse' and at > now() - interval '1 hour'`,
        [subjectId, tried, actor.id],
      );
      if (same > 0 || all >= AT_MOST) return;
      audit(unit, 'access.refuse', subjectId, { athlete: athleteId, tried });
    }).catch((error: unknown) => {
      log.error({ error: loggedError(error) }, 'a refusal was not written down');
    });
  };
