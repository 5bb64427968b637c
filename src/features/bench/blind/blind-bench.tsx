import { useMemo, useState } from 'react';
import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import { timesOf } from '#shared/records/engine-input.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { useMe } from '#src/api/me.ts';
import { createHand } from '#src/canvas/hand.ts';
import { createPictureBoard } from '#src/canvas/picture-board.ts';
import type { Size } from '#src/canvas/viewport.ts';
import {
  BenchDocumentContext,
  BenchModelContext,
  type BenchTools,
  BenchToolsContext,
} from '../bench-context.ts';
import { ClipView } from '../clip/clip-view.tsx';
import { usePictures } from '../clip/use-pictures.ts';
import { usePlaying } from '../clip/use-playing.ts';
import { KeyHints } from '../keys/key-hints.tsx';
import { KeysDialog } from '../keys/keys-dialog.tsx';
import { useKeys } from '../keys/use-keys.ts';
import { secondMarkQueueOf } from '../queue/open-queue.ts';
import { WaitingLine } from '../save-state.tsx';
import { createBenchStore } from '../store/bench-store.ts';
import { Transport } from '../strip/transport.tsx';
import { BlindBar } from './blind-bar.tsx';
import { BlindContext } from './blind-context.ts';
import { BlindDesk } from './blind-desk.tsx';
import { blindDocument } from './blind-document.ts';
import { BlindLead } from './blind-lead.tsx';
import { orderOf } from './blind-order.ts';
import { useBlindLive } from './use-blind-live.ts';
import { useBlindModel } from './use-blind-model.ts';
import '../bench.css';

/** A second marking whose clip is ready. */
export interface ReadySecond {
  readonly second: SecondMarkingDocument;
  readonly frames: NonNullable<SecondMarkingDocument['clip']['frames']>;
  readonly frameSize: Size;
  readonly copySize: Size;
}

/** Where marking begins or goes on: the first frame in the order that is not whole. */
const startOf = ({ frames, marks }: SecondMarkingDocument) => {
  const order = orderOf(frames, marksWith(marks, []));
  return (order.find(({ done }) => !done) ?? order[0])?.frame;
};

/** The clip, what is asked for and nothing else: no course, no value, no strip of marks, no comment. */
export function BlindBench({ second, frames, frameSize, copySize }: ReadySecond) {
  const { user } = useMe();
  const document = useMemo(() => blindDocument(second), [second]);
  const [tools] = useState((): BenchTools => ({
    clipId: second.clip.id,
    store: createBenchStore({
      frame: startOf(second) ?? frameIndex(0),
      repId: second.summary.id,
      desk: 'course',
      mayMark: true,
    }),
    hand: createHand(),
    board: createPictureBoard(),
    queue: secondMarkQueueOf(user.id),
    times: timesOf(frames),
    frameSize,
    copySize,
    follow: null,
  }));
  const { model, blind } = useBlindModel(second, document, tools);
  useBlindLive(second.summary.id, second.clip.id, tools.queue);
  return (
    <BenchToolsContext value={tools}>
      <BenchDocumentContext value={document}>
        <BenchModelContext value={model}>
          <BlindContext value={blind}>
            <BlindLayout tools={tools} second={second} />
          </BlindContext>
        </BenchModelContext>
      </BenchDocumentContext>
    </BenchToolsContext>
  );
}

function BlindLayout({ tools, second }: { tools: BenchTools; second: SecondMarkingDocument }) {
  const pictures = usePictures(second.clip, tools);
  usePlaying(pictures);
  useKeys();
  const { width, height } = tools.frameSize;
  const style = useMemo(
    () => ({ '--clip-aspect': String(width / height) }) as React.CSSProperties,
    [width, height],
  );
  return (
    <div className="bench" data-shape={width > height ? 'wide' : 'upright'} style={style}>
      <BlindBar second={second} />
      <WaitingLine />
      <section className="bench-stage" aria-label="Clip">
        <ClipView pictures={pictures} />
      </section>
      <section className="bench-lead" aria-label="Marking">
        <BlindLead />
      </section>
      <section className="bench-desk" aria-label="Frames to mark again">
        <BlindDesk second={second} />
      </section>
      <section className="bench-under" aria-label="Frame on show">
        <Transport />
        <KeyHints />
      </section>
      <KeysDialog />
    </div>
  );
}
