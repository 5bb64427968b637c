import { useContext, useEffect, useRef } from 'react';
import { lostStretches, type Stretch } from '#shared/head/heads.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { Progress } from '#src/ui/progress.tsx';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { useBench, useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { useGoesOnHere } from '../use-goes-on-here.ts';
import { HeadContext, type HiddenHead } from './use-hidden-head.ts';

const named = ({ from, to }: Stretch): string =>
  from === to ? `Frame ${from}` : `Frames ${from} to ${to}`;

/** A box around the head: drawn once, followed, looked at; then a replay can be made that hides it. */
export function HeadDesk() {
  const head = useContext(HeadContext);
  const heading = useGoesOnHere<HTMLHeadingElement>(
    head && [head.run.is, head.heads.length > 0, head.changed, head.saved?.looked?.at].join(),
  );
  if (!head) return null;
  return (
    <div className="max-w-[44em] py-2">
      <h3 ref={heading} tabIndex={-1} className="text-sub font-bold">
        Hide the head
      </h3>
      <p className="mt-1">
        Draw a box around the head on one frame; it is followed through the clip. A replay that
        hides the head shows a mosaic there.
      </p>
      <p className="mt-1 text-note text-soft">
        This does not make the clip anonymous: clothes, room, tattoos and the way of moving remain.
      </p>
      {head.error && !head.page ? (
        <ErrorState error={head.error} onRetry={head.retry} />
      ) : head.page ? (
        <Steps head={head} may={head.page.may.save} />
      ) : (
        <Loading label="Loading the box" />
      )}
    </div>
  );
}

function Steps({ head, may }: { head: HiddenHead; may: boolean }) {
  const { frameSize } = useBenchTools();
  const frame = useBench((state) => state.frame);
  const { run, heads, changed, saved } = head;
  const put = useRef(false);
  const boxed = heads.length > 0;
  // the first box is where the work goes on, and it may lie off the screen
  useEffect(() => {
    if (boxed && put.current) document.querySelector<HTMLElement>('[data-head-box]')?.focus();
    put.current = false;
  }, [boxed]);
  if (run.is === 'following')
    return (
      <div className="mt-4" role="status">
        <Progress percent={100 * run.part} label="Following the box" />
        <Button className="mt-3" onClick={head.stop}>
          Stop
        </Button>
      </div>
    );
  const start = () => {
    // about a head of a person who fills the picture, at its upper middle
    const edge = Math.round(Math.max(frameSize.width, frameSize.height) / 9);
    const left = (frameSize.width - edge) / 2;
    put.current = true;
    head.draw(frame, { left, top: frameSize.height / 10, width: edge, height: edge });
  };
  return (
    <>
      {run.is === 'failed' && (
        <p role="alert" className="mt-3 text-alarm">
          {run.message}
        </p>
      )}
      {!boxed ? (
        may ? (
          <>
            <p className="mt-3">
              Go to a frame on which the whole head is clear to see, and put the box there.
            </p>
            <Button look="primary" className="mt-3" onClick={start}>
              Put a box on frame {frame}
            </Button>
          </>
        ) : (
          <p className="mt-3 text-soft">No box was drawn. The coach draws it.</p>
        )
      ) : (
        <>
          <p className="mt-3">
            Move the box and its corner on the picture until hair, chin and ears are inside. Drawn
            anew on another frame, it counts from there on.
          </p>
          {changed && may && (
            <div className="mt-3 flex flex-wrap gap-3">
              <Button look="primary" onClick={() => void head.follow()}>
                Follow the box through the clip
              </Button>
              <Button look="plain" onClick={head.discard}>
                Take back what was drawn
              </Button>
            </div>
          )}
          {!changed && <Lost stretches={lostStretches(heads)} />}
          {saved && <Looked head={head} saved={saved} may={may} />}
        </>
      )}
    </>
  );
}

/** Where to look first. */
function Lost({ stretches }: { stretches: readonly Stretch[] }) {
  const { store } = useBenchTools();
  if (stretches.length === 0) return <p className="mt-3">The box was followed on every frame.</p>;
  return (
    <section aria-label="Doubtful frames" className="mt-3">
      <h4 className="font-bold">Look here first</h4>
      <p className="text-note text-soft">
        The head was lost here: the last box grows until it is found again. Draw the box anew in the
        middle of a stretch if too much is covered.
      </p>
      <ul className="mt-1 flex flex-wrap gap-x-4">
        {stretches.map((stretch) => (
          <li key={stretch.from}>
            <Button
              look="plain"
              onClick={() => {
                store.setState({ playing: false });
                goTo(store, frameIndex((stretch.from + stretch.to) >> 1));
              }}
            >
              {named(stretch)}
            </Button>
          </li>
        ))}
      </ul>
    </section>
  );
}

function Looked({
  head,
  saved,
  may,
}: {
  head: HiddenHead;
  saved: NonNullable<HiddenHead['saved']>;
  may: boolean;
}) {
  const { looked } = saved;
  if (looked)
    return (
      <p className="mt-4" role="status">
        {looked.by.name} looked at it, {moment(looked.at)}: the head is covered. A replay can hide
        it now.
      </p>
    );
  return (
    <div className="mt-4 border-t border-rule pt-4">
      <p>Play the clip slowly, once through. Is the head inside the box on every frame?</p>
      {may && (
        <Button
          look="primary"
          className="mt-3"
          busy={head.confirming}
          busyLabel="Saving…"
          onClick={head.confirm}
        >
          I have looked: the head is covered
        </Button>
      )}
    </div>
  );
}
