import { createContext, useContext } from 'react';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { OrderedFrame } from './blind-order.ts';

/** What a second marking adds to the Bench's own contexts. */
export interface Blind {
  readonly id: string;
  readonly order: readonly OrderedFrame[];
  readonly next: FrameIndex | null;
}

/** Null on the Bench itself. */
export const BlindContext = createContext<Blind | null>(null);

export const useBlind = (): Blind => {
  const blind = useContext(BlindContext);
  if (!blind) throw new Error('useBlind outside a second marking');
  return blind;
};
