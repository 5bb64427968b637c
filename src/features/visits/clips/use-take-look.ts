import { useQuery, type UseQueryOptions } from '@tanstack/react-query';
import { useState } from 'react';
import type { Reach, TakeLook } from '#src/tracking/take/look-at-take.ts';

export interface TakeLooked {
  readonly look: TakeLook | undefined;
  readonly failed: boolean;
  /** What was not seen in the first seconds; `failed` too where a clip says to be longer than its pictures last. */
  readonly rest: 'open' | 'looking' | 'failed';
  readonly lookAtRest: () => void;
}

/** A look at what is seen of a take within seconds, then at all of it once that is asked for. */
export const useTakeLook = (
  options: (reach: Reach) => UseQueryOptions<TakeLook, Error, TakeLook, string[]>,
  enabled: boolean,
): TakeLooked => {
  const [asked, setAsked] = useState(false);
  const quick = useQuery({ ...options('quick'), enabled });
  const whole = useQuery({ ...options('whole'), enabled: enabled && asked });
  return {
    look: whole.data ?? quick.data,
    failed: quick.isError,
    rest: whole.isFetched ? 'failed' : asked ? 'looking' : 'open',
    lookAtRest: () => setAsked(true),
  };
};
