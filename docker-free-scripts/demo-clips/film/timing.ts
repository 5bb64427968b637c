import type { ClipPlan } from '../clips.ts';

/** Ticks of a second in a phone's track: 10 of them are one frame at 60 a second. */
export const PHONE_TICKS = 600;

/** Exposures the phone lost: from these pictures on, one frame's time is missing each. */
const LOST_BEFORE = [97, 98, 241, 402, 403, 404, 655] as const;

/** The clock of a phone under load: one tick early or late now and then, whole numbers only. */
const jitter = (index: number): number =>
  Math.floor(((7 * index * index + 3 * index) % 31) / 11) - 1;

export const phoneTick = (index: number): number =>
  index === 0
    ? 0
    : 10 * index + 10 * LOST_BEFORE.filter((lost) => index >= lost).length + jitter(index);

/** The same clock as an expression of ffmpeg's setpts, N counting pictures, in ticks. */
export const phoneClock = (): string => {
  const lost = LOST_BEFORE.map((at) => `gte(N,${at})`).join('+');
  return `if(eq(N,0),0,10*N+10*(${lost})+floor(mod(7*N*N+3*N,31)/11)-1)`;
};

/** When picture `index` is shown, ms, as the container can say it: Matroska counts whole ms. */
const timeOf = ({ container, fps }: ClipPlan, index: number): number => {
  const even = (index * 1000) / fps;
  switch (container) {
    case 'phone-hevc':
      return (phoneTick(index) * 1000) / PHONE_TICKS;
    case 'h264':
      return even;
    case 'vp9':
      return Math.round(even);
  }
};

/** Time of every picture from the first one on, ms, over at least `seconds`. */
export const frameTimes = (clip: ClipPlan, seconds: number): readonly number[] => {
  const times: number[] = [];
  for (let index = 0; timeOf(clip, index) <= seconds * 1000; index += 1)
    times.push(timeOf(clip, index));
  return times;
};
