import { afterAll, beforeAll, describe, it } from 'vitest';
import { type Instance, startInstance } from '#tests/faults/instance.ts';
import { openPlace, type Place } from '#tests/faults/place.ts';
import { canRun, runOne, saidOf } from '#tests/faults/run.ts';

/** Of what `npm run faults` does: every kind of work, and everything that can go wrong. */
const SEEDS = [2, 3, 4, 5, 8, 10, 12, 14, 18, 20, 23, 24];

const PATIENT = 240_000;
let instance: Instance;
let place: Place;
beforeAll(async () => {
  instance = await startInstance();
  place = await openPlace(instance);
}, PATIENT);
afterAll(async () => {
  await place?.close();
  await instance?.close();
}, PATIENT);

describe('whatever goes wrong, nothing is lost and nothing is left half made', () => {
  it.for(SEEDS.map((seed) => ({ seed, said: saidOf(seed) })))(
    '$said',
    { timeout: PATIENT },
    async ({ seed }, { skip }) => {
      skip(!canRun(place, seed), 'mounting a disk needs root, or sudo that asks nothing');
      await runOne(place, seed);
    },
  );
});
