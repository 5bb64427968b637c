import { randomUUID } from 'node:crypto';
import type { APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from './ask.ts';
import { placesOf, truth } from './right-early.ts';

/** Sends the marks of a rep (from 0) on all its frames but those that are marked already. */
export async function markRest(
  request: APIRequestContext,
  repId: string,
  rep: number,
  marked: readonly number[] = [],
): Promise<void> {
  const commands = placesOf(rep)
    .filter(({ frame }) => !marked.includes(frame))
    .map(({ frame, landmark, u, v }) => ({
      id: randomUUID(),
      frame,
      landmark,
      baseRevision: 0,
      set: { to: 'point' as const, u, v, pictureLongEdge: truth.picture.height },
    }));
  const { outcomes } = await ask(request, routes.saveMarks, {
    params: { id: repId },
    body: { commands },
  });
  const refused = outcomes.filter(({ outcome }) => outcome !== 'applied');
  if (refused.length > 0) throw new Error(`${refused.length} marks were not taken`);
}

/** Names a rep of the clip (from 0) and marks it. */
export async function addMarkedRep(
  request: APIRequestContext,
  clipId: string,
  rep: number,
): Promise<void> {
  const own = truth.reps[rep];
  if (own === undefined) throw new RangeError(`the clip has no rep ${rep}`);
  const { id } = await ask(request, routes.addRep, {
    params: { id: clipId },
    body: {
      supportSide: own.supportSide,
      startFrame: own.firstFrame,
      endFrame: own.lastFrame,
    },
  });
  await markRest(request, id, rep);
}
