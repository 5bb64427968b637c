import { group } from 'd3-array';
import { type ReactNode, useCallback, useEffect, useMemo, useState } from 'react';
import type { FrameSource } from '#src/video/types.ts';
import { Button } from '#src/ui/button.tsx';
import { capital, inWords } from '#src/ui/figures.ts';
import { followedWords } from '#src/ui/followed-words.ts';
import { supportWords } from '#src/ui/words.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { TimeTaken } from '../follow/time-taken.tsx';
import { useGoesOnHere } from '../use-goes-on-here.ts';
import { FollowPlace } from './follow-place.tsx';
import { countFollowed, type HollowFrame } from './followed.ts';
import { Thumb } from './thumb.tsx';
import { createThumbPainter, type ThumbPainter } from './thumb-painter.ts';
import { type Look, useLook } from './use-look.ts';

const keyOf = ({ rep, frame }: HollowFrame): string => `${rep.rep.id}/${frame}`;

/** The frames that carry weight at a glance: what was followed is looked at, many frames with one press. */
export function LookDesk({ source }: { source: FrameSource | null }) {
  const { reps } = useBenchModel();
  const look = useLook();
  const words = followedWords(countFollowed(reps));
  const done = look.waiting.length === 0;
  const heading = useGoesOnHere<HTMLHeadingElement>(done);
  return (
    <div className="py-2">
      <h3 ref={heading} tabIndex={-1} className="text-sub font-bold">
        Look at what was followed
      </h3>
      {words === null ? (
        <FollowPlace />
      ) : done ? (
        <>
          <p className="mt-1">{words} The reading rests on marks that a person has seen.</p>
          <TimeTaken />
        </>
      ) : (
        <Sheet look={look} words={words} source={source} />
      )}
    </div>
  );
}

function Sheet({ look, words, source }: { look: Look; words: string; source: FrameSource | null }) {
  const { may } = useBenchDocument();
  const { waiting, confirm, next } = look;
  /** What the hand has turned over: sure frames are chosen by themselves, unsure ones are not. */
  const [turned, setTurned] = useState<ReadonlySet<string>>(new Set());
  const painter = useThumbPainter(source);
  const [painted, setPainted] = useState<ReadonlySet<string>>(new Set());
  const onPainted = useCallback(
    (each: HollowFrame) => setPainted((before) => new Set(before).add(keyOf(each))),
    [],
  );
  const isChosen = (each: HollowFrame) => (each.unsure.length === 0) !== turned.has(keyOf(each));
  const choose = (frames: readonly HollowFrame[], chosen: boolean) =>
    setTurned((before) => {
      const after = new Set(before);
      for (const each of frames)
        if ((each.unsure.length === 0) === chosen) after.delete(keyOf(each));
        else after.add(keyOf(each));
      return after;
    });
  const chosen = waiting.filter(isChosen);
  const unsure = waiting.filter((each) => each.unsure.length > 0);
  const sure = waiting.filter((each) => each.unsure.length === 0);
  // nobody has seen a frame whose picture is still dark
  const shown = chosen.filter((each) => painted.has(keyOf(each))).length;
  const common = { look, painter, isChosen, choose, onPainted };
  return (
    <>
      <p className="mt-1 max-w-[44em]">
        {words} Take the tick off a frame whose marks are wrong, then confirm the rest at once.
        Until all are looked at the reading is provisional.
      </p>
      {may.mark && (
        <div className="bench-look-acts">
          <Button
            look="primary"
            disabled={chosen.length === 0 || shown < chosen.length}
            onClick={() => confirm(chosen)}
          >
            {chosen.length === 1
              ? 'This frame is right'
              : `These ${chosen.length} frames are right`}
          </Button>
          {next && <Button onClick={next}>Look where it was unsure</Button>}
          {shown < chosen.length && (
            <p className="self-center text-soft">
              {shown} of {chosen.length} pictures are here.
            </p>
          )}
        </div>
      )}
      {unsure.length > 0 && (
        <Group title={`${capital(inWords(unsure.length))} unsure`} frames={unsure} {...common}>
          <Button look="plain" onClick={() => choose(unsure, !unsure.every(isChosen))}>
            {unsure.every(isChosen) ? 'Take their ticks off' : 'Tick them all'}
          </Button>
        </Group>
      )}
      {[...group(sure, ({ rep }) => rep.rep.id).values()].map((frames) => {
        const rep = frames[0]?.rep.rep;
        if (!rep) return null;
        return (
          <Group
            key={rep.id}
            title={`Rep ${rep.number}, ${supportWords(rep.supportSide)}`}
            frames={frames}
            {...common}
          />
        );
      })}
    </>
  );
}

function Group({
  title,
  frames,
  look,
  painter,
  isChosen,
  choose,
  onPainted,
  children,
}: {
  title: string;
  frames: readonly HollowFrame[];
  look: Look;
  painter: ThumbPainter | null;
  isChosen: (frame: HollowFrame) => boolean;
  choose: (frames: readonly HollowFrame[], chosen: boolean) => void;
  onPainted: (frame: HollowFrame) => void;
  children?: ReactNode;
}) {
  const { current, figures } = useBenchModel();
  const lifts = useMemo(
    () => new Map((current?.frames ?? []).map(({ frame, lift }) => [frame, lift])),
    [current],
  );
  return (
    <section aria-label={title} className="mt-4">
      <h4 className="flex flex-wrap items-center gap-x-4 font-bold">
        {title}
        {children}
      </h4>
      {frames.some(({ unsure, slight }) => unsure.length === 0 && slight.length > 0) && (
        <p className="max-w-[44em] text-note text-soft">
          What stands under a frame was unsure too, but the reading does not rest on it there.
        </p>
      )}
      <ul className="bench-thumbs">
        {frames.map((each) => (
          <Thumb
            key={keyOf(each)}
            own={each}
            painter={painter}
            lift={figures ? (lifts.get(each.frame) ?? null) : null}
            chosen={isChosen(each)}
            onPainted={onPainted}
            onChoose={(chosen) => choose([each], chosen)}
            onShow={() => look.show(each)}
          />
        ))}
      </ul>
    </section>
  );
}

/** Small pictures come from the Bench’s own frames, and wait while somebody steps. */
function useThumbPainter(source: FrameSource | null): ThumbPainter | null {
  const { frameSize } = useBenchTools();
  const painter = useMemo(
    () => (source ? createThumbPainter(source, frameSize) : null),
    [source, frameSize],
  );
  const frame = useBench((state) => state.frame);
  useEffect(() => {
    painter?.hold();
  }, [painter, frame]);
  useEffect(() => () => painter?.close(), [painter]);
  return painter;
}
