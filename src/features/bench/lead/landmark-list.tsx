import { landmark } from '#shared/landmarks/table.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { marksOn } from '../model/bench-model.ts';
import { tallyOf } from '../model/led.ts';
import { MARK } from '../store/tools.ts';
import { tallyWords } from './lead-words.ts';

/** How far this frame has come, and every landmark of it: any can be asked for again. */
export function LandmarkList() {
  const { store } = useBenchTools();
  const { may } = useBenchDocument();
  const { current, led } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const marks = marksOn(current, frame);
  return (
    <details className="text-note">
      <summary className="min-h-[44px] cursor-pointer py-2.5 text-dusk-soft">
        On this frame: <span className="text-dusk-ink">{tallyWords(tallyOf(led, marks))}</span>
      </summary>
      <ul className="border-t border-dusk-rule">
        {led.map((id) => {
          const mark = marks[id];
          const state = !mark
            ? 'to go'
            : mark.to === 'hidden'
              ? 'hidden'
              : mark.looked
                ? 'placed'
                : 'tracked';
          return (
            <li key={id}>
              <button
                type="button"
                className="flex min-h-[44px] w-full items-center justify-between gap-3 text-left"
                disabled={!may.mark}
                onClick={() => store.setState({ chosen: id, tool: MARK })}
              >
                <span className="underline underline-offset-[3px]">{landmark(id).label}</span>
                <span className="text-dusk-soft">{state}</span>
              </button>
            </li>
          );
        })}
      </ul>
    </details>
  );
}
