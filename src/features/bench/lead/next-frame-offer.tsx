import { degrees as angle } from '#src/ui/figures.ts';
import { type Gates, gatesOf } from '#shared/protocol/protocol.ts';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { useAsked } from '../model/use-model.ts';
import { DuskButton } from '../dusk-button.tsx';
import { goTo } from '../store/bench-store.ts';
import { whyWords } from './lead-words.ts';
import { type NextFrame, useNextFrame } from './use-suggestion.ts';

/** What marking that frame brings, in words. */
export const gainWords = ({ why, gain, lift }: NextFrame, gates: Gates): string => {
  if (why) return whyWords(why, gates);
  const there = lift === null ? '' : `at ${angle(lift, 0)} of lift`;
  if (!gain) return there;
  return `reading: ±${angle(gain.now)} would become ±${angle(gain.then)}`;
};

/** The frame that is worth marking next, with the gain; the one thing to do once a frame is done. */
export function NextFrameOffer() {
  const { store } = useBenchTools();
  const next = useNextFrame();
  const gates = gatesOf(useBenchDocument().protocol.rules);
  const frame = useBench((state) => state.frame);
  const asked = useAsked();
  if (!next || next.frame === frame) return null;
  return (
    <DuskButton
      primary={asked === null}
      className="w-full text-left"
      onClick={() => goTo(store, next.frame)}
    >
      <span className="block">Mark next: frame {next.frame}</span>
      <span className="block font-normal">{gainWords(next, gates)}</span>
    </DuskButton>
  );
}
