import { createContext, useContext } from 'react';
import { useStore } from 'zustand';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Hand } from '#src/canvas/hand.ts';
import type { PictureBoard } from '#src/canvas/picture-board.ts';
import type { Size } from '#src/canvas/viewport.ts';
import type { Following } from './follow/following.ts';
import type { BenchModel } from './model/bench-model.ts';
import type { MarkQueue } from './queue/mark-queue.ts';
import type { BenchState, BenchStore } from './store/bench-store.ts';

/** What stays the same for as long as one clip is open. */
export interface BenchTools {
  readonly clipId: string;
  readonly store: BenchStore;
  readonly hand: Hand;
  readonly board: PictureBoard;
  readonly queue: MarkQueue;
  readonly times: readonly Milliseconds[];
  /** Upright source frame, and the prepared copy, px. */
  readonly frameSize: Size;
  readonly copySize: Size;
  /** Marks that follow; null where nothing is followed, as in a second marking. */
  readonly follow: Following | null;
}

export const BenchToolsContext = createContext<BenchTools | null>(null);
export const BenchDocumentContext = createContext<BenchDocument | null>(null);
export const BenchModelContext = createContext<BenchModel | null>(null);

const within = <T>(value: T | null, name: string): T => {
  if (value === null) throw new Error(`${name} outside the Bench`);
  return value;
};

export const useBenchTools = (): BenchTools =>
  within(useContext(BenchToolsContext), 'useBenchTools');
/** The server's document, as the query cache holds it. */
export const useBenchDocument = (): BenchDocument =>
  within(useContext(BenchDocumentContext), 'useBenchDocument');
/** What follows from document, waiting marks and selection. */
export const useBenchModel = (): BenchModel =>
  within(useContext(BenchModelContext), 'useBenchModel');

export function useBench<T>(select: (state: BenchState) => T): T {
  return useStore(useBenchTools().store, select);
}
