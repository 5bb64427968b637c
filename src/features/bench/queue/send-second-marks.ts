import { routes } from '#shared/contracts/routes.ts';
import type { SecondMarkCommand } from '#shared/contracts/second-markings.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import type { QueueDeps, SendFailure } from './mark-queue.ts';
import type { QueuedMark } from './queue-core.ts';

const commandOf = ({
  id,
  frame,
  landmark,
  baseRevision,
  after,
}: QueuedMark): SecondMarkCommand => ({
  id,
  frame,
  landmark,
  baseRevision,
  set:
    after === null
      ? { to: 'none' }
      : after.to === 'hidden'
        ? { to: 'hidden' }
        : {
            to: 'point',
            u: after.point.u,
            v: after.point.v,
            pictureLongEdge: after.pictureLongEdge,
          },
});

const failureOf = (error: unknown): SendFailure => {
  if (isProblem(error, 'offline')) return { is: 'offline' };
  if (isProblem(error, 'sign-in-needed')) return { is: 'signed-out' };
  if (isProblem(error, 'not-found'))
    return { is: 'refused', whole: true, reason: 'This second marking was given up.' };
  if (isProblem(error, 'not-allowed', 'second-marking-finished'))
    return { is: 'refused', whole: true, reason: error.message };
  if (isProblem(error, 'not-asked-here', 'invalid-input'))
    return { is: 'refused', whole: false, reason: error.message };
  return { is: 'trouble' };
};

/** Sends second marks; the `repId` of each is the id of its second marking. */
export const sendSecondMarks: QueueDeps['send'] = async (batch) => {
  try {
    const { outcomes } = await call(routes.saveSecondMarks, {
      params: { id: batch[0]?.repId ?? '' },
      body: { commands: batch.map(commandOf) },
    });
    return { outcomes, rep: null };
  } catch (error) {
    return failureOf(error);
  }
};
