import { type KeyboardEvent, useId, useMemo } from 'react';
import type { EarlierLift } from '#shared/contracts/replay-parts.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { calmTurn } from '#shared/replay/calm-turn.ts';
import { drawnOn } from '#shared/replay/drawn-on.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { scheduleOf } from '#src/canvas/matched/schedule.ts';
import { useFilm } from '#src/canvas/matched/use-film.ts';
import { useMoments } from '#src/canvas/matched/use-moments.ts';
import { shortDay } from '#src/ui/days.ts';
import { steppedTo } from '#src/ui/stepped-to.ts';
import { frameTimes } from '#src/video/frame-times.ts';
import { cropFor } from '../player/crop.ts';
import { MomentButtons } from '../player/player-buttons.tsx';
import { beforeVideoAddress, videoAddress } from '../replay-api.ts';
import { besideCrop } from './beside-crop.ts';
import { stopsOf, togetherOf, togetherText } from './beside-moments.ts';
import { Pane } from './pane.tsx';

/** What is drawn of one of the two, on any of its frames. */
const useDrawn = (
  lift: Pick<PublicReplay, 'overlay' | 'moments' | 'view' | 'width' | 'height'>,
  side: PublicReplay['side'],
  times: readonly Milliseconds[],
) =>
  useMemo(() => {
    const calm = { ...lift, side, overlay: calmTurn(lift.overlay, times) };
    return {
      crop: besideCrop(cropFor(lift.overlay, lift.width, lift.height), lift),
      on: (frame: number) => drawnOn(calm, times, frame, null),
    };
  }, [lift, side, times]);

/** The earlier lift and this one beside each other: at every place of the slider both thighs are as high. */
export default function Beside({
  token,
  replay,
  before,
  times,
}: {
  token: string;
  replay: PublicReplay;
  before: EarlierLift;
  times: readonly Milliseconds[];
}) {
  const id = useId();
  const beforeTimes = useMemo(() => frameTimes(before.frames), [before.frames]);
  const moments = useMemo(() => togetherOf(before), [before]);
  const schedule = useMemo(
    () => scheduleOf(moments, beforeTimes, times),
    [moments, beforeTimes, times],
  );
  const films = [
    useFilm(`before ${token}`, () => ({
      url: beforeVideoAddress(token),
      frameTable: beforeTimes,
      width: before.width,
      height: before.height,
    })),
    useFilm(token, () => ({
      url: videoAddress(token),
      frameTable: times,
      width: replay.width,
      height: replay.height,
    })),
  ] as const;
  const { at, playing, goTo, toggle, failed } = useMoments(moments, schedule, films);
  const drawn = [
    useDrawn(before, replay.side, beforeTimes),
    useDrawn(replay, replay.side, times),
  ] as const;
  const now = moments[at];
  const stops = useMemo(() => stopsOf(replay, moments), [replay, moments]);
  if (!now) return null;
  const figures = replay.reading !== null;
  const ready = films[0].ready && films[1].ready;
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    if (event.key === ' ') {
      event.preventDefault();
      if (ready) toggle();
      return;
    }
    const to = steppedTo(event.key, at, moments.length);
    if (to === null) return;
    event.preventDefault();
    goTo(to);
  };
  const days = [shortDay(before.visitDay), shortDay(replay.visitDay)] as const;
  return (
    <section aria-label="Before and now" className="bg-dusk text-dusk-ink print:hidden">
      {/* as wide as leaves room for the slider and the button under it */}
      <div className="mx-auto grid max-w-[calc(60dvh)] grid-cols-2 gap-px">
        <Pane
          name={`Before: ${days[0]}`}
          label={`Your lift of ${days[0]}, standing on the ${replay.side} leg`}
          film={films[0]}
          size={before}
          crop={drawn[0].crop}
          shown={drawn[0].on(now.first.frame)}
          fromFront={before.view === 'front'}
          figures={figures}
        />
        <Pane
          name={`Now: ${days[1]}`}
          label={`Your lift of ${days[1]}, standing on the ${replay.side} leg`}
          film={films[1]}
          size={replay}
          crop={drawn[1].crop}
          shown={drawn[1].on(now.second.frame)}
          fromFront={replay.view === 'front'}
          figures={figures}
        />
      </div>
      {stops.length > 0 && (
        <MomentButtons moments={stops} current={playing ? null : at} onShow={goTo} />
      )}
      <div className="px-4 pt-3">
        <p className="flex flex-wrap justify-between gap-x-4">
          <label htmlFor={id} className="font-bold">
            Both at the same height
          </label>
          <span className="text-dusk-soft">{togetherText(now)}</span>
        </p>
        <input
          id={id}
          type="range"
          min={0}
          max={moments.length - 1}
          value={at}
          aria-valuetext={togetherText(now)}
          onKeyDown={onKeyDown}
          onChange={(event) => goTo(Number(event.target.value))}
          className="h-11 w-full accent-dusk-ink"
        />
      </div>
      <div className="px-4 pb-3">
        <button
          type="button"
          onClick={toggle}
          disabled={!ready}
          className="min-h-[44px] min-w-[9em] rounded border border-dusk-edge px-4 font-bold text-dusk-ink hover:bg-dusk-2 disabled:opacity-60"
        >
          {playing ? 'Stop' : 'Play both slowly'}
        </button>
        {failed && (
          <p role="alert" className="mt-2">
            It stopped: a picture could not be read. Move the slider, or try again.
          </p>
        )}
      </div>
    </section>
  );
}
