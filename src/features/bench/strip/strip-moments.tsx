import { useState, type KeyboardEvent } from 'react';
import type { Rep } from '#shared/contracts/reps.ts';
import type { Moment } from '#shared/records/engine-input.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { MOMENT_NAMES, MOMENT_WORDS, type PlacedMoment, roomOf } from './moments.ts';
import { spacedLabels, type StripLayout } from './strip-layout.ts';

/**
 * The moments of the rep in the foot of the strip. Each is a slider: drag it, or arrows move it one
 * frame and Page keys ten; Delete gives it back to what the marks say.
 */
export function StripMoments({
  rep,
  moments,
  layout,
  movable,
}: {
  rep: Rep;
  moments: readonly PlacedMoment[];
  layout: StripLayout;
  movable: boolean;
}) {
  const { store } = useBenchTools();
  const edits = useEdits();
  const say = useStatus();
  // a gesture that is not finished: it changes nothing until the pointer or the key comes up
  const [draft, setDraft] = useState<{ moment: Moment; frame: number } | null>(null);
  const frameOf = (placed: PlacedMoment) =>
    draft?.moment === placed.moment ? draft.frame : placed.frame;
  const shown = moments.map((placed) => ({
    ...placed,
    x: layout.x(frameOf(placed)) + 4,
    text: MOMENT_WORDS[placed.moment],
  }));
  const atEdge = ({ x, text }: { x: number; text: string }) =>
    x + text.length * 7 + 8 > layout.width;
  const labelled = new Set(spacedLabels(shown).map((each) => each.moment));

  const send = async (moment: Moment, frame: number | null) => {
    try {
      await edits.editRep(rep.id, { boundaries: { [moment]: frame } });
    } catch (error) {
      say(error instanceof Error ? error.message : 'The moment was not moved.');
    } finally {
      // another gesture that has begun meanwhile goes on
      setDraft((now) => (now?.moment === moment && now.frame === frame ? null : now));
    }
  };
  const draftTo = (placed: PlacedMoment, frame: number) => {
    const { from, to } = roomOf(moments, placed.moment, rep);
    const held = Math.max(from, Math.min(to, frame));
    setDraft({ moment: placed.moment, frame: held });
    // the picture shows the moment that is being moved
    goTo(store, frameIndex(held));
  };
  const finish = (placed: PlacedMoment) => {
    if (draft?.moment !== placed.moment) return;
    if (draft.frame === placed.frame) setDraft(null);
    else void send(placed.moment, draft.frame);
  };
  const onKeyDown = (placed: PlacedMoment) => (event: KeyboardEvent) => {
    const by = { ArrowLeft: -1, ArrowRight: 1, PageDown: -10, PageUp: 10 }[event.key];
    if (by !== undefined) {
      event.preventDefault();
      draftTo(placed, frameOf(placed) + by);
    } else if (event.key === 'Escape') {
      event.stopPropagation();
      setDraft(null);
      goTo(store, placed.frame);
    } else if ((event.key === 'Delete' || event.key === 'Backspace') && placed.byHand) {
      event.preventDefault();
      void send(placed.moment, null);
    }
  };

  return (
    <>
      {shown.map((placed) => (
        <div
          key={placed.moment}
          role={movable ? 'slider' : undefined}
          tabIndex={movable ? 0 : undefined}
          aria-label={
            movable
              ? `${MOMENT_NAMES[placed.moment]}${placed.byHand ? ', moved by hand' : ''}`
              : undefined
          }
          aria-orientation={movable ? 'horizontal' : undefined}
          aria-valuemin={movable ? rep.startFrame : undefined}
          aria-valuemax={movable ? rep.endFrame : undefined}
          aria-valuenow={movable ? frameOf(placed) : undefined}
          aria-valuetext={movable ? `frame ${frameOf(placed)}` : undefined}
          title={MOMENT_NAMES[placed.moment]}
          className={`absolute h-8 min-w-6 touch-none select-none whitespace-nowrap text-caption ${
            atEdge(placed) ? 'border-r pr-1 text-right' : '-translate-x-1 border-l pl-1'
          } ${
            movable ? 'cursor-ew-resize' : ''
          } ${placed.byHand ? '!border-x-2 border-y-0 border-ink font-bold text-ink' : 'border-ink/60 text-soft'}`}
          style={{
            top: layout.base + 1,
            // at the right edge the words stand before their line
            ...(atEdge(placed) ? { right: layout.width - placed.x + 4 } : { left: placed.x }),
          }}
          onKeyDown={movable ? onKeyDown(placed) : undefined}
          onKeyUp={() => finish(placed)}
          onBlur={() => finish(placed)}
          onPointerDown={(event) => {
            if (!movable || event.button !== 0) return;
            event.stopPropagation();
            event.currentTarget.setPointerCapture(event.pointerId);
          }}
          onPointerMove={(event) => {
            if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
            const bounds = event.currentTarget.parentElement?.getBoundingClientRect();
            if (bounds) draftTo(placed, layout.frameAtX(event.clientX - bounds.left));
          }}
          onPointerUp={() => finish(placed)}
          onPointerCancel={() => setDraft(null)}
        >
          {labelled.has(placed.moment) && placed.text}
        </div>
      ))}
    </>
  );
}
