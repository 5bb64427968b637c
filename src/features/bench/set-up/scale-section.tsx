import { useId, useState } from 'react';
import type { ClipGeometry } from '#shared/contracts/clips.ts';
import { Button } from '#src/ui/button.tsx';
import { Segmented } from '#src/ui/segmented.tsx';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { MARK, toolAsks } from '../store/tools.ts';
import { EffectLine } from './effect-line.tsx';
import { scaleEffect } from './effect.ts';
import { LengthInput } from './length-input.tsx';

type From = 'rod' | 'body-height' | 'typed';
const FROM: readonly { value: From; label: string }[] = [
  { value: 'rod', label: 'Rod' },
  { value: 'body-height', label: 'Body height' },
  { value: 'typed', label: 'Typed' },
];
const USUAL_ROD_MM = 1000;

/** Millimetres per pixel: two points on a thing of known length beside the athlete, or typed. */
export function ScaleSection({
  geometry,
  disabled,
  save,
}: {
  geometry: ClipGeometry;
  disabled: boolean;
  save: (change: Partial<ClipGeometry>) => void;
}) {
  const id = useId();
  const { store } = useBenchTools();
  const { athlete } = useBenchDocument();
  const tool = useBench((state) => state.tool);
  const { scale } = geometry;
  const [from, setFrom] = useState<From>(scale?.from ?? 'rod');
  const stored = scale?.from === from ? scale : null;
  const usual = from === 'body-height' ? athlete.heightMm : from === 'rod' ? USUAL_ROD_MM : null;
  const [length, setLength] = useState<number | null>(null);
  const lengthMm = length ?? (stored && stored.from !== 'typed' ? stored.lengthMm : usual);
  const drawing = tool.kind === 'line' && tool.of === from ? tool : null;
  const [a, b] = drawing?.points ?? [];
  const ready = a && b && lengthMm !== null && from !== 'typed';
  const keep = () => {
    if (!ready) return;
    save({ scale: { from, a, b, lengthMm } });
    store.setState({ tool: MARK });
  };
  return (
    <section aria-label="Scale" className="border-t border-rule py-4">
      <h4 id={id} className="font-bold">
        Scale
      </h4>
      <p className="mb-2 text-note text-soft">
        The thing must stand where the athlete stands: at another depth it is wrong.
      </p>
      <Segmented
        labelledBy={id}
        choices={FROM}
        value={from}
        disabled={disabled}
        onChange={(next) => {
          setFrom(next);
          setLength(null);
        }}
      />
      <div className="mt-3 flex flex-wrap items-end gap-4">
        {from === 'typed' ? (
          <MmPerPx
            value={stored?.from === 'typed' ? stored.mmPerPx : null}
            disabled={disabled}
            onSave={(mmPerPx) =>
              save({ scale: mmPerPx === null ? null : { from: 'typed', mmPerPx } })
            }
          />
        ) : (
          <>
            <LengthInput
              key={from}
              label={from === 'rod' ? 'Length of the rod' : 'Body height'}
              unit={from === 'rod' ? 'mm' : 'cm'}
              value={lengthMm}
              min={from === 'rod' ? 100 : 700}
              max={from === 'rod' ? 4000 : 2400}
              disabled={disabled}
              onSave={(mm) => {
                setLength(mm);
                if (stored && stored.from !== 'typed' && mm !== null)
                  save({ scale: { ...stored, lengthMm: mm } });
              }}
            />
            {ready ? (
              <Button look="primary" onClick={keep}>
                Keep this scale
              </Button>
            ) : (
              <Button
                disabled={disabled}
                aria-pressed={drawing !== null}
                onClick={() =>
                  store.setState({ tool: drawing ? MARK : { kind: 'line', of: from, points: [] } })
                }
              >
                {drawing
                  ? 'Stop'
                  : stored
                    ? 'Place both ends again'
                    : 'Place both ends on the picture'}
              </Button>
            )}
          </>
        )}
      </div>
      {drawing && (
        <p role="status" className="mt-2 text-note">
          {toolAsks(drawing) === null
            ? 'Both ends are placed.'
            : `Press on the picture: ${toolAsks(drawing)?.toLowerCase()}.`}
        </p>
      )}
      <EffectLine effect={scaleEffect(scale)} />
    </section>
  );
}

/** Millimetres per pixel as a number of its own. */
function MmPerPx({
  value,
  disabled,
  onSave,
}: {
  value: number | null;
  disabled: boolean;
  onSave: (value: number | null) => void;
}) {
  return (
    <LengthInput
      label="Millimetres per pixel of the phone’s picture"
      unit="mm"
      value={value}
      min={0.05}
      max={20}
      disabled={disabled}
      onSave={onSave}
    />
  );
}
