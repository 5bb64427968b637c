import type { EarlierLift } from '#shared/contracts/replay-parts.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { type FrameIndex, frameIndex } from '#shared/timing/units.ts';
import type { Moment } from '../player/player-buttons.tsx';
import { momentsOf } from '../player/moments.ts';

/** One moment of both films, with the lift that both have; null where no angle is told. */
export interface Together {
  readonly first: { readonly frame: FrameIndex };
  readonly second: { readonly frame: FrameIndex };
  readonly lift: number | null;
  readonly rising: boolean;
}

export const togetherOf = ({ matched }: EarlierLift): readonly Together[] =>
  matched.now.flatMap((now, n) => {
    const before = matched.before[n];
    if (before === undefined) return [];
    return [
      {
        first: { frame: frameIndex(before) },
        second: { frame: frameIndex(now) },
        lift: matched.lift[n] ?? null,
        rising: n < matched.rising,
      },
    ];
  });

/** `74°, going up`; without an angle only which way. */
export const togetherText = ({ lift, rising }: Together): string =>
  `${lift === null ? '' : `${Math.round(lift)}°, `}${rising ? 'going up' : 'going down'}`;

/** The moments to stop at, as places of the slider: the one on the way up whose frame lies nearest. */
export const stopsOf = (replay: PublicReplay, moments: readonly Together[]): Moment[] => {
  const rise = moments.filter(({ rising }) => rising);
  const [first] = rise;
  if (!first) return [];
  return momentsOf(replay)
    .filter(({ name }) => name !== 'Quiet')
    .map((stop) => {
      const away = ({ second }: Together) => Math.abs(second.frame - stop.frame);
      const best = rise.reduce((near, each) => (away(each) < away(near) ? each : near), first);
      return { ...stop, frame: moments.indexOf(best) };
    });
};
