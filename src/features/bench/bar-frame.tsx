import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { shortDay } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { useUndo } from './actions/use-undo.ts';
import { useBenchTools } from './bench-context.ts';
import { SaveState } from './save-state.tsx';
import { useNarrow } from './use-media.ts';

const BUTTON =
  'grid min-h-[44px] min-w-[44px] place-items-center rounded px-2 text-note disabled:text-edge hover:underline';

/** The way back to athlete and visit, whether all is saved, undo, redo and the keys. */
export function BarFrame({
  title,
  heading,
  athlete,
  visit,
  children,
}: {
  /** Of the browser’s tab. */
  title: string;
  heading: string;
  athlete: { readonly id: string; readonly name: string };
  visit: BenchDocument['visit'];
  /** Stands before the state of saving. */
  children?: ReactNode;
}) {
  const { store } = useBenchTools();
  const { canUndo, canRedo, undo, redo } = useUndo();
  const narrow = useNarrow();
  return (
    <div className="bench-bar">
      <title>{`${title} · Redshank`}</title>
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
          {heading}
        </h1>
      </nav>
      <div className="bench-bar-end">
        {children}
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
