import { type APIRequestContext, expect } from '@playwright/test';
import type { ClipRow } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { ask } from './ask.ts';
import { PREPARED_WITHIN } from './visit.ts';

/** A clip of an athlete of the demo, once it is prepared and its marks are there. */
export async function demoClip(
  request: APIRequestContext,
  familyName: string,
  view: ClipRow['view'] = 'front',
  /** What its phone called it, where the athlete has several of a view. */
  name?: string,
): Promise<ClipRow> {
  const found = await ask(request, routes.listAthletes, { query: { q: familyName } });
  const athleteId = found.items[0]?.id ?? '';
  let clip: ClipRow | undefined;
  await expect
    .poll(
      async () => {
        const { items } = await ask(request, routes.listClips, { query: { athleteId } });
        clip = items.find(
          (each) =>
            each.view === view && each.markedFrames > 0 && (name ?? each.name) === each.name,
        );
        return clip?.state;
      },
      { timeout: PREPARED_WITHIN, intervals: [500] },
    )
    .toBe('ready');
  if (clip === undefined) throw new Error(`the demo has no marked clip of ${familyName}`);
  return clip;
}
