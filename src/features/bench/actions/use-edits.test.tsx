import { QueryClientProvider } from '@tanstack/react-query';
import { renderHook } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Rep } from '#shared/contracts/reps.ts';
import { routes } from '#shared/contracts/routes.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { benchOptions } from '#src/api/bench.queries.ts';
import { makeQueryClient } from '#src/api/query-client.ts';
import { createHand } from '#src/canvas/hand.ts';
import { createPictureBoard } from '#src/canvas/picture-board.ts';
import { benchDocument } from '#tests/support/bench-document.ts';
import { fakeApi, Refuse } from '#tests/support/fake-api.ts';
import { aRep, clipId, coachId } from '#tests/support/records.ts';
import { BenchToolsContext, type BenchTools } from '../bench-context.ts';
import { markQueueOf } from '../queue/open-queue.ts';
import { createBenchStore } from '../store/bench-store.ts';
import { useEdits } from './use-edits.ts';

/** The edits of an open Bench with one rep, before a server that refuses an edit of an older version. */
const openBench = () => {
  let stored: Rep = aRep(1);
  const api = fakeApi().on(routes.editRep, ({ body }) => {
    const { version, ...change } = routes.editRep.body.parse(body);
    if (version !== stored.version) return new Refuse('edited-meanwhile');
    stored = { ...stored, ...change, boundaries: stored.boundaries, version: version + 1 };
    return stored;
  });
  const client = makeQueryClient(() => undefined);
  const document = benchDocument({ id: clipId });
  const { queryKey } = benchOptions(clipId);
  client.setQueryData(queryKey, { ...document, reps: [{ rep: stored, marks: [] }] });
  const tools: BenchTools = {
    clipId,
    store: createBenchStore({
      frame: frameIndex(0),
      repId: stored.id,
      desk: 'reps',
      mayMark: true,
    }),
    hand: createHand(),
    board: createPictureBoard(),
    queue: markQueueOf(coachId),
    times: [],
    frameSize: { width: 1080, height: 1920 },
    copySize: { width: 720, height: 1280 },
    follow: null,
  };
  const { result } = renderHook(() => useEdits(), {
    wrapper: ({ children }) => (
      <QueryClientProvider client={client}>
        <BenchToolsContext value={tools}>{children}</BenchToolsContext>
      </QueryClientProvider>
    ),
  });
  const shown = () => client.getQueryData(queryKey)?.reps[0]?.rep;
  return { edits: result.current, api, id: stored.id, shown };
};

describe('edits of a rep', () => {
  it('in quick succession each stand on the one before', async () => {
    const { edits, api, id, shown } = openBench();
    await Promise.all([
      edits.editRep(id, { startFrame: 3 }),
      edits.editRep(id, { endFrame: 90 }),
      edits.editRep(id, { excluded: 'hopped' }),
    ]);
    expect(shown()).toMatchObject({ startFrame: 3, endFrame: 90, excluded: 'hopped', version: 4 });
    expect(api.calls(routes.editRep)).toHaveLength(3);
  });

  it('that fail keep none of the next from being sent', async () => {
    const { edits, api, id, shown } = openBench();
    api.setOffline(true);
    const failed = edits.editRep(id, { startFrame: 3 });
    await expect(failed).rejects.toThrow();
    api.setOffline(false);
    await edits.editRep(id, { endFrame: 90 });
    expect(shown()).toMatchObject({ startFrame: aRep(1).startFrame, endFrame: 90 });
  });
});
