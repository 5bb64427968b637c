import type { PreparationProgress, PreparationStage } from './types.ts';

/** Share of the whole, percent, at which each stage begins; copying is nearly all of the work. */
const begins: Record<PreparationStage, number> = { checking: 0, copying: 4, finishing: 97 };

/** Before this much is done the rest cannot be told from it; chosen, no source. */
const tellingShare = 0.03;

/**
 * Turns frames done into percent and time left. Reports only what changes; percent never falls.
 * @param now milliseconds of a clock that never runs back
 */
export function progressMeter(
  report: ((progress: PreparationProgress) => void) | undefined,
  now: () => number = () => performance.now(),
) {
  let sent = '';
  let highest = 0;
  let copyingSince = now();
  const send = (stage: PreparationStage, percent: number, secondsLeft: number | null) => {
    highest = Math.max(highest, Math.min(100, Math.round(percent)));
    const key = `${stage} ${highest} ${secondsLeft}`;
    if (key === sent) return;
    sent = key;
    report?.({ stage, percent: highest, secondsLeft });
  };
  return {
    checking: (share: number) => send('checking', share * begins.copying, null),
    copyingBegins: () => {
      copyingSince = now();
      send('copying', begins.copying, null);
    },
    copied: (frames: number, expected: number) => {
      const share = Math.min(1, frames / expected);
      const seconds = (now() - copyingSince) / 1000;
      const left = share < tellingShare ? null : Math.ceil(seconds / share - seconds);
      send('copying', begins.copying + share * (begins.finishing - begins.copying), left);
    },
    finishing: () => send('finishing', begins.finishing, 1),
    done: () => send('finishing', 100, 0),
  };
}
