import { useId, useState } from 'react';
import { useStore } from 'zustand';
import { useStatus } from '#src/ui/status.tsx';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { DuskButton } from '../dusk-button.tsx';
import { isDraft, type StandsOn, touchedOnce } from '../model/draft.ts';
import { useGoesOnHere } from '../use-goes-on-here.ts';
import type { Following } from './following.ts';
import { foundWords, noRepsWords, runWords, saidWords } from './follow-words.ts';
import { keyframesOf } from './keyframes.ts';
import { useFollow } from './use-follow.ts';
import { useFollowState } from './use-follow-state.ts';

/** What the computer does with the marks: how a touch was taken, how far following is, what was found. */
export function FollowPanel() {
  const { follow } = useBenchTools();
  return follow ? <Panel follow={follow} /> : null;
}

function Panel({ follow }: { follow: Following }) {
  const { may } = useBenchDocument();
  const { current } = useBenchModel();
  const { run, said, found } = useStore(follow.store);
  const { keepTouch } = useFollow();
  // following begins and ends with the button that did it gone
  const here = useGoesOnHere<HTMLElement>(`${run.is} ${Array.isArray(found) ? found.length : 0}`);
  if (!may.mark) return null;
  return (
    <section
      ref={here}
      tabIndex={-1}
      aria-label="Marks that follow"
      className="text-note leading-[21px]"
    >
      <div role="status">
        {said && (
          <p className={said.is === 'refused' ? 'text-ochre-pale' : ''}>{saidWords(said)}</p>
        )}
        {run.is === 'failed' && <p className="text-ochre-pale">{run.message}</p>}
        {found && run.is === 'idle' && 'code' in found && <p>{noRepsWords(found)}</p>}
      </div>
      {said?.is === 'snapped' && (
        <DuskButton className="mt-2" onClick={keepTouch}>
          Keep my touch
        </DuskButton>
      )}
      {run.is === 'following' ? (
        <Progress run={run} stop={follow.stop} />
      ) : (
        <>
          {found && !('code' in found) && found.length > 0 && <Found found={found} />}
          {isDraft(current) ? <Collecting /> : <Again />}
        </>
      )}
    </section>
  );
}

function Progress({ run, stop }: { run: Parameters<typeof runWords>[0]; stop: () => void }) {
  const id = useId();
  return (
    <div className="mt-2">
      <p id={id} className="flex justify-between gap-3">
        <span className="font-bold">Following the marks</span>
        <span className="text-dusk-soft">{runWords(run)}</span>
      </p>
      <progress
        aria-labelledby={id}
        className="bench-progress mt-1 block w-full"
        max={Math.max(1, run.total)}
        value={run.done}
      />
      <p className="mt-1 flex items-center justify-between gap-3 text-dusk-soft">
        <span>You can go on stepping.</span>
        <DuskButton onClick={stop}>Stop</DuskButton>
      </p>
    </div>
  );
}

function Found({ found }: { found: Parameters<typeof foundWords>[0] }) {
  const { take } = useFollow();
  const say = useStatus();
  const [busy, setBusy] = useState(false);
  const run = async () => {
    setBusy(true);
    try {
      await take(found);
    } catch (error) {
      say(error instanceof Error ? error.message : 'The reps were not named.');
    } finally {
      setBusy(false);
    }
  };
  return (
    <div className="mt-2">
      <p>{foundWords(found)}</p>
      <DuskButton primary className="mt-2 w-full" disabled={busy} onClick={() => void run()}>
        {found.length === 1 ? 'Take this rep' : `Take these ${found.length} reps`}
      </DuskButton>
    </div>
  );
}

const STANDS: readonly { value: StandsOn; label: string }[] = [
  { value: 'left', label: 'left' },
  { value: 'right', label: 'right' },
  { value: 'both', label: 'both in turn' },
];

/** Before there is a rep: which leg is stood on, and following what was touched so far. */
function Collecting() {
  const { store } = useBenchTools();
  const { current } = useBenchModel();
  const standsOn = useBench((state) => state.standsOn);
  const kept = useBench((state) => state.touchesKept);
  const { start } = useFollow();
  const again = useFollowState() === 'found';
  const id = useId();
  const touched = current ? Object.values(touchedOnce(current.marks)) : [];
  const points = touched.filter((mark) => mark.to === 'point').length;
  return (
    <>
      <fieldset className="mt-2">
        <legend className="text-dusk-soft">Stands on</legend>
        <div className="flex flex-wrap gap-x-4">
          {STANDS.map(({ value, label }) => (
            <label key={value} className="flex min-h-[44px] items-center gap-2">
              <input
                type="radio"
                name={id}
                checked={standsOn === value}
                onChange={() => store.setState({ standsOn: value, chosen: null, lastPlaced: null })}
                className="size-4 accent-dusk-ink"
              />
              {label}
            </label>
          ))}
        </div>
      </fieldset>
      {points > 0 && (
        <>
          <p className="text-dusk-soft">
            {kept
              ? 'What you touch is kept on this device, also over a reload, until the clip has a rep.'
              : 'This browser keeps nothing: what you touch is lost if the page is closed before the clip has a rep.'}
          </p>
          <DuskButton className="mt-2 w-full" onClick={() => void start()}>
            {points === 1 ? 'Follow this mark' : `Follow these ${points} marks`}
            {again && ' again'}
          </DuskButton>
        </>
      )}
    </>
  );
}

/** On a clip with reps: the hands’ marks can be followed through all of them. */
function Again() {
  const { reps } = useBenchModel();
  const { start } = useFollow();
  if (keyframesOf(reps).size === 0) return null;
  return (
    <DuskButton className="mt-2 w-full" onClick={() => void start()}>
      Follow the marks through all reps
    </DuskButton>
  );
}
