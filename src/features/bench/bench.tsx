import { type ReactNode, useEffect, useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { BenchDocument } from '#shared/contracts/bench.ts';
import { timesOf } from '#shared/records/engine-input.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { createHand } from '#src/canvas/hand.ts';
import { createPictureBoard } from '#src/canvas/picture-board.ts';
import type { Size } from '#src/canvas/viewport.ts';
import { useMe } from '#src/api/me.ts';
import { useLiveBench } from './actions/use-live-bench.ts';
import { BenchBar, DeskTabs } from './bench-bar.tsx';
import {
  BenchDocumentContext,
  BenchModelContext,
  type BenchTools,
  BenchToolsContext,
  useBench,
  useBenchDocument,
  useBenchModel,
} from './bench-context.ts';
import { ClipView } from './clip/clip-view.tsx';
import { frameOf, useFrameAddress } from './clip/use-frame-address.ts';
import { type Pictures, usePictures } from './clip/use-pictures.ts';
import { usePlaying } from './clip/use-playing.ts';
import { CommentsPanel } from './comments/comments-panel.tsx';
import { CourseDesk } from './course/course-desk.tsx';
import { createFollowing } from './follow/following.ts';
import { openTrackerOf } from './follow/open-tracker.ts';
import { FollowContext, useFollowing } from './follow/use-follow.ts';
import { HeadDesk } from './head/head-desk.tsx';
import { HeadContext, useHiddenHead } from './head/use-hidden-head.ts';
import { LookDesk } from './look/look-desk.tsx';
import { isDraft } from './model/draft.ts';
import { KeysDialog } from './keys/keys-dialog.tsx';
import { useKeys } from './keys/use-keys.ts';
import { KeyHints } from './keys/key-hints.tsx';
import { LeadPanel } from './lead/lead-panel.tsx';
import { useModel } from './model/use-model.ts';
import { markQueueOf } from './queue/open-queue.ts';
import { ReadingContext, useReadingWorker } from './reading/use-reading.ts';
import { RepsPanel } from './reps/reps-panel.tsx';
import { WaitingLine } from './save-state.tsx';
import { SetUpPanel } from './set-up/set-up-panel.tsx';
import { createBenchStore } from './store/bench-store.ts';
import { touchesOf } from './store/open-touches.ts';
import { LiftStrip } from './strip/lift-strip.tsx';
import { Transport } from './strip/transport.tsx';
import './bench.css';

/** A clip that is ready: its table of frames and both sizes are known. */
export interface ReadyClip {
  readonly document: BenchDocument;
  readonly frames: NonNullable<BenchDocument['clip']['frames']>;
  readonly frameSize: Size;
  readonly copySize: Size;
}

/** The Bench of one clip. Mount it anew for another clip. */
export function Bench({ document, frames, frameSize, copySize }: ReadyClip) {
  const { user } = useMe();
  const [search] = useSearchParams();
  const [tools] = useState((): BenchTools => {
    const number = Number(search.get('rep'));
    const rep = document.reps.find((each) => each.rep.number === number) ?? document.reps[0];
    const comment = document.comments.find((each) => each.id === search.get('comment'));
    const frame =
      frameOf(search, frames.count) ?? frameIndex(comment?.fromFrame ?? rep?.rep.startFrame ?? 0);
    return {
      clipId: document.clip.id,
      store: createBenchStore({
        frame,
        repId: rep?.rep.id ?? null,
        desk:
          comment || search.get('comment') === 'all'
            ? 'comments'
            : search.has('again')
              ? 'reps'
              : 'course',
        mayMark: document.may.mark,
        standsOn: document.clip.supportSide ?? 'both',
        kept: touchesOf(user.id, document.clip.id),
      }),
      hand: createHand(),
      board: createPictureBoard(),
      queue: markQueueOf(user.id),
      times: timesOf(frames),
      frameSize,
      copySize,
      follow: document.may.mark
        ? createFollowing(
            openTrackerOf(document.clip, frameSize, copySize, timesOf(frames)),
            frames.count,
          )
        : null,
    };
  });
  const model = useModel(document, tools);
  const reading = useReadingWorker(document, model, tools.times);
  useLiveBench(document, tools.queue);
  useEffect(() => () => tools.follow?.close(), [tools]);
  return (
    <BenchToolsContext value={tools}>
      <BenchDocumentContext value={document}>
        <BenchModelContext value={model}>
          <ReadingContext value={reading}>
            <FollowBench>
              <HeadBench>
                <BenchLayout tools={tools} />
              </HeadBench>
            </FollowBench>
          </ReadingContext>
        </BenchModelContext>
      </BenchDocumentContext>
    </BenchToolsContext>
  );
}

function BenchLayout({ tools }: { tools: BenchTools }) {
  const document = useBenchDocument();
  const { current } = useBenchModel();
  const pictures = usePictures(document.clip, tools);
  usePlaying(pictures);
  useFrameAddress(current && !isDraft(current) ? current.rep.number : null);
  useKeys();
  const { width, height } = tools.frameSize;
  const style = useMemo(
    () => ({ '--clip-aspect': String(width / height) }) as React.CSSProperties,
    [width, height],
  );
  return (
    <div className="bench" data-shape={width > height ? 'wide' : 'upright'} style={style}>
      <BenchBar />
      <WaitingLine />
      <section className="bench-stage" aria-label="Clip">
        <ClipView pictures={pictures} />
      </section>
      <section className="bench-lead" aria-label="Marking">
        <LeadPanel />
      </section>
      <section className="bench-desk" aria-label="Course and more">
        <DeskTabs />
        <DeskView pictures={pictures} />
      </section>
      <section className="bench-under" aria-label="Lift strip">
        <Transport />
        <LiftStrip />
        <KeyHints />
      </section>
      <KeysDialog />
    </div>
  );
}

/** What follows by itself, for all parts of the Bench. */
function FollowBench({ children }: { children: ReactNode }) {
  return <FollowContext value={useFollowing()}>{children}</FollowContext>;
}

/** The box around the head, for the picture and its desk. */
function HeadBench({ children }: { children: ReactNode }) {
  return <HeadContext value={useHiddenHead()}>{children}</HeadContext>;
}

function DeskView({ pictures }: { pictures: Pictures }) {
  const desk = useBench((state) => state.desk);
  if (desk === 'reps') return <RepsPanel />;
  if (desk === 'look') return <LookDesk source={pictures.source} />;
  if (desk === 'head') return <HeadDesk />;
  if (desk === 'set-up') return <SetUpPanel />;
  if (desk === 'comments') return <CommentsPanel />;
  return <CourseDesk />;
}
