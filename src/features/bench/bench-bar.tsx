import { Link } from 'react-router-dom';
import { shortDay } from '#src/ui/days.ts';
import { capital } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { clipWords, supportWords, VIEW_WORDS } from '#src/ui/words.ts';
import { useUndo } from './actions/use-undo.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from './bench-context.ts';
import { OthersLine } from './others/others-line.tsx';
import { SaveState } from './save-state.tsx';
import type { Desk } from './store/bench-store.ts';
import { MARK } from './store/tools.ts';
import { useNarrow } from './use-media.ts';

const DESKS: readonly { desk: Desk; label: string }[] = [
  { desk: 'course', label: 'Course' },
  { desk: 'reps', label: 'Reps' },
  { desk: 'set-up', label: 'Set-up' },
  { desk: 'comments', label: 'Comments' },
];

const BUTTON =
  'grid min-h-[44px] min-w-[44px] place-items-center rounded px-2 text-note disabled:text-edge hover:underline';

/** Whose clip it is, whether all is saved, undo and redo. */
export function BenchBar() {
  const { store } = useBenchTools();
  const { athlete, visit, clip } = useBenchDocument();
  const { current, reps } = useBenchModel();
  const { canUndo, canRedo, undo, redo } = useUndo();
  const narrow = useNarrow();
  const what = current
    ? `${capital(supportWords(current.rep.supportSide))}, ${VIEW_WORDS[current.rep.view]}, rep ${current.rep.number} of ${reps.length}`
    : `${clipWords(clip)}, no rep yet`;
  const short = current ? `${current.rep.supportSide}, rep ${current.rep.number}` : 'no rep yet';
  return (
    <div className="bench-bar">
      <title>{`${athlete.name}, ${what} · Redshank`}</title>
      <nav aria-label="Where you are" className="flex min-w-0 items-center gap-2">
        <Link to={paths.athlete(athlete.id)} className="hidden py-2.5 tablet:inline">
          {athlete.name}
        </Link>
        <span aria-hidden="true" className="hidden text-soft tablet:inline">
          /
        </span>
        <Link to={paths.visit(visit.id)} className="whitespace-nowrap py-2.5 text-soft">
          {narrow ? '←' : shortDay(visit.day)}
          {narrow && <span className="sr-only">Back to the visit of {shortDay(visit.day)}</span>}
        </Link>
        <span aria-hidden="true" className="hidden text-soft tablet:inline">
          /
        </span>
        <h1 tabIndex={-1} className="truncate font-bold">
          {narrow ? `${athlete.name}, ${short}` : what}
        </h1>
      </nav>
      <div className="bench-bar-end">
        <OthersLine />
        <div className="hidden tablet:block">
          <SaveState />
        </div>
        {!narrow && (
          <button type="button" className={BUTTON} disabled={!canUndo} onClick={undo}>
            Undo
          </button>
        )}
        <button type="button" className={BUTTON} disabled={!canRedo} onClick={redo}>
          Redo
        </button>
        <button
          type="button"
          className={`${BUTTON} font-bold`}
          aria-label="All keys"
          onClick={() => store.setState({ keysOpen: true })}
        >
          ?
        </button>
      </div>
    </div>
  );
}

/** What the right side shows. */
export function DeskTabs() {
  const { store } = useBenchTools();
  const { comments } = useBenchDocument();
  const { reps, current } = useBenchModel();
  const desk = useBench((state) => state.desk);
  const open = comments.filter((each) => each.answerTo === null && !each.resolved).length;
  const counts: Partial<Record<Desk, number>> = { reps: reps.length, comments: open };
  return (
    <nav aria-label="Beside the clip" className="flex flex-wrap gap-x-5 border-b border-rule">
      {DESKS.map(({ desk: each, label }) => (
        <button
          key={each}
          type="button"
          aria-current={desk === each ? 'true' : undefined}
          onClick={() =>
            store.setState(({ tool }) => ({
              desk: each,
              // a shape or a line that was begun belongs to the desk that is left
              tool: tool.kind === 'line' || tool.kind === 'shape' ? MARK : tool,
            }))
          }
          className={`-mb-px min-h-[44px] border-b-2 ${
            desk === each ? 'border-ink font-bold' : 'border-transparent text-soft hover:text-ink'
          }`}
        >
          {each === 'course' && current ? `Course, rep ${current.rep.number}` : label}
          {counts[each] ? ` (${counts[each]})` : ''}
        </button>
      ))}
    </nav>
  );
}
