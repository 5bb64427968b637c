import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, renderHook, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { seconds } from '#shared/timing/units.ts';
import type { Reach, TakeLook } from '#src/tracking/take/look-at-take.ts';
import { useTakeLook } from './use-take-look.ts';

const open = { told: 'cannot-tell', why: 'no-lift' } as const;
const seenOf = (reach: Reach): TakeLook => ({
  ...{ head: open, feet: open, still: open, rise: open, dots: open },
  lookedAt: seconds(reach === 'quick' ? 4 : 15),
  length: seconds(15),
});

const looking = (look: (reach: Reach) => Promise<TakeLook>) => {
  const reaches: Reach[] = [];
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  const options = (reach: Reach) => ({
    queryKey: ['take', 'clip', 'a', reach],
    queryFn: () => {
      reaches.push(reach);
      return look(reach);
    },
  });
  const { result } = renderHook(() => useTakeLook(options, true), {
    wrapper: ({ children }) => (
      <QueryClientProvider client={client}>{children}</QueryClientProvider>
    ),
  });
  return { result, reaches };
};

describe('useTakeLook', () => {
  it('looks at the rest only once asked to, and keeps what it has seen until then', async () => {
    let tell = (_: TakeLook): void => undefined;
    const { result, reaches } = looking((reach) =>
      reach === 'quick'
        ? Promise.resolve(seenOf('quick'))
        : new Promise((resolve) => (tell = resolve)),
    );
    await waitFor(() => expect(result.current.look).toEqual(seenOf('quick')));
    expect(reaches).toEqual(['quick']);
    act(() => result.current.lookAtRest());
    await waitFor(() => expect(reaches).toEqual(['quick', 'whole']));
    expect(result.current).toMatchObject({ look: seenOf('quick'), rest: 'looking' });
    tell(seenOf('whole'));
    await waitFor(() => expect(result.current.look).toEqual(seenOf('whole')));
  });

  it('keeps what it has seen where the rest cannot be read', async () => {
    const { result } = looking((reach) =>
      reach === 'quick' ? Promise.resolve(seenOf('quick')) : Promise.reject(new Error('damaged')),
    );
    await waitFor(() => expect(result.current.look).toBeDefined());
    act(() => result.current.lookAtRest());
    await waitFor(() => expect(result.current.rest).toBe('failed'));
    expect(result.current).toMatchObject({ look: seenOf('quick'), failed: false });
  });
});
