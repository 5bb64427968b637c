import type { ClipGeometry } from '#shared/contracts/clips.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { offFrontOfClip } from '#shared/records/engine-input.ts';
import { useStatus } from '#src/ui/status.tsx';
import { useEdits } from '../actions/use-edits.ts';
import { useBenchDocument } from '../bench-context.ts';
import { EffectLine } from './effect-line.tsx';
import { distanceEffect, floorEffect, lensEffect, plumbEffect, pointersEffect } from './effect.ts';
import { LengthInput } from './length-input.tsx';
import { LineSection } from './line-section.tsx';
import { ScaleSection } from './scale-section.tsx';
import { ShutterSection } from './shutter-section.tsx';

/** How the clip was filmed, and what each part of it makes measurable. */
export function SetUpPanel() {
  const { clip, may, protocol } = useBenchDocument();
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
        <EffectLine effect={pointersEffect(geometry, gatesOf(protocol.rules))} />
      </section>
      <LineSection
        of="plumb"
        title="Plumb line"
        hint="Two touches on something that hangs or stands straight, such as a door frame."
        there={geometry.plumb !== null}
        effect={plumbEffect(geometry.plumb)}
        disabled={disabled}
        onKeep={(top, bottom) => save({ plumb: { top, bottom } })}
        onTakeAway={() => save({ plumb: null })}
      />
      {clip.view === 'front' && (
        <LineSection
          of="floor"
          title="Floor line"
          hint="Two touches: both heels in quiet stance, or better the two ends of a line on the floor on which both heels stand. It tells whether the camera stood in front."
          there={geometry.floorLine !== null}
          effect={floorEffect(geometry.floorLine, offFrontOfClip(clip))}
          disabled={disabled}
          onKeep={(a, b) => save({ floorLine: { a, b } })}
          onTakeAway={() => save({ floorLine: null })}
        />
      )}
      <ShutterSection
        shutter={geometry.shutter}
        framesPerSecond={clip.frameRate?.perSecond ?? null}
        disabled={disabled}
        onSave={(shutter) => save({ shutter })}
      />
    </div>
  );
}
