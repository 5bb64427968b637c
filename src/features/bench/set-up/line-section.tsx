import type { ReactNode } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import { Button } from '#src/ui/button.tsx';
import { useBench, useBenchTools } from '../bench-context.ts';
import { type LineOf, MARK, toolAsks } from '../store/tools.ts';
import { EffectLine } from './effect-line.tsx';
import type { Effect } from './effect.ts';

/** A part of the set-up that is two touches on the picture: drawn, kept, drawn again, taken away. */
export function LineSection({
  of,
  title,
  hint,
  there,
  effect,
  disabled,
  onKeep,
  onTakeAway,
  children,
}: {
  of: LineOf;
  title: string;
  hint: string;
  /** A line is kept already. */
  there: boolean;
  effect: Effect;
  disabled: boolean;
  onKeep: (a: FramePoint, b: FramePoint) => void;
  onTakeAway: () => void;
  /** Another way to the same. */
  children?: ReactNode;
}) {
  const { store } = useBenchTools();
  const tool = useBench((state) => state.tool);
  const drawing = tool.kind === 'line' && tool.of === of ? tool : null;
  const [a, b] = drawing?.points ?? [];
  return (
    <section aria-label={title} className="border-t border-rule py-4">
      <h4 className="font-bold">{title}</h4>
      <p className="mb-2 text-note text-soft">{hint}</p>
      {children}
      <div className="flex flex-wrap gap-3">
        {a && b ? (
          <Button
            look="primary"
            onClick={() => {
              onKeep(a, b);
              store.setState({ tool: MARK });
            }}
          >
            Keep this line
          </Button>
        ) : (
          <Button
            disabled={disabled}
            aria-pressed={drawing !== null}
            onClick={() =>
              store.setState({ tool: drawing ? MARK : { kind: 'line', of, points: [] } })
            }
          >
            {drawing ? 'Stop' : there ? 'Draw it again' : 'Draw it on the picture'}
          </Button>
        )}
        {there && !drawing && (
          <Button look="plain" disabled={disabled} onClick={onTakeAway}>
            Take it away
          </Button>
        )}
      </div>
      {drawing && (
        <p role="status" className="mt-2 text-note">
          {toolAsks(drawing) === null
            ? 'Both ends are placed.'
            : `Press on the picture: ${toolAsks(drawing)?.toLowerCase()}.`}
        </p>
      )}
      <EffectLine effect={effect} />
    </section>
  );
}
