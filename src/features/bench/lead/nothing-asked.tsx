import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { DuskButton } from '../dusk-button.tsx';
import { type FollowingState, useFollowState } from '../follow/use-follow-state.ts';
import { isDraft } from '../model/draft.ts';
import { MARK } from '../store/tools.ts';

const TOUCHED_WORDS: Record<FollowingState, string> = {
  following: 'Their marks are followed through the clip, and the reps are looked for.',
  found: 'Their marks were followed. Take the reps that were found, then look at the marks.',
  none: 'Their marks can be followed through the clip, and the reps are looked for.',
};

/** Why nothing is asked for on this frame, and what to do. */
export function NothingAsked() {
  const { store } = useBenchTools();
  const { current, led } = useBenchModel();
  const { may } = useBenchDocument();
  const frame = useBench((state) => state.frame);
  const state = useFollowState();
  const looking = useBench((state) => state.tool.kind === 'look');
  const openReps = (
    <DuskButton primary className="mt-3" onClick={() => store.setState({ desk: 'reps' })}>
      {current ? 'Reps of this clip' : 'Name a rep'}
    </DuskButton>
  );
  const [title, words, action] = !may.mark
    ? ['Looking, not marking', 'Your role lets you comment here; the coach places the marks.', null]
    : !current
      ? [
          'Name a rep first',
          'A rep is one lift: from quiet stance on both feet until the foot is down again. Step to its first frame.',
          openReps,
        ]
      : frame < current.rep.startFrame || frame > current.rep.endFrame
        ? [
            'Outside every rep',
            `Rep ${current.rep.number} runs from frame ${current.rep.startFrame} to ${current.rep.endFrame}. Marks belong to a rep.`,
            openReps,
          ]
        : looking
          ? [
              'Moving the picture',
              'A press moves the picture and places nothing.',
              <DuskButton
                key="mark"
                primary
                className="mt-3"
                onClick={() => store.setState({ tool: MARK })}
              >
                Go on marking
              </DuskButton>,
            ]
          : led.length === 0
            ? ['Nothing is marked in this view', 'Film from the front to see the turn.', null]
            : isDraft(current)
              ? ['Every landmark is touched', TOUCHED_WORDS[state], null]
              : [
                  'This frame is done',
                  `All ${led.length} landmarks are placed or marked as hidden. Press a mark to place it again.`,
                  null,
                ];
  return (
    <>
      <p className="text-note leading-5 text-dusk-soft">Frame {frame}</p>
      <h2 className="text-sub font-bold tablet:text-lead tablet:leading-[26px]">{title}</h2>
      <p className="mt-1 text-note leading-[21px]">{words}</p>
      {action}
    </>
  );
}
