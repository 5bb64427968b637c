import { frameIndex } from '#shared/timing/units.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { supportWords } from '#src/ui/words.ts';
import { Button } from '#src/ui/button.tsx';
import { useBenchDocument, useBenchModel, useBenchTools } from '../bench-context.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { useReading } from '../reading/use-reading.ts';
import { goTo } from '../store/bench-store.ts';
import { AddRep } from './add-rep.tsx';
import { QuietStance } from './quiet-stance.tsx';
import { RepActions } from './rep-actions.tsx';
import { MarkAgain } from '../blind/mark-again.tsx';
import { TiedLift } from './tied-lift.tsx';
import { EXCLUSION_WORDS } from './rep-words.ts';

/** Every rep of the clip, and a new one named by its span. */
export function RepsPanel() {
  const { may } = useBenchDocument();
  const { reps } = useBenchModel();
  return (
    <div className="max-w-[38em]">
      {reps.length === 0 ? (
        <p className="border-t border-rule py-4">
          A rep is one lift: quiet stance, foot off, rise, top, lower, foot down. A clip can hold
          several, of both sides.
        </p>
      ) : (
        <ul>
          {reps.map((each) => (
            <RepRow key={each.rep.id} own={each} />
          ))}
        </ul>
      )}
      {may.mark && <AddRep />}
    </div>
  );
}

function RepRow({ own }: { own: BenchRep }) {
  const { store, times } = useBenchTools();
  const { may } = useBenchDocument();
  const { current, figures } = useBenchModel();
  const { result } = useReading();
  const { rep, marks } = own;
  const isCurrent = rep.id === current?.rep.id;
  const used = figures && result?.reps.find((each) => each.id === rep.id)?.used;
  const seconds = ((times[rep.endFrame] ?? 0) - (times[rep.startFrame] ?? 0)) / 1000;
  return (
    <li className="border-t border-rule py-3" aria-current={isCurrent || undefined}>
      <div className="flex flex-wrap items-center justify-between gap-x-4">
        <p>
          <b>Rep {rep.number}</b>, {supportWords(rep.supportSide)}
          <span className="text-soft">
            , frames {rep.startFrame} to {rep.endFrame}, {seconds.toFixed(1)} s, {marks.size} marked
          </span>
        </p>
        {rep.excluded ? (
          <StateDot kind="none">left out: {EXCLUSION_WORDS[rep.excluded].toLowerCase()}</StateDot>
        ) : used ? (
          <StateDot kind="done">in the reading</StateDot>
        ) : (
          <StateDot kind="wait">not in the reading yet</StateDot>
        )}
      </div>
      {rep.excluded && rep.excludedNote !== '' && (
        <p className="text-note text-soft">{rep.excludedNote}</p>
      )}
      <QuietStance own={own} />
      <TiedLift own={own} />
      <div className="flex flex-wrap gap-x-5">
        {!isCurrent && (
          <Button
            look="plain"
            onClick={() => {
              store.setState({ repId: rep.id });
              goTo(store, frameIndex(rep.startFrame));
            }}
          >
            Go there
          </Button>
        )}
        {may.markAgain && marks.size > 0 && <MarkAgain own={own} />}
        {may.mark && <RepActions own={own} />}
      </div>
    </li>
  );
}
