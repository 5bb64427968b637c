import * as z from 'zod';
import { product } from '../../../db/in-practice.ts';
import { handles, type JobContext, type JobType } from '../../../jobs/job.ts';
import { Athlete } from '../../athletes/athlete.entity.ts';
import { today } from '../../athletes/days.ts';
import { Practice } from '../../practice/practice.entity.ts';
import { eraseAthlete } from '../erase.ts';
import { goingUntil } from '../going.ts';

/** Erases whoever goes today, in one practice. */
export const TIDY: JobType<{ practice: string }> = {
  queue: 'tidy',
  payload: z.object({ practice: z.uuid() }),
};

/**
 * One athlete a unit of work: killed in between, the rest go with the next run. Each is asked for anew, so that a
 * consent of the same minute, or a visit, keeps them.
 */
const run = async ({ ground, practiceId, signal }: JobContext<{ practice: string }>) => {
  for (;;) {
    if (signal.aborted) return;
    const erased = await ground.inPractice(product(practiceId), async (unit) => {
      const { em } = unit;
      const { keepMonths } = await em.findOneOrFail(Practice, { id: practiceId });
      const [first] = await goingUntil(em, keepMonths ?? null, today());
      if (!first) return false;
      // a consent that is being recorded now ends before, or waits until the athlete is gone
      await em.execute('select 1 from athlete where id = ? for update', [first.athlete.id]);
      const still = (await goingUntil(em, keepMonths ?? null, today())).find(
        ({ athlete }) => athlete.id === first.athlete.id,
      );
      if (!still) return true;
      const athlete = await em.findOneOrFail(Athlete, { id: first.athlete.id });
      await eraseAthlete(unit, athlete, still.why);
      return true;
    });
    if (!erased) return;
  }
};

export const tidyJob = handles({
  type: TIDY,
  lockKey: ({ practice }) => practice,
  run,
  expireInMinutes: 60,
  retryLimit: 5,
  lookAgainMinutes: 60,
  unfinished: {
    sql: 'select practice_id from practices_to_tidy()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { practice: String(row.practice_id) },
    }),
  },
});
