import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { expect } from '../../support/app.ts';
import { ask } from './ask.ts';
import { PREPARED_WITHIN } from './visit.ts';

/** The demo's clip of a front lift, once it is prepared and its first rep is marked. */
export async function markedClip(request: APIRequestContext) {
  const { items } = await ask(request, routes.listAthletes, { query: { q: 'Quill' } });
  const athlete = items[0];
  if (athlete === undefined) throw new Error('the demo has no such athlete');
  const { items: visits } = await ask(request, routes.listVisits, { params: { id: athlete.id } });
  const find = async () => {
    for (const { id } of visits) {
      const { clips } = await ask(request, routes.visit, { params: { id } });
      const clip = clips.find(({ view, state }) => view === 'front' && state === 'ready');
      if (clip === undefined) continue;
      const reps = await ask(request, routes.listReps, { params: { id: clip.id } });
      const rep = reps.items.find(({ markedFrames }) => markedFrames > 0);
      if (rep !== undefined) return { clip, rep, athleteId: athlete.id };
    }
    return null;
  };
  await expect.poll(async () => (await find()) !== null, { timeout: PREPARED_WITHIN }).toBe(true);
  const found = await find();
  if (found === null) throw new Error('the demo clip is gone again');
  return found;
}
