import { useRef, useState } from 'react';
import type { Clip } from '#shared/contracts/clips.ts';
import { routes } from '#shared/contracts/routes.ts';
import { addressOf } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Segmented } from '#src/ui/segmented.tsx';

const SPEEDS = [
  { value: '0.25', label: '¼ speed' },
  { value: '1', label: 'Own speed' },
] as const;

/** The clip as it was filmed, with nothing drawn on it; several clips of the side stand below each other. */
export function BareClip({ clips }: { clips: readonly Clip[] }) {
  if (clips.length === 0)
    return (
      <p className="text-note text-soft">
        No clip of this side can be played. The call can also be made from what you saw in the room.
      </p>
    );
  return (
    <div className="space-y-8">
      {clips.map((clip) => (
        <OneClip key={clip.id} clip={clip} />
      ))}
    </div>
  );
}

function OneClip({ clip }: { clip: Clip }) {
  const video = useRef<HTMLVideoElement>(null);
  const [speed, setSpeed] = useState<(typeof SPEEDS)[number]['value']>('0.25');
  const [playing, setPlaying] = useState(false);
  const [failed, setFailed] = useState(false);
  const shape = (clip.width ?? 9) / (clip.height ?? 16);
  const toggle = () => {
    const element = video.current;
    if (!element) return;
    element.playbackRate = Number(speed);
    if (element.paused) element.play().catch(() => setFailed(true));
    else element.pause();
  };
  return (
    <div>
      <video
        ref={video}
        src={addressOf(routes.clipVideo, { params: { id: clip.id } })}
        poster={addressOf(routes.clipPoster, { params: { id: clip.id } })}
        muted
        loop
        playsInline
        preload="none"
        aria-label={`${clip.name}, nothing drawn on it`}
        onPlay={() => setPlaying(true)}
        onPause={() => setPlaying(false)}
        onError={() => setFailed(true)}
        className="w-full rounded bg-dusk"
        style={{ aspectRatio: shape, maxWidth: `calc(66dvh * ${shape})` }}
      />
      {failed ? (
        <p role="alert" className="mt-2 text-note text-alarm">
          This browser cannot play the clip right now. The picture is its first frame.
        </p>
      ) : (
        <div className="mt-3 flex flex-wrap items-center gap-3">
          <Button onClick={toggle}>{playing ? 'Pause' : 'Play in a loop'}</Button>
          <div>
            <span id={`${clip.id}-speed`} className="sr-only">
              Speed of {clip.name}
            </span>
            <Segmented
              labelledBy={`${clip.id}-speed`}
              choices={SPEEDS}
              value={speed}
              onChange={(value) => {
                setSpeed(value);
                if (video.current) video.current.playbackRate = Number(value);
              }}
            />
          </div>
        </div>
      )}
      <p className="mt-2 text-note text-soft">{clip.name}. Nothing is drawn on it.</p>
    </div>
  );
}
