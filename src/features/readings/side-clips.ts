import { useQueries, useQuery } from '@tanstack/react-query';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { repsOptions } from '#src/api/bench.queries.ts';
import { visitOptions } from '#src/api/visits.queries.ts';

/** Clips of a visit that show a side, those that can be played first. */
export const clipsOfSide = (clips: readonly Clip[], side: Side): Clip[] =>
  clips
    .filter(({ supportSide, state }) => state !== 'refused' && (supportSide ?? side) === side)
    .sort((a, b) => Number(b.state === 'ready') - Number(a.state === 'ready'));

export interface NamedRep {
  readonly rep: Rep;
  readonly clip: Clip;
}

/** The reps of one side over all clips of the visit, with what is still loading or failed. */
export function useSideReps(visitId: string, side: Side) {
  const visit = useQuery(visitOptions(visitId));
  const ready = (visit.data?.clips ?? []).filter(({ state }) => state === 'ready');
  const answers = useQueries({ queries: ready.map(({ id }) => repsOptions(id)) });
  const failed = [visit, ...answers].find(({ isError, data }) => isError && !data);
  const reps: NamedRep[] = ready.flatMap((clip, n) =>
    (answers[n]?.data?.items ?? []).flatMap((rep) =>
      rep.supportSide === side ? [{ rep, clip }] : [],
    ),
  );
  return {
    reps,
    pending: visit.isPending || answers.some(({ isPending }) => isPending),
    error: failed?.error ?? null,
    retry: () => void failed?.refetch(),
  };
}
