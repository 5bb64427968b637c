import { useMemo } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import { landmark } from '#shared/landmarks/table.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { useBench, useBenchModel } from '../bench-context.ts';
import { marksOn } from '../model/bench-model.ts';
import { expectedPlace } from '../model/expected-place.ts';
import { useAsked } from '../model/use-model.ts';
import { toolAsks } from '../store/tools.ts';

/** What the next press on the picture is for. */
export interface Target {
  /** Null for a tool that draws. */
  readonly landmark: LandmarkId | null;
  readonly words: string;
  /** Where it is expected; null where nothing says so. */
  readonly expected: FramePoint | null;
}

export function useTarget(): Target | null {
  const asked = useAsked();
  const tool = useBench((state) => state.tool);
  const frame = useBench((state) => state.frame);
  const { current } = useBenchModel();
  return useMemo(() => {
    const words = toolAsks(tool);
    if (words !== null) return { landmark: null, words, expected: null };
    if (asked === null || !current) return null;
    const here = marksOn(current, frame)[asked];
    return {
      landmark: asked,
      words: landmark(asked).label,
      expected: here?.to === 'point' ? here.point : expectedPlace(current.marks, frame, asked),
    };
  }, [asked, tool, frame, current]);
}
