import type { Side } from '#shared/contracts/primitives.ts';
import { product } from '../../../db/in-practice.ts';
import { tell } from '../../../events/tell.ts';
import { handles, type JobContext } from '../../../jobs/job.ts';
import type { Ground } from '../../../main/ground.ts';
import { Visit } from '../../visits/visit.entity.ts';
import { keepReading, knownReading, sideSetting } from '../current-reading.ts';
import { deriveApart } from '../derive-apart.ts';
import { inputsOfSide } from '../inputs-of-side.ts';
import { markedReps } from '../side-inputs.ts';
import { DERIVE_READING } from './derive-reading-type.ts';

interface Which {
  readonly visitId: string;
  readonly side: Side;
}

/** The inputs as they stand; null where the visit is gone, nothing is marked, or the reading is known already. */
const inputsToDerive = (ground: Ground, practiceId: string, { visitId, side }: Which) =>
  ground.inPractice(product(practiceId), async ({ em }) => {
    const visit = await em.findOne(Visit, { id: visitId }, { populate: ['athlete'] });
    if (!visit) return null;
    const setting = await sideSetting(em, visitId, side);
    // marks that come from here on ask for another job
    setting.stale = false;
    const reps = await markedReps(em, visitId, visit.athlete.unwrap());
    const inputs = (await inputsOfSide(em, setting, reps, side))?.inputs;
    if (!inputs) {
      setting.reading = null;
      return null;
    }
    return (await knownReading(em, setting, inputs)) ? null : inputs;
  });

const run = async ({
  ground,
  practiceId,
  payload,
}: JobContext<{ visitId: string; side: Side }>): Promise<void> => {
  const inputs = await inputsToDerive(ground, practiceId, payload);
  if (!inputs) return;
  const result = await deriveApart(inputs.input);
  await ground.inPractice(product(practiceId), async (unit) => {
    const { em } = unit;
    const { visitId, side } = payload;
    const visit = await em.findOne(Visit, { id: visitId }, { populate: ['athlete'] });
    if (!visit) return;
    await keepReading(em, await sideSetting(em, visitId, side), inputs, result);
    const coachId = visit.athlete.unwrap().coach.id;
    await tell(unit, { coachId }, { type: 'reading', visitId, side });
  });
};

export const deriveReadingJob = handles({
  type: DERIVE_READING,
  lockKey: ({ visitId, side }) => `${visitId} ${side}`,
  run,
  expireInMinutes: 5,
  retryLimit: 3,
});
