import type { LandmarkId } from '#shared/landmarks/types.ts';
import { useMarking } from '../actions/use-marking.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { useConflicts } from '../clip/use-draw.ts';
import { useTarget } from '../clip/use-target.ts';
import { ConflictInset } from '../conflict/conflict-inset.tsx';
import { DuskButton } from '../dusk-button.tsx';
import { FollowPanel } from '../follow/follow-panel.tsx';
import { marksOn } from '../model/bench-model.ts';
import { tallyOf } from '../model/led.ts';
import { useNarrow } from '../use-media.ts';
import { Dials } from '../values/dials.tsx';
import { Asked } from './asked.tsx';
import { GlassPanel } from './glass-panel.tsx';
import { LandmarkList } from './landmark-list.tsx';
import { LandmarkSetChoice } from './landmark-set-choice.tsx';
import { NextFrameOffer } from './next-frame-offer.tsx';
import { NothingAsked } from './nothing-asked.tsx';
import { ThumbButtons } from './thumb-buttons.tsx';

/** Marking, led: one landmark at a time, where it is found, and what is still to do on this frame. */
export function LeadPanel() {
  const model = useBenchModel();
  const { may } = useBenchDocument();
  const frame = useBench((state) => state.frame);
  const target = useTarget();
  const conflicts = useConflicts();
  const narrow = useNarrow();
  const { current, led } = model;
  if (conflicts.size > 0) return <ConflictInset />;
  const marks = marksOn(current, frame);
  const tally = tallyOf(led, marks);
  const inRep = current && current.rep.startFrame <= frame && frame <= current.rep.endFrame;
  return (
    <div className="bench-lead-inner">
      <div className="bench-say" aria-live="polite">
        {target?.landmark ? (
          <Asked
            id={target.landmark}
            n={led.indexOf(target.landmark) + 1}
            of={led.length}
            narrow={narrow}
          />
        ) : target ? (
          <h2 className="text-lead font-bold leading-[26px]">{target.words}</h2>
        ) : (
          <NothingAsked />
        )}
      </div>
      {!narrow && <GlassPanel target={target} />}
      <FollowPanel />
      {narrow && <ThumbButtons asked={target?.landmark ?? null} />}
      {inRep && <LandmarkList />}
      {!narrow && <Dials />}
      {inRep && may.mark && (
        <div className="bench-lead-more">
          <MarkButtons asked={target?.landmark ?? null} tracked={tally.tracked} narrow={narrow} />
          <NextFrameOffer />
          <LandmarkSetChoice />
        </div>
      )}
    </div>
  );
}

function MarkButtons({
  asked,
  tracked,
  narrow,
}: {
  asked: LandmarkId | null;
  tracked: number;
  narrow: boolean;
}) {
  const { store } = useBenchTools();
  const marking = useMarking();
  if (!asked && tracked === 0) return null;
  return (
    <div className="flex flex-wrap gap-2">
      {asked && !narrow && (
        <DuskButton onClick={() => marking.hide(asked)}>Can’t see it</DuskButton>
      )}
      {asked && (
        <DuskButton onClick={() => store.setState({ chosen: null, lastPlaced: asked })}>
          Pass over
        </DuskButton>
      )}
      {tracked > 0 && (
        <DuskButton onClick={() => marking.lookedAt()}>
          {tracked === 1 ? 'The tracked mark is right' : `All ${tracked} tracked are right`}
        </DuskButton>
      )}
    </div>
  );
}
