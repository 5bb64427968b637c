import { useState } from 'react';
import type { Side } from '#shared/contracts/primitives.ts';
import { Button } from '#src/ui/button.tsx';
import { Segmented } from '#src/ui/segmented.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';

const SIDES: readonly { value: Side; label: string }[] = [
  { value: 'left', label: 'Left leg' },
  { value: 'right', label: 'Right leg' },
];

/** A new rep: step to its first frame, then to its last, and say which leg is stood on. */
export function AddRep() {
  const { store, times } = useBenchTools();
  const { clip } = useBenchDocument();
  const { reps } = useBenchModel();
  const edits = useEdits();
  const frame = useBench((state) => state.frame);
  const [start, setStart] = useState<number | null>(null);
  const [end, setEnd] = useState<number | null>(null);
  const [side, setSide] = useState<Side | null>(clip.supportSide);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const [open, setOpen] = useState(reps.length === 0);
  const wholeClip = times.length - 1;
  const span =
    start !== null && end !== null && end > start ? { startFrame: start, endFrame: end } : null;
  const backwards = start !== null && end !== null && end <= start;

  const add = async () => {
    if (!span || !side) return;
    setBusy(true);
    setError(null);
    try {
      await edits.addRep({ ...span, supportSide: side });
      setStart(null);
      setEnd(null);
      setOpen(false);
      store.setState({ desk: 'course' });
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  if (!open)
    return (
      <div className="border-t border-rule py-4">
        <Button onClick={() => setOpen(true)}>Name another rep</Button>
      </div>
    );
  return (
    <section aria-label="New rep" className="border-t border-rule py-4">
      <h4 className="font-bold">New rep</h4>
      <p className="text-note text-soft">
        From quiet stance on both feet until the foot is down again. Three still seconds before the
        lift belong to it.
      </p>
      <dl className="my-3 grid grid-cols-[auto_auto_1fr] items-center gap-x-4 gap-y-2">
        <dt>First frame</dt>
        <dd className="min-w-[3em] font-bold">{start ?? '–'}</dd>
        <dd>
          <Button onClick={() => setStart(frame)}>Take frame {frame}</Button>
        </dd>
        <dt>Last frame</dt>
        <dd className="min-w-[3em] font-bold">{end ?? '–'}</dd>
        <dd>
          <Button onClick={() => setEnd(frame)}>Take frame {frame}</Button>
        </dd>
      </dl>
      {reps.length === 0 && start === null && end === null && (
        <p className="mb-3 text-note">
          Only one lift in this clip?{' '}
          <button
            type="button"
            className="min-h-[24px] underline underline-offset-[3px]"
            onClick={() => {
              setStart(0);
              setEnd(wholeClip);
            }}
          >
            Take the whole clip
          </button>
        </p>
      )}
      {backwards && (
        <p className="mb-3 text-note font-bold text-alarm">
          The last frame must come after the first.
        </p>
      )}
      <Segmented legend="Stands on" choices={SIDES} value={side} onChange={setSide} />
      {error !== null && (
        <div className="mt-3">
          <ErrorState error={error} />
        </div>
      )}
      <div className="mt-4 flex gap-3">
        <Button look="primary" disabled={!span || !side} busy={busy} onClick={() => void add()}>
          Add this rep
        </Button>
        {reps.length > 0 && <Button onClick={() => setOpen(false)}>Not now</Button>}
      </div>
    </section>
  );
}
