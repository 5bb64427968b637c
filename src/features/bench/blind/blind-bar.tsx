import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import { supportWords } from '#src/ui/words.ts';
import { BarFrame } from '../bar-frame.tsx';
import { useNarrow } from '../use-media.ts';
import { useProgress } from './use-progress.ts';

/** Whose clip it is, how far one has come, whether all is saved, undo and redo. */
export function BlindBar({ second }: { second: SecondMarkingDocument }) {
  const { athlete, visit, repNumber, supportSide } = second;
  const narrow = useNarrow();
  const { words } = useProgress();
  const what = `rep ${repNumber}, ${supportWords(supportSide)}`;
  return (
    <BarFrame
      title={`Mark again, blind: ${athlete.name}, ${what}`}
      heading={narrow ? `Again, blind: ${words}` : `Mark again, blind: ${what}, ${words}`}
      athlete={athlete}
      visit={visit}
    />
  );
}
