import { useId, useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { Checkbox } from '#src/ui/checkbox.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useBench, useBenchTools } from '../bench-context.ts';
import { type DrawnKind, MARK, shapeOf, toolAsks } from '../store/tools.ts';
import { useComments } from './use-comments.ts';
import { useMeasuresHere } from './use-measured.ts';

const SHAPES: readonly { of: DrawnKind; label: string }[] = [
  { of: 'point', label: 'Point' },
  { of: 'ring', label: 'Ring' },
  { of: 'stroke', label: 'Stroke' },
];

/** A comment at the frame on show, or from a frame on to the one on show, with a shape if wished. */
export function CommentForm() {
  const { store } = useBenchTools();
  const { add } = useComments();
  const frame = useBench((state) => state.frame);
  const tool = useBench((state) => state.tool);
  const [body, setBody] = useState('');
  const [from, setFrom] = useState<number | null>(null);
  const [shared, setShared] = useState(false);
  const [measure, setMeasure] = useState('');
  const measures = useMeasuresHere();
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const id = useId();
  const measureId = useId();
  const drawing = tool.kind === 'shape' ? tool : null;
  const asks = drawing && toolAsks(drawing);
  const [fromFrame, toFrame] =
    from === null ? [frame, frame] : from <= frame ? [from, frame] : [frame, from];

  // one thing is pointed at; a measure is taken on one frame
  const measured = fromFrame === toFrame && measures.some(({ id }) => id === measure);
  const draw = (of: DrawnKind) => {
    setMeasure('');
    store.setState({
      tool: drawing?.of === of ? MARK : { kind: 'shape', of, points: [] },
    });
  };
  const choose = (id: string) => {
    setMeasure(id);
    if (drawing) store.setState({ tool: MARK });
  };
  const send = async () => {
    if (body.trim() === '') return;
    setBusy(true);
    setError(null);
    try {
      const shape = measured ? ({ kind: 'measure', measure } as const) : shapeOf(tool);
      await add({ body, fromFrame, toFrame, shape, shared });
      setBody('');
      setMeasure('');
      setFrom(null);
      setShared(false);
      if (drawing) store.setState({ tool: MARK });
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <section aria-label="New comment" className="border-t border-rule py-4">
      <label htmlFor={id} className="font-bold">
        {fromFrame === toFrame
          ? `Comment at frame ${frame}`
          : `Comment from frame ${fromFrame} to ${toFrame}`}
      </label>
      <textarea
        id={id}
        rows={2}
        maxLength={2000}
        data-comment-field=""
        className={FIELD_BOX}
        value={body}
        onChange={(event) => setBody(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) void send();
        }}
      />
      <div className="mt-2 flex flex-wrap gap-2">
        <Button
          className="!px-3 text-note"
          aria-pressed={from !== null}
          onClick={() => setFrom(from === null ? frame : null)}
        >
          {from === null ? 'A stretch from here' : `From ${from}: step to its end`}
        </Button>
        {SHAPES.map(({ of, label }) => (
          <Button
            key={of}
            className="!px-3 text-note"
            aria-pressed={drawing?.of === of}
            onClick={() => draw(of)}
          >
            {label}
          </Button>
        ))}
      </div>
      {drawing && (
        <p role="status" className="mt-2 text-note">
          {asks === null
            ? 'Drawn on the picture.'
            : drawing.of === 'stroke'
              ? `${asks} on the picture.`
              : `Press on the picture: ${asks.toLowerCase()}.`}
        </p>
      )}
      {measures.length > 0 && fromFrame === toFrame && (
        <div className="mt-3">
          <label htmlFor={measureId} className="text-note">
            With a measure of this frame
          </label>
          <select
            id={measureId}
            className={FIELD_BOX}
            value={measured ? measure : ''}
            onChange={(event) => choose(event.target.value)}
          >
            <option value="">none</option>
            {measures.map(({ id: of, label }) => (
              <option key={of} value={of}>
                {label}
              </option>
            ))}
          </select>
        </div>
      )}
      <Checkbox
        label="Show it to the athlete on a replay"
        checked={shared}
        onChange={(event) => setShared(event.target.checked)}
        className="!border-0"
      />
      {error !== null && <ErrorState error={error} />}
      <Button look="primary" busy={busy} disabled={body.trim() === ''} onClick={() => void send()}>
        Comment
      </Button>
    </section>
  );
}
