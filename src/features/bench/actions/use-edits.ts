import { useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { ClipGeometry } from '#shared/contracts/clips.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { routes } from '#shared/contracts/routes.ts';
import { record } from '#shared/landmarks/commands-history.ts';
import { benchOptions } from '#src/api/bench.queries.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import { sidesKey } from '#src/api/readings.queries.ts';
import { useBenchTools } from '../bench-context.ts';
import { withClip, withoutRep, withRep } from './bench-cache.ts';
import { inverseOfChange, type RepChange } from './rep-change.ts';

export interface Edits {
  addRep: (span: { supportSide: Side; startFrame: number; endFrame: number }) => Promise<Rep>;
  editRep: (repId: string, change: RepChange, options?: { undoable: boolean }) => Promise<void>;
  deleteRep: (repId: string) => Promise<void>;
  editGeometry: (geometry: ClipGeometry, options?: { undoable: boolean }) => Promise<void>;
}

/**
 * Edits of reps and of the set-up. They need the server's answer: unlike marks they are rare, and two
 * people's edits of one rep are told apart by its version. One person's run one after another, so
 * that each knows the version which the one before has left.
 */
export function useEdits(): Edits {
  const client = useQueryClient();
  const { clipId, store } = useBenchTools();
  return useMemo(() => {
    const { queryKey } = benchOptions(clipId);
    const document = (): BenchDocument => {
      const known = client.getQueryData(queryKey);
      if (!known) throw new Error('an edit of a clip that is not open');
      return known;
    };
    const put = (change: (document: BenchDocument) => BenchDocument) => {
      client.setQueryData(queryKey, (known) => known && change(known));
      void client.invalidateQueries({ queryKey: sidesKey(document().visit.id) });
    };
    const inTurn = <T>(work: () => Promise<T>): Promise<T> =>
      client
        .getMutationCache()
        .build<T, Error, void, unknown>(client, {
          mutationFn: work,
          scope: { id: `edits of ${clipId}` },
        })
        .execute();
    /** What was edited meanwhile is shown before the person tries again. */
    const orRefresh = async <T>(work: Promise<T>): Promise<T> => {
      try {
        return await work;
      } catch (error) {
        if (isProblem(error, 'edited-meanwhile')) await client.invalidateQueries({ queryKey });
        throw error;
      }
    };
    return {
      async addRep(body) {
        const rep = await call(routes.addRep, { params: { id: clipId }, body });
        put((known) => withRep(known, rep));
        store.setState({ repId: rep.id });
        return rep;
      },
      editRep: (repId, change, { undoable } = { undoable: true }) =>
        inTurn(async () => {
          const before = document().reps.find((each) => each.rep.id === repId)?.rep;
          if (!before) return;
          const body = { ...change, version: before.version };
          const rep = await orRefresh(call(routes.editRep, { params: { id: repId }, body }));
          put((known) => withRep(known, rep));
          if (!undoable) return;
          const inverse = inverseOfChange(before, change);
          store.setState((state) => ({
            history: record(state.history, { kind: 'rep', repId, before: inverse, after: change }),
          }));
        }),
      deleteRep: (repId) =>
        inTurn(async () => {
          await call(routes.deleteRep, { params: { id: repId } });
          put((known) => withoutRep(known, repId));
        }),
      editGeometry: (geometry, { undoable } = { undoable: true }) =>
        inTurn(async () => {
          const { clip } = document();
          const body = { geometry, version: clip.version };
          const answer = await orRefresh(call(routes.editClip, { params: { id: clipId }, body }));
          put((known) => withClip(known, answer));
          if (!undoable) return;
          store.setState((state) => ({
            history: record(state.history, {
              kind: 'clip',
              before: clip.geometry,
              after: geometry,
            }),
          }));
        }),
    };
  }, [client, clipId, store]);
}
