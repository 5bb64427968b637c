import { useBenchTools } from '../bench-context.ts';
import { othersWords } from './others.ts';
import { useOthers } from './use-others.ts';

/** One line while somebody else of the practice has this clip open: marks that move by themselves are theirs. */
export function OthersLine() {
  const { clipId } = useBenchTools();
  const words = othersWords(useOthers(clipId));
  return (
    <p role="status" className="bench-others text-note text-soft">
      {words}
    </p>
  );
}
