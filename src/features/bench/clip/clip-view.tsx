import { useEffect, useEffectEvent, useMemo, useRef, useState } from 'react';
import { type FramePoint, stagePoint } from '#shared/geometry/points.ts';
import { landmark as landmarkOf } from '#shared/landmarks/table.ts';
import { LANDMARK_IDS, type LandmarkId } from '#shared/landmarks/types.ts';
import { ClipStage, type Shown } from '#src/canvas/clip-stage.tsx';
import { type MarkHandle, MarkHandles, type PlacedHandle } from '#src/canvas/mark-handles.tsx';
import { fit, type Size, toFrame } from '#src/canvas/viewport.ts';
import { useMarking } from '../actions/use-marking.ts';
import { useBench, useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import { useFollow } from '../follow/use-follow.ts';
import { marksOn } from '../model/bench-model.ts';
import { HeadBox } from '../head/head-box.tsx';
import { MARK, withPoint } from '../store/tools.ts';
import { useNarrow } from '../use-media.ts';
import { fullFrameUrl } from '#src/api/clip-source.ts';
import { CornerGlass } from './corner-glass.tsx';
import { narrowView } from './narrow-view.ts';
import { FrameSlider } from './frame-slider.tsx';
import { PictureState } from './picture-state.tsx';
import { ZoomButtons } from './zoom-buttons.tsx';
import { useDraw } from './use-draw.ts';
import type { Pictures } from './use-pictures.ts';
import { useTarget } from './use-target.ts';

/** The clip: picture, overlay, slider and the handles of its marks. */
export function ClipView({ pictures }: { pictures: Pictures }) {
  const { clipId, store, hand, board, frameSize, copySize } = useBenchTools();
  const document = useBenchDocument();
  const { current } = useBenchModel();
  const frame = useBench((state) => state.frame);
  const viewport = useBench((state) => state.viewport);
  const hidesHead = useBench((state) => state.desk === 'head');
  const marking = useMarking();
  const follow = useFollow();
  const moveTo = (id: LandmarkId, point: FramePoint) => {
    marking.place(id, point);
    follow.placed(id, point, true);
  };
  const draw = useDraw();
  const target = useTarget();
  // nothing is asked for, and no ring stands there, while the first picture is still on its way
  const asked = pictures.shown === null ? null : target;
  const narrow = useNarrow();
  const [width, setWidth] = useState(0);
  const slider = useRef<HTMLDivElement>(null);
  const shown = useRef<Shown>(null);
  const expected = target?.expected ?? null;

  // a cross that was moved by keyboard belongs to the landmark it was moved for
  useEffect(() => hand.set({ cross: null }), [hand, frame, target?.landmark]);

  // on a phone the picture goes to what is to be seen; a finger may move it until the next one
  const marks = marksOn(current, frame);
  const place = useEffectEvent((size: Size) =>
    store.setState({
      viewport: hidesHead ? fit(frameSize, size) : narrowView(expected, marks, frameSize, size),
    }),
  );
  useEffect(() => {
    const size = shown.current?.size;
    if (narrow && size) place(size);
  }, [narrow, expected, frame, width, hidesHead]);

  const placeAt = (point: FramePoint) => {
    // as it stands now: a stroke has grown since this was painted
    const { tool: now } = store.getState();
    if (now.kind === 'line' || now.kind === 'shape')
      store.setState({ tool: withPoint(now, point) });
    else if (target?.landmark) {
      marking.place(target.landmark, point);
      follow.placed(target.landmark, point, false);
    }
  };
  /** A stroke follows a held pointer; several moves can come before the page shows the first. */
  const pass = (point: FramePoint) =>
    store.setState(({ tool: now }) =>
      now.kind === 'shape' && now.of === 'stroke' ? { tool: withPoint(now, point) } : {},
    );
  /** Without a pointer: the keyboard's cross, else the expected place, else the middle of what is shown. */
  const enter = () => {
    const { aim, cross } = hand.get();
    const at = aim ?? cross ?? expected;
    const view = shown.current;
    if (at) placeAt(at);
    else if (view)
      placeAt(toFrame(view.viewport, stagePoint(view.size.width / 2, view.size.height / 2)));
  };
  const select = (id: LandmarkId) => {
    store.setState({ chosen: id, tool: MARK });
    const handle = slider.current?.parentElement?.querySelector<HTMLElement>(
      `[data-landmark="${id}"]:not([data-asked])`,
    );
    handle?.focus({ preventScroll: true });
  };

  const handles = useMemo(
    () =>
      LANDMARK_IDS.flatMap((id): PlacedHandle[] => {
        const mark = marks[id];
        if (mark?.to !== 'point') return [];
        const state = mark.looked ? 'placed' : 'tracked, not looked at';
        return [
          {
            asked: false,
            landmark: id,
            label: `${landmarkOf(id).label}, ${state}`,
            at: mark.point,
          },
        ];
      }),
    [marks],
  );

  return (
    <ClipStage
      className="bench-clip"
      frame={frameSize}
      copy={copySize}
      board={board}
      // the sharp picture must be that of the frame on show, and none while frames fly past
      fullFrameUrl={pictures.shown === frame ? fullFrameUrl(clipId, frame) : null}
      viewport={viewport}
      onViewport={(next) => store.setState({ viewport: next })}
      hand={hand}
      draw={draw}
      asked={asked}
      movable={document.may.mark}
      onPlace={placeAt}
      onPass={pass}
      onMove={moveTo}
      onSelect={select}
      shownRef={shown}
      onMeasured={setWidth}
      onPress={() => slider.current?.focus({ preventScroll: true })}
    >
      {(view) => {
        const middle = toFrame(
          view.viewport,
          stagePoint(view.size.width / 2, view.size.height / 2),
        );
        const all: MarkHandle[] = [...handles];
        if (asked)
          all.push({
            label: `Place here with Enter: ${asked.words}. Arrows move the cross.`,
            at: expected ?? middle,
            asked: true,
          });
        return (
          <>
            <FrameSlider ref={slider} onEnter={enter} />
            <MarkHandles
              handles={all}
              viewport={view.viewport}
              hand={hand}
              onMove={moveTo}
              onPlace={placeAt}
              onRemove={marking.remove}
              onLeave={() => slider.current?.focus({ preventScroll: true })}
            />
            <HeadBox viewport={view.viewport} />
            {narrow && <CornerGlass draw={draw} target={target} />}
            <ZoomButtons />
            <PictureState pictures={pictures} />
          </>
        );
      }}
    </ClipStage>
  );
}
