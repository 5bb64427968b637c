import { capital } from '#src/ui/figures.ts';
import { clipWords, supportWords, VIEW_WORDS } from '#src/ui/words.ts';
import { BarFrame } from './bar-frame.tsx';
import { anyFollowed, hollowFrames } from './look/followed.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from './bench-context.ts';
import { OthersLine } from './others/others-line.tsx';
import type { Desk } from './store/bench-store.ts';
import { isDraft } from './model/draft.ts';
import { LOOK, MARK, type Tool } from './store/tools.ts';
import { useNarrow } from './use-media.ts';

const DESKS: readonly { desk: Desk; label: string }[] = [
  { desk: 'course', label: 'Course' },
  { desk: 'reps', label: 'Reps' },
  { desk: 'look', label: 'Look' },
  { desk: 'set-up', label: 'Set-up' },
  { desk: 'head', label: 'Head' },
  { desk: 'comments', label: 'Comments' },
];

/** Whose clip it is, whether all is saved, undo and redo. */
export function BenchBar() {
  const { athlete, visit, clip } = useBenchDocument();
  const { current, reps } = useBenchModel();
  const narrow = useNarrow();
  const rep = current && !isDraft(current) ? current.rep : null;
  const what = rep
    ? `${capital(supportWords(rep.supportSide))}, ${VIEW_WORDS[rep.view]}, rep ${rep.number} of ${reps.length}`
    : `${clipWords(clip)}, no rep yet`;
  const short = rep ? `${rep.supportSide}, rep ${rep.number}` : 'no rep yet';
  return (
    <BarFrame
      title={`${athlete.name}, ${what}`}
      heading={narrow ? `${athlete.name}, ${short}` : what}
      athlete={athlete}
      visit={visit}
    >
      <OthersLine />
    </BarFrame>
  );
}

/** No landmark is placed beside the head's box; a shape or a line that was begun belongs to the desk that is left. */
const toolAt = (next: Desk, before: Desk, tool: Tool, mayMark: boolean): Tool => {
  if (next === 'head') return LOOK;
  if (before === 'head') return mayMark ? MARK : LOOK;
  return tool.kind === 'line' || tool.kind === 'shape' ? MARK : tool;
};

/** What the right side shows. */
export function DeskTabs() {
  const { store } = useBenchTools();
  const { comments, may } = useBenchDocument();
  const { reps, current } = useBenchModel();
  const desk = useBench((state) => state.desk);
  const open = comments.filter((each) => each.answerTo === null && !each.resolved).length;
  const hollow = hollowFrames(reps);
  const counts: Partial<Record<Desk, number>> = {
    reps: reps.length,
    look: hollow,
    comments: open,
  };
  return (
    <nav aria-label="Beside the clip" className="flex flex-wrap gap-x-5 border-b border-rule">
      {DESKS.filter(
        ({ desk: each }) => each !== 'look' || anyFollowed(reps) || desk === 'look',
      ).map(({ desk: each, label }) => (
        <button
          key={each}
          type="button"
          aria-current={desk === each ? 'true' : undefined}
          onClick={() =>
            store.setState(({ tool }) => ({
              desk: each,
              tool: toolAt(each, desk, tool, may.mark),
            }))
          }
          className={`-mb-px min-h-[44px] border-b-2 ${
            desk === each ? 'border-ink font-bold' : 'border-transparent text-soft hover:text-ink'
          }`}
        >
          {each === 'course' && current && !isDraft(current)
            ? `Course, rep ${current.rep.number}`
            : label}
          {counts[each] ? ` (${counts[each]})` : ''}
        </button>
      ))}
    </nav>
  );
}
