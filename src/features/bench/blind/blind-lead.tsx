import { landmark } from '#shared/landmarks/table.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { useMarking } from '../actions/use-marking.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { useTarget } from '../clip/use-target.ts';
import { DuskButton } from '../dusk-button.tsx';
import { Asked } from '../lead/asked.tsx';
import { GlassPanel } from '../lead/glass-panel.tsx';
import { LandmarkList } from '../lead/landmark-list.tsx';
import { ThumbButtons } from '../lead/thumb-buttons.tsx';
import { goTo } from '../store/bench-store.ts';
import { MARK } from '../store/tools.ts';
import { useNarrow } from '../use-media.ts';
import { useProgress } from './use-progress.ts';

/** Marking again, led: one landmark at a time, then the next frame in the order. */
export function BlindLead() {
  const { store } = useBenchTools();
  const { led } = useBenchModel();
  const target = useTarget();
  const narrow = useNarrow();
  const marking = useMarking();
  const asked = target?.landmark ?? null;
  return (
    <div className="bench-lead-inner">
      <div className="bench-say" aria-live="polite">
        {asked ? (
          <Asked id={asked} n={led.indexOf(asked) + 1} of={led.length} narrow={narrow} />
        ) : (
          <NothingAskedAgain />
        )}
      </div>
      {!narrow && <GlassPanel target={target} />}
      {narrow && <ThumbButtons asked={asked} />}
      {led.length > 0 && <LandmarkList />}
      {asked && (
        <div className="flex flex-wrap gap-2">
          {!narrow && (
            <DuskButton
              aria-label={`Can’t see it: ${landmark(asked).label}`}
              onClick={() => marking.hide(asked)}
            >
              Can’t see it
            </DuskButton>
          )}
          <DuskButton onClick={() => store.setState({ chosen: null, lastPlaced: asked })}>
            Pass over
          </DuskButton>
        </div>
      )}
    </div>
  );
}

/** Why nothing is asked for here, and where to go. */
function NothingAskedAgain() {
  const { store } = useBenchTools();
  const looking = useBench((state) => state.tool.kind === 'look');
  const { frame, next, here, of, place } = useProgress();
  const [title, words] = looking
    ? ['Moving the picture', 'A press moves the picture and places nothing.']
    : here === null
      ? ['Not a frame to mark', 'Look around as you like; only the frames asked for are marked.']
      : next === null
        ? [
            `All ${inWords(of)} frames are marked`,
            'Finish, and you see how well the two markings agree. Nothing can be changed after that.',
          ]
        : [
            'This frame is done',
            `${capital(inWords(here.landmarks.length))} ${here.landmarks.length === 1 ? 'landmark is' : 'landmarks are'} placed or marked as hidden.`,
          ];
  return (
    <>
      <p className="text-note leading-5 text-dusk-soft">
        {place === null ? `Frame ${frame}` : `Frame ${place} of ${of}`}
      </p>
      <h2 className="text-sub font-bold tablet:text-lead tablet:leading-[26px]">{title}</h2>
      <p className="mt-1 text-note leading-[21px]">{words}</p>
      {looking ? (
        <DuskButton primary className="mt-3" onClick={() => store.setState({ tool: MARK })}>
          Go on marking
        </DuskButton>
      ) : (
        next !== null && (
          <DuskButton primary className="mt-3" onClick={() => goTo(store, next)}>
            Next frame to mark
          </DuskButton>
        )
      )}
    </>
  );
}
