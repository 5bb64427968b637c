import { type KeyboardEvent, type PointerEvent, useRef, useState } from 'react';
import type { Rep } from '#shared/contracts/reps.ts';
import type { Moment } from '#shared/records/engine-input.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { cx } from '#src/ui/class-names.ts';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBenchTools } from '../bench-context.ts';
import { goTo } from '../store/bench-store.ts';
import { MOMENT_NAMES, MOMENT_WEIGHT, MOMENT_WORDS, type PlacedMoment, roomOf } from './moments.ts';
import { spacedLabels, spreadTargets, type StripLayout } from './strip-layout.ts';

/** Of the words under the line, roomy enough for the bold ones. */
const PX_PER_LETTER = 7;

/** What a thumb can press (WCAG 2.2, 2.5.8). */
const LEAST_TARGET = 24;

/** Where on the strip a pointer is, px. */
const placeOf = ({ clientX, currentTarget }: PointerEvent): number =>
  clientX - (currentTarget.parentElement?.getBoundingClientRect().left ?? 0);

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
  /** How far beside its line a moment was taken hold of, so that it does not jump to the pointer. */
  const grip = useRef(0);
  const frameOf = (placed: PlacedMoment) =>
    draft?.moment === placed.moment ? draft.frame : placed.frame;
  const lines = moments.map((placed) => {
    const x = layout.x(frameOf(placed));
    const wide = MOMENT_WORDS[placed.moment].length * PX_PER_LETTER + 8;
    // at the right edge the words stand before their line
    const atEdge = x + wide > layout.width;
    return { ...placed, x, atEdge, from: atEdge ? x - wide : x, to: atEdge ? x : x + wide };
  });
  const byWeight = MOMENT_WEIGHT.flatMap((moment) =>
    lines.filter((each) => each.moment === moment),
  );
  const labelled = new Set(spacedLabels(byWeight).map((each) => each.moment));
  const targets = spreadTargets(
    lines.map(({ moment, x, atEdge, from, to }) => ({
      from: labelled.has(moment) && atEdge ? from : x - LEAST_TARGET / 2,
      to: labelled.has(moment) && !atEdge ? to : x + LEAST_TARGET / 2,
    })),
    layout.width,
  );
  const shown = lines.map((line, n) => ({ ...line, target: targets[n] ?? line }));

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
          className={cx(
            'absolute h-8 touch-none select-none text-caption',
            movable && 'cursor-ew-resize',
            placed.byHand ? 'font-bold text-ink' : 'text-soft',
          )}
          style={{
            top: layout.base + 1,
            left: placed.target.from,
            width: placed.target.to - placed.target.from,
          }}
          onKeyDown={movable ? onKeyDown(placed) : undefined}
          onKeyUp={() => finish(placed)}
          onBlur={() => finish(placed)}
          onPointerDown={(event) => {
            if (!movable || event.button !== 0) return;
            event.stopPropagation();
            event.currentTarget.setPointerCapture(event.pointerId);
            grip.current = placeOf(event) - placed.x;
          }}
          onPointerMove={(event) => {
            if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
            draftTo(placed, layout.frameAtX(placeOf(event) - grip.current));
          }}
          onPointerUp={() => finish(placed)}
          onPointerCancel={() => setDraft(null)}
        >
          <span
            aria-hidden="true"
            className="pointer-events-none absolute"
            style={{ left: placed.x - placed.target.from }}
          >
            {/* without its word the line ends above the words of others */}
            <span
              className={cx(
                'absolute border-l',
                labelled.has(placed.moment) ? 'h-8' : 'h-2',
                placed.byHand ? '!border-l-[3px] border-ink' : 'border-ink/60',
              )}
            />
            {labelled.has(placed.moment) && (
              <span
                className={cx(
                  'absolute top-2 whitespace-nowrap',
                  placed.atEdge ? 'right-0 pr-1' : 'left-0 pl-1',
                )}
              >
                {MOMENT_WORDS[placed.moment]}
              </span>
            )}
          </span>
        </div>
      ))}
    </>
  );
}
