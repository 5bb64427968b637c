import { useEffect, useEffectEvent } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { decimal } from '#src/ui/figures.ts';
import { FIELD_BOX, FieldFrame, useFieldIds } from '#src/ui/form/field-frame.tsx';
import { useLabel } from '#src/ui/form/labels.tsx';
import { useFault } from '#src/ui/form/use-fault.ts';
import { paths } from '#src/ui/paths.ts';
import type { NamedRep } from '../side-clips.ts';

interface Span {
  repId: string;
  fromFrame: number;
  toFrame: number;
}

/** Which frames of the clip are played: the whole rep unless the coach names others. */
export function SpanFields({ reps }: { reps: readonly NamedRep[] }) {
  const { setValue } = useFormContext<Span>();
  const [repId, fromFrame, toFrame] = useWatch<Span, ['repId', 'fromFrame', 'toFrame']>({
    name: ['repId', 'fromFrame', 'toFrame'],
  });
  const chosen = reps.find(({ rep }) => rep.id === repId);
  // another rep starts with its own bounds; what was typed belonged to the one before
  const takeBounds = useEffectEvent(() => {
    if (!chosen) return;
    setValue('fromFrame', chosen.rep.startFrame);
    setValue('toFrame', chosen.rep.endFrame);
  });
  useEffect(() => takeBounds(), [repId]);
  if (!chosen) return null;
  const { rep, clip } = chosen;
  const rate = clip.frameRate?.perSecond;
  const typed = rate && toFrame > fromFrame ? (toFrame - fromFrame) / rate : null;
  // longer than the clip: the frames do not exist, and the server will say so
  const seconds = typed !== null && typed <= (clip.durationSeconds ?? Infinity) ? typed : null;
  return (
    <fieldset>
      <legend className="font-bold">Frames that are played</legend>
      <p className="text-note text-soft">
        The rep runs from frame {rep.startFrame} to {rep.endFrame}.{' '}
        {seconds !== null && `This is ${decimal(seconds)} s of the clip. `}
        <Link to={paths.bench(clip.id, { frame: rep.startFrame })}>
          Look for frames on the Bench
        </Link>
      </p>
      <div className="mt-2 grid gap-5 phone:grid-cols-2">
        <FrameField name="fromFrame" label="From frame" />
        <FrameField name="toFrame" label="To frame" />
      </div>
    </fieldset>
  );
}

function FrameField({ name, label }: { name: 'fromFrame' | 'toFrame'; label: string }) {
  const { register } = useFormContext<Span>();
  const error = useFault(name);
  const ids = useFieldIds(undefined, error);
  useLabel(name, label);
  return (
    <FieldFrame ids={ids} label={label} error={error}>
      <input
        {...register(name, { valueAsNumber: true })}
        type="number"
        inputMode="numeric"
        min={0}
        step={1}
        id={ids.id}
        aria-describedby={ids.describedBy}
        aria-invalid={error !== undefined}
        className={FIELD_BOX}
      />
    </FieldFrame>
  );
}
