import type { ClipGeometry } from '#shared/contracts/clips.ts';
import { Button } from '#src/ui/button.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { MARK, toolAsks } from '../store/tools.ts';
import { EffectLine } from './effect-line.tsx';
import { distanceEffect, lensEffect, plumbEffect, pointersEffect } from './effect.ts';
import { LengthInput } from './length-input.tsx';
import { ScaleSection } from './scale-section.tsx';

/** How the clip was filmed, and what each part of it makes measurable. */
export function SetUpPanel() {
  const { clip, may } = useBenchDocument();
  const edits = useEdits();
  const say = useStatus();
  const { geometry } = clip;
  const disabled = !may.mark;
  const save = (change: Partial<ClipGeometry>) => {
    edits
      .editGeometry({ ...geometry, ...change })
      .catch((error: unknown) =>
        say(error instanceof Error ? error.message : 'The set-up was not saved.'),
      );
  };
  return (
    <div className="max-w-[38em]">
      <ScaleSection geometry={geometry} disabled={disabled} save={save} />
      <section aria-label="Camera" className="border-t border-rule py-4">
        <div className="flex flex-wrap gap-x-8 gap-y-4">
          <LengthInput
            label="Lens to athlete"
            unit="m"
            value={geometry.distanceMm}
            min={500}
            max={20_000}
            disabled={disabled}
            onSave={(distanceMm) => save({ distanceMm })}
          />
          <LengthInput
            label="Lens above the floor"
            unit="cm"
            value={geometry.lensHeightMm}
            min={0}
            max={3000}
            disabled={disabled}
            onSave={(lensHeightMm) => save({ lensHeightMm })}
          />
        </div>
        <EffectLine effect={distanceEffect(geometry.distanceMm)} />
        <EffectLine effect={lensEffect(geometry.lensHeightMm)} />
      </section>
      <section aria-label="Pointers" className="border-t border-rule py-4">
        <div className="flex flex-wrap gap-x-8 gap-y-4">
          <LengthInput
            label="Belt pointer"
            hint="from the line between both hip-bone corners to the tip"
            unit="mm"
            value={geometry.beltPointerMm}
            min={30}
            max={600}
            disabled={disabled}
            onSave={(beltPointerMm) => save({ beltPointerMm })}
          />
          <LengthInput
            label="Thigh pointer"
            hint="from the skin to the tip"
            unit="mm"
            value={geometry.thighPointerMm}
            min={30}
            max={600}
            disabled={disabled}
            onSave={(thighPointerMm) => save({ thighPointerMm })}
          />
        </div>
        <EffectLine effect={pointersEffect(geometry)} />
      </section>
      <PlumbSection geometry={geometry} disabled={disabled} save={save} />
    </div>
  );
}

function PlumbSection({
  geometry,
  disabled,
  save,
}: {
  geometry: ClipGeometry;
  disabled: boolean;
  save: (change: Partial<ClipGeometry>) => void;
}) {
  const { store } = useBenchTools();
  const tool = useBench((state) => state.tool);
  const drawing = tool.kind === 'line' && tool.of === 'plumb' ? tool : null;
  const [top, bottom] = drawing?.points ?? [];
  return (
    <section aria-label="Plumb line" className="border-t border-rule py-4">
      <h4 className="font-bold">Plumb line</h4>
      <p className="mb-2 text-note text-soft">
        Two touches on something that hangs or stands straight, such as a door frame.
      </p>
      <div className="flex flex-wrap gap-3">
        {top && bottom ? (
          <Button
            look="primary"
            onClick={() => {
              save({ plumb: { top, bottom } });
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
              store.setState({ tool: drawing ? MARK : { kind: 'line', of: 'plumb', points: [] } })
            }
          >
            {drawing ? 'Stop' : geometry.plumb ? 'Draw it again' : 'Draw it on the picture'}
          </Button>
        )}
        {geometry.plumb && !drawing && (
          <Button look="plain" disabled={disabled} onClick={() => save({ plumb: null })}>
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
      <EffectLine effect={plumbEffect(geometry.plumb)} />
    </section>
  );
}
