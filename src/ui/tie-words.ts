import type { RepTieFault } from '#shared/records/tied-lifts.ts';
import type { SharedEvent } from '#shared/timing/shared-events.ts';

const EVENT_WORDS: Record<SharedEvent, string> = {
  clap: 'the clap',
  'foot-off': 'foot off',
  top: 'reaching the top',
  'foot-down': 'foot down',
};

const seconds = (ms: number): string => `${(ms / 1000).toFixed(2)} s`;

/** Why two clips are not taken as showing the same moment, and what to do. */
export const tieFaultWords = (fault: RepTieFault): string => {
  switch (fault.code) {
    case 'few-shared-events': {
      const [only] = fault.have;
      const seen = only ? `both clips show only ${EVENT_WORDS[only]}` : 'nothing is seen in both';
      return `${seen}; mark foot off and the way to the top in both, or a clap`;
    }
    case 'events-out-of-order': {
      const [a, b] = fault.events;
      return `${EVENT_WORDS[a]} comes before ${EVENT_WORDS[b]} in one clip and not in the other: these are different reps, or the clap is not the same`;
    }
    case 'durations-differ': {
      const [a, b] = fault.events;
      return `from ${EVENT_WORDS[a]} to ${EVENT_WORDS[b]} the side clip takes ${seconds(fault.own)}, the front clip ${seconds(fault.other)}; frames and marks explain ${seconds(fault.allowed)} at most, so these are different reps`;
    }
    case 'not-a-pair':
      return 'a front and a lifted-side clip, standing on the same leg, are needed';
  }
};
