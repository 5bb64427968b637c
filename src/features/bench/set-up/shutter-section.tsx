import { useId, useState } from 'react';
import type { Shutter } from '#shared/contracts/clips.ts';
import { FIELD_BOX, Fault } from '#src/ui/form/field-frame.tsx';
import { shutterEffect } from './effect.ts';
import { LineSection } from './line-section.tsx';

const SLOWEST = 8;
const QUICKEST = 20_000;

/** How long the shutter stood open: as the camera app tells it, or measured on a smeared dot. */
export function ShutterSection({
  shutter,
  framesPerSecond,
  disabled,
  onSave,
}: {
  shutter: Shutter | null;
  framesPerSecond: number | null;
  disabled: boolean;
  onSave: (shutter: Shutter | null) => void;
}) {
  return (
    <LineSection
      of="smear"
      title="Shutter"
      hint="As the camera app shows it; or on the fastest frame two touches at the two ends of what it drew out of one dot, less the width of the dot."
      there={shutter?.from === 'smear'}
      effect={shutterEffect(shutter, framesPerSecond)}
      disabled={disabled}
      onKeep={(a, b) => onSave({ from: 'smear', a, b })}
      onTakeAway={() => onSave(null)}
    >
      <PartOfASecond
        value={shutter?.from === 'typed' ? shutter.perSecond : null}
        disabled={disabled}
        onSave={(perSecond) => onSave(perSecond === null ? null : { from: 'typed', perSecond })}
      />
    </LineSection>
  );
}

/** The `120` of 1/120 s; empty for not known. */
function PartOfASecond({
  value,
  disabled,
  onSave,
}: {
  value: number | null;
  disabled: boolean;
  onSave: (value: number | null) => void;
}) {
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const text = (typed ?? '').trim();
  const part =
    typed === null ? value : text === '' ? null : /^\d+$/.test(text) ? Number(text) : NaN;
  const fault =
    part !== null && !(part >= SLOWEST && part <= QUICKEST)
      ? `Write a whole number from ${SLOWEST} to ${QUICKEST}: 120 for 1/120 s.`
      : null;
  const save = () => {
    if (typed === null || fault !== null) return;
    setTyped(null);
    if (part !== value) onSave(part);
  };
  return (
    <div className="mb-3">
      <label htmlFor={id} className="font-bold">
        Shutter, one part of a second
      </label>
      <span className="mt-1 flex items-center gap-2">
        <span aria-hidden="true" className="text-soft">
          1 /
        </span>
        <input
          id={id}
          inputMode="numeric"
          autoComplete="off"
          disabled={disabled}
          className={`${FIELD_BOX} !mt-0 !w-[7em]`}
          aria-describedby={fault === null ? undefined : `${id}-fault`}
          aria-invalid={fault !== null}
          value={typed ?? (value === null ? '' : String(value))}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={save}
          onKeyDown={(event) => {
            if (event.key === 'Enter') save();
            else if (event.key === 'Escape') setTyped(null);
          }}
        />
        <span className="text-soft">s</span>
      </span>
      {fault !== null && <Fault id={`${id}-fault`}>{fault}</Fault>}
    </div>
  );
}
