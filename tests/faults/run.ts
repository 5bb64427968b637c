import { setTimeout as pause } from 'node:timers/promises';
import { chanceOf } from '#tests/study/chance.ts';
import { erasure } from './erasure.ts';
import { film } from './film.ts';
import { formUpload } from './form.ts';
import { hiddenHead } from './hidden-head.ts';
import { FAULT_WORDS, FAULTS } from './instance.ts';
import { letter } from './letters.ts';
import { marking } from './marks.ts';
import { expectNothingHalf } from './nothing-half.ts';
import type { Place } from './place.ts';
import { quiet } from './quiet.ts';
import { report } from './report.ts';
import type { Task } from './task.ts';
import { preparation, upload } from './upload.ts';

const TASKS: readonly [Task, ...Task[]] = [
  upload,
  formUpload,
  preparation,
  marking,
  erasure,
  hiddenHead,
  film,
  report,
  letter,
];

/** What a seed says: the same task, fault and moment each time; the machine decides what that moment hits. */
export const faultOf = (seed: number) => {
  const chance = chanceOf(seed);
  const task = chance.pick(TASKS);
  const fault = chance.pick(FAULTS);
  const after = Math.round(chance.between(0, task.within));
  const lasts = Math.round(chance.between(0, 400));
  return { task, fault, after, lasts };
};

export const saidOf = (seed: number): string => {
  const { task, fault, after, lasts } = faultOf(seed);
  return `seed ${seed}: ${FAULT_WORDS[fault]} ${after} ms into ${task.name}, for ${lasts} ms`;
};

/** Where nobody may mount a disk, none can be full. */
export const canRun = ({ instance }: Place, seed: number): boolean =>
  faultOf(seed).fault !== 'disk' || instance.canBeFull;

/**
 * One task during which one thing goes wrong and is put right again.
 * @throws where something that was acknowledged is lost, something half made stays, or something is not taken up again
 */
export const runOne = async (place: Place, seed: number): Promise<void> => {
  const { task, fault, after, lasts } = faultOf(seed);
  const { instance } = place;
  const { act, kept } = await task.prepare(place);
  const goWrong = async () => {
    await pause(after);
    await instance.begin(fault);
    await pause(lasts);
    await instance.end(fault);
  };
  const ends = await Promise.allSettled([act(), goWrong()]);
  for (const end of ends) if (end.status === 'rejected') throw end.reason;
  await quiet(place);
  await kept();
  await expectNothingHalf(place);
};
