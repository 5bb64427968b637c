import type { SidePage } from '#shared/contracts/readings.ts';
import { moment } from '#src/ui/days.ts';
import { plusMinus, turn } from '#src/ui/figures.ts';
import { markErrorWords } from '#src/ui/mark-error-words.ts';
import { Section } from '#src/ui/page.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';

/** Every reading of this side, newest first. None is ever changed; other marks make another. */
export function HistorySection({ page }: { page: SidePage }) {
  const current = page.reading?.id;
  if (page.history.length === 0) return null;
  return (
    <Section
      title="History"
      margin={<p>The same marks give the same reading again, to the last digit.</p>}
    >
      <ul>
        {page.history.map((reading) => (
          <li
            key={reading.id}
            className="flex flex-wrap items-center gap-x-6 border-b border-rule py-2.5 last:border-0"
          >
            <StateDot kind={reading.id === current ? 'done' : 'none'} wrap>
              <span className="text-ink">{reading.label}</span>
            </StateDot>
            {reading.change !== null && reading.plusMinus !== null && (
              <span>
                {turn(reading.change)} {plusMinus(reading.plusMinus)}
              </span>
            )}
            <span className="text-note text-soft">
              {moment(reading.at)}, marked by {reading.by.name}, engine {reading.engine}, protocol{' '}
              {reading.protocol.version}, {markErrorWords(reading.markError)}
              {reading.id === current && ', as the marks stand now'}
            </span>
          </li>
        ))}
      </ul>
    </Section>
  );
}
