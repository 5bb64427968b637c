import { useMemo, useState } from 'react';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { Button } from '#src/ui/button.tsx';
import { posterAddress, videoAddress } from '../replay-api.ts';
import { liftReadout, turnReadout } from '#shared/replay/readout.ts';
import { calmTurn } from '#shared/replay/calm-turn.ts';
import { cropFor } from './crop.ts';
import { drawnOn } from '#shared/replay/drawn-on.ts';
import { MomentButtons, PlayButtons } from './player-buttons.tsx';
import { momentsOf } from './moments.ts';
import { Picture } from './picture.tsx';
import type { useLoop } from './use-loop.ts';

/** The span in a slow loop, what is drawn on it, and the moments to stop at. */
export function Player({
  token,
  replay,
  times,
  loop,
  comment,
  onFailed,
}: {
  token: string;
  replay: PublicReplay;
  times: readonly Milliseconds[];
  loop: ReturnType<typeof useLoop>;
  /** Whose shape is on show. */
  comment: PublicReplay['comments'][number] | null;
  /** The film could not be loaded. */
  onFailed: () => void;
}) {
  const [failed, setFailed] = useState(false);
  const crop = useMemo(
    () => cropFor(replay.overlay, replay.width, replay.height),
    [replay.overlay, replay.width, replay.height],
  );
  const calm = useMemo(
    () => ({ ...replay, overlay: calmTurn(replay.overlay, times) }),
    [replay, times],
  );
  const { primitives, ...angles } = useMemo(
    () => drawnOn(calm, times, loop.frame, comment),
    [calm, times, loop.frame, comment],
  );
  const moments = momentsOf(replay);
  const retry = () => {
    setFailed(false);
    loop.video.current?.load();
  };
  return (
    <section aria-label="The film" className="bg-dusk text-dusk-ink print:bg-transparent">
      <Picture
        video={loop.video}
        src={videoAddress(token)}
        poster={posterAddress(token)}
        label={`Your lift, standing on the ${replay.side} leg`}
        size={replay}
        crop={crop}
        primitives={primitives}
        onFailed={() => {
          setFailed(true);
          onFailed();
        }}
      />
      <img
        src={posterAddress(token)}
        alt=""
        className="ml-4 hidden max-h-[34vh] w-auto print:block"
      />
      {failed ? (
        <div role="alert" className="px-4 py-3">
          <p>The film could not be loaded. Check the connection, then try again.</p>
          <Button className="mt-2 border-dusk-edge !text-dusk-ink hover:!bg-dusk-2" onClick={retry}>
            Try again
          </Button>
        </div>
      ) : (
        <div className="print:hidden">
          <Readout
            lift={liftReadout(angles, replay.view === 'front')}
            turn={turnReadout(angles)}
            figures={replay.reading !== null}
          />
          {moments.length > 0 && (
            <MomentButtons
              moments={moments}
              current={loop.playing ? null : loop.frame}
              onShow={loop.show}
            />
          )}
          <PlayButtons
            playing={loop.playing}
            rate={loop.rate}
            onPlay={loop.toggle}
            onRate={loop.changeRate}
          />
        </div>
      )}
    </section>
  );
}

/** The two angles of the frame on show. It keeps its place while there is nothing to say. */
function Readout({ lift, turn, figures }: { lift: string; turn: string; figures: boolean }) {
  if (!figures) return null;
  return (
    <p className="flex min-h-[44px] flex-wrap items-center justify-between gap-x-4 px-4 py-2 text-dusk-soft">
      <span>
        lifted thigh <b className="text-tide-dusk">{lift === '' ? '–' : lift}</b>
      </span>
      <span>
        standing hip <b className="text-shank-dusk">{turn === '' ? '–' : turn}</b>
      </span>
    </p>
  );
}
