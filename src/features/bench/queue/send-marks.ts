import { routes } from '#shared/contracts/routes.ts';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import type { QueueDeps, SendFailure } from './mark-queue.ts';
import type { QueuedMark } from './queue-core.ts';

const setOf = ({ after }: QueuedMark): MarkCommand['set'] => {
  if (!after) return { to: 'none' };
  if (after.to === 'hidden') return { to: 'hidden' };
  const { point, source, looked, confidence, pictureLongEdge } = after;
  return { to: 'point', u: point.u, v: point.v, source, looked, confidence, pictureLongEdge };
};

export const commandOf = (mark: QueuedMark): MarkCommand => ({
  id: mark.id,
  frame: mark.frame,
  landmark: mark.landmark,
  baseRevision: mark.baseRevision,
  set: setOf(mark),
});

const failureOf = (error: unknown): SendFailure => {
  if (isProblem(error, 'offline')) return { is: 'offline' };
  if (isProblem(error, 'sign-in-needed')) return { is: 'signed-out' };
  if (isProblem(error, 'not-found'))
    return { is: 'refused', whole: true, reason: 'The rep of these marks was deleted.' };
  if (isProblem(error, 'not-allowed')) return { is: 'refused', whole: true, reason: error.message };
  if (isProblem(error, 'landmark-not-in-view', 'frame-out-of-range', 'invalid-input'))
    return { is: 'refused', whole: false, reason: error.message };
  return { is: 'trouble' };
};

export const sendMarks: QueueDeps['send'] = async (batch) => {
  const repId = batch[0]?.repId ?? '';
  try {
    return await call(routes.saveMarks, {
      params: { id: repId },
      body: { commands: batch.map(commandOf) },
    });
  } catch (error) {
    return failureOf(error);
  }
};
