import { setTimeout as pause } from 'node:timers/promises';
import { chanceOf } from '#tests/study/chance.ts';
import { erasure } from './erasure.ts';
import { hiddenHead } from './hidden-head.ts';
import { VICTIMS } from './instance.ts';
import { letter } from './letters.ts';
import { marking } from './marks.ts';
import { expectNothingHalf } from './nothing-half.ts';
import type { Place } from './place.ts';
import { quiet } from './quiet.ts';
import type { Task } from './task.ts';
import { preparation, upload } from './upload.ts';

const TASKS: readonly [Task, ...Task[]] = [
  upload,
  preparation,
  marking,
  erasure,
  hiddenHead,
  letter,
];

/** What a seed says: the same task, part and moment each time; the machine decides what that moment hits. */
export const faultOf = (seed: number) => {
  const chance = chanceOf(seed);
  const task = chance.pick(TASKS);
  const victim = chance.pick(VICTIMS);
  const after = Math.round(chance.between(0, task.within));
  const away = Math.round(chance.between(0, 400));
  return { task, victim, after, away };
};

export const saidOf = (seed: number): string => {
  const { task, victim, after, away } = faultOf(seed);
  return `seed ${seed}: ${victim} killed ${after} ms into ${task.name}, away for ${away} ms`;
};

/**
 * One task during which one part is killed and started again.
 * @throws where something that was acknowledged is lost, something half made stays, or something is not taken up again
 */
export const runOne = async (place: Place, seed: number): Promise<void> => {
  const { task, victim, after, away } = faultOf(seed);
  const { instance } = place;
  const { act, kept } = await task.prepare(place);
  const fault = async () => {
    await pause(after);
    await instance.kill(victim);
    await pause(away);
    await instance.again(victim);
  };
  const ends = await Promise.allSettled([act(), fault()]);
  for (const end of ends) if (end.status === 'rejected') throw end.reason;
  await quiet(place);
  await kept();
  await expectNothingHalf(place);
};
