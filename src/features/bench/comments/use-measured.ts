import { useMemo } from 'react';
import type { Comment } from '#shared/contracts/comments.ts';
import { capital } from '#shared/exports/running-text.ts';
import { measureById } from '#shared/measures/registry.ts';
import { useBench, useBenchDocument, useBenchModel } from '../bench-context.ts';
import { type BenchRep, holds, withCourse } from '../model/bench-model.ts';
import { markErrorOn } from '../model/mark-error-on.ts';
import { measuresOn, noteOn } from '../values/measured-on.ts';

const inputOn = ({ input }: BenchRep, frame: number) =>
  input?.frames.find((each) => Number(each.frame) === frame) ?? null;

/** The measures known on the frame on show, with what each says; none before the call by eye. */
export function useMeasuresHere(): readonly { readonly id: string; readonly label: string }[] {
  const { current, figures } = useBenchModel();
  const frame = useBench((state) => state.frame);
  return useMemo(() => {
    const input = current && figures ? inputOn(current, frame) : null;
    if (!current || !input) return [];
    return measuresOn(current, input).flatMap(({ id }) => {
      const note = noteOn(current, input, id);
      return note ? [{ id, label: `${note.shape.label}: ${note.shape.text}` }] : [];
    });
  }, [current, figures, frame]);
}

/** What a comment's measure says on its frame as the marks stand now; null where it shows none. */
export function useMeasuredWords({ shape, fromFrame }: Comment): string | null {
  const { reps, current, set } = useBenchModel();
  const { calls, markErrors } = useBenchDocument();
  const measure = shape?.kind === 'measure' ? shape.measure : null;
  return useMemo(() => {
    if (measure === null) return null;
    const name = capital(measureById(measure)?.label ?? measure);
    const rep = reps.find((each) => holds(each, fromFrame));
    if (rep && !calls.some(({ side }) => side === rep.rep.supportSide))
      return `${name}: shown after the call by eye`;
    const input = rep && inputOn(rep, fromFrame);
    if (!rep || !input) return `${name}: ${NOT_NOW}`;
    const worked =
      rep.rep.id === current?.rep.id
        ? current
        : withCourse(rep, set, markErrorOn(markErrors, rep.rep.supportSide));
    const note = noteOn(worked, input, measure);
    if (!note) return `${name}: ${NOT_NOW}`;
    return `${name}: ${note.shape.text}${note.provisional ? ', provisional' : ''}`;
  }, [measure, fromFrame, reps, current, set, calls, markErrors]);
}

const NOT_NOW = 'not measurable on this frame as it is marked now';
