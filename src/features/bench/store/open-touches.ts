import { guardLeaving } from '#src/api/leaving.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { countKept, forgetKept, type KeptTouches, keptTouchesOf } from './kept-touches.ts';

/** Only the touches of the person who is signed in now are asked about at sign-out. */
let current: string | null = null;
let guarded = false;

const here = (userId: string): number => {
  try {
    return countKept(userId, localStorage);
  } catch {
    return 0;
  }
};

const guard = (): void => {
  if (guarded) return;
  guarded = true;
  guardLeaving({
    wouldLose() {
      const count = current === null ? 0 : here(current);
      if (count === 0) return Promise.resolve(null);
      const touches = count === 1 ? 'touched landmark belongs' : 'touched landmarks belong';
      return Promise.resolve(
        `${capital(inWords(count))} ${touches} to no rep yet. Signing out takes them off this device.`,
      );
    },
    discard() {
      if (current !== null && here(current) > 0) forgetKept(current, localStorage);
    },
  });
};

/** The touches of one person on one clip, as this browser keeps them. */
export const touchesOf = (userId: string, clipId: string): KeptTouches => {
  current = userId;
  guard();
  return keptTouchesOf(userId, clipId, () => localStorage);
};
