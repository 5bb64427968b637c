import { useQuery } from '@tanstack/react-query';
import type { ProtocolVersion } from '#shared/contracts/protocol.ts';
import { differences } from '#shared/protocol/figures.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { moment } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { DifferenceList } from './difference-list.tsx';

/** Every version, newest first: what it changed, who made it, when and why. */
export function ProtocolHistory({ history }: { history: readonly ProtocolVersion[] }) {
  const setUps = useQuery(setUpsQuery).data?.items ?? [];
  const nameOf = (id: string) => setUps.find((each) => each.id === id)?.name ?? null;
  return (
    <Section title="Versions" margin={<p>None is ever changed or deleted.</p>}>
      <ol>
        {history.map(({ version, at, by, note, values }, n) => {
          const before = history[n + 1];
          return (
            <li key={version} className="border-b border-rule py-4 first:pt-0 last:border-0">
              <h3 className="font-bold">
                Protocol {version}
                {n === 0 && <span className="font-normal text-soft"> holds now</span>}
              </h3>
              <p className="text-note text-soft">
                {moment(at)}, {by ? `by ${by.name}` : 'came with the practice'}
              </p>
              <p className="mt-1">{note}</p>
              {before && <DifferenceList items={differences(before.values, values, nameOf)} />}
            </li>
          );
        })}
      </ol>
    </Section>
  );
}
