import type { ReactNode } from 'react';
import { halfWidthText, valueText } from '#shared/exports/value-text.ts';
import type { FrameValue } from '#shared/measures/frame-values.ts';
import type { Measure } from '#shared/measures/measure.ts';
import { MEASURES } from '#shared/measures/registry.ts';
import { cx } from '#src/ui/class-names.ts';
import { paths } from '#src/ui/paths.ts';
import { useBench, useBenchModel, useBenchTools } from '../bench-context.ts';
import { EXTRAS, type Extra } from '../model/led.ts';
import { type FrameFigures } from './frame-figures.ts';
import { useFrameFigures } from './use-frame-figures.ts';
import { isSetUp, missingWords } from './value-words.ts';

/** Parts of the turn stand under it. */
const PARTS: ReadonlySet<string> = new Set(['pelvis-part', 'thigh-part']);

const useMeasures = (): readonly Measure[] => {
  const { view } = useBenchModel();
  return MEASURES.filter(({ views }) => views.some((each) => each === view));
};

/** Every value of the frame on show, each with its ±, or with what it lacks. */
export function ValuesTable() {
  const frame = useBench((state) => state.frame);
  return <Values title={`Values of frame ${frame}`} measures={useMeasures()} />;
}

/** Lift, turn and its parts stand first in the registry. */
const FIRST = 4;

/** The same in three tables, so that all of it is seen at once under the course: `beside` stands right of the first. */
export function ValuesAtOnce({ beside }: { beside: ReactNode }) {
  const frame = useBench((state) => state.frame);
  const measures = useMeasures();
  const rest = measures.slice(FIRST);
  const half = FIRST + Math.ceil(rest.length / 2);
  return (
    <div className="bench-vals">
      <Values title={`Values of frame ${frame}`} measures={measures.slice(0, FIRST)} />
      {beside}
      {rest.length > 0 && (
        <div className="bench-vals-more">
          <Values title="Substitutions" measures={measures.slice(FIRST, half)} />
          <Values title="Substitutions, the rest" quiet measures={measures.slice(half)} />
        </div>
      )}
    </div>
  );
}

/** @param quiet the title is for a screen reader alone: it stands beside another table of the same kind */
function Values({
  title,
  quiet = false,
  measures,
}: {
  title: string;
  quiet?: boolean;
  measures: readonly Measure[];
}) {
  const figures = useFrameFigures();
  return (
    <table className="bench-values">
      <caption className="sr-only">{title}</caption>
      <thead>
        <tr>
          <th scope="col">
            <span className={cx(quiet && 'sr-only')}>{title}</span>
          </th>
          <th scope="col">
            <span className="sr-only">value</span>
          </th>
          <th scope="col" className="whitespace-nowrap">
            ± 95 %
          </th>
        </tr>
      </thead>
      <tbody>
        {measures.map((measure) => (
          <ValueRow
            key={measure.id}
            measure={measure}
            part={PARTS.has(measure.id)}
            value={figures?.values.find((each) => each.measure.id === measure.id) ?? null}
            figures={figures}
          />
        ))}
      </tbody>
    </table>
  );
}

function ValueRow({
  measure,
  part,
  value,
  figures,
}: {
  measure: Measure;
  part: boolean;
  value: FrameValue | null;
  figures: FrameFigures | null;
}) {
  const { view } = useBenchModel();
  const front = view === 'front';
  const provisional = value?.measure.id === 'turn' && figures?.shown?.provisional;
  return (
    <tr>
      <th scope="row" title={measure.sign} className={cx(part && 'pl-4 text-soft')}>
        <a
          href={paths.method(measure.id)}
          target="_blank"
          rel="noopener"
          title={`${measure.sign}; how it is computed, in a new tab`}
          className="text-inherit decoration-rule hover:decoration-current"
        >
          {measure.label}
        </a>
        {provisional && <span className="ml-1 text-caption text-ochre">provisional</span>}
      </th>
      {value && value.value.missing === null ? (
        <>
          <td className={cx('bench-value', !part && 'font-bold')}>
            {valueText(value.measure, value.value.value, front)}
          </td>
          <td className="whitespace-nowrap text-soft">{halfWidthText(value, front)}</td>
        </>
      ) : (
        <td
          colSpan={2}
          className="bench-lacking text-soft"
          title={value?.value.missing ? missingWords(value.value.missing) : undefined}
        >
          {value?.value.missing ? <Lacking value={value} /> : '–'}
        </td>
      )}
    </tr>
  );
}

const extraOf = (value: FrameValue): Extra | null => {
  const { missing } = value.value;
  if (missing?.code !== 'landmark-not-marked') return null;
  return (
    (Object.keys(EXTRAS) as Extra[]).find((extra) =>
      EXTRAS[extra].some((id) => missing.landmarks.some((each) => each === id)),
    ) ?? null
  );
};

/** What is missing, with the way to give it where there is one. */
function Lacking({ value }: { value: FrameValue }) {
  const { store } = useBenchTools();
  const { missing } = value.value;
  if (!missing) return null;
  const extra = extraOf(value);
  const link = 'inline-block min-h-[24px] text-left text-ink underline underline-offset-[3px]';
  if (extra)
    return (
      <button
        type="button"
        className={link}
        onClick={() =>
          store.setState((state) => ({
            taste: { ...state.taste, extras: [...new Set([...state.taste.extras, extra])] },
            chosen: EXTRAS[extra][0],
          }))
        }
      >
        {extra === 'shoulders' ? 'mark both shoulders' : 'mark toe and heel'}
      </button>
    );
  if (isSetUp(missing))
    return (
      <button type="button" className={link} onClick={() => store.setState({ desk: 'set-up' })}>
        {missingWords(missing)}
      </button>
    );
  return <>{missingWords(missing)}</>;
}
