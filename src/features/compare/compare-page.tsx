import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { id } from '#shared/contracts/primitives.ts';
import { sideReadingOptions } from '#src/api/readings.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty } from '#src/ui/states.tsx';
import { Choice } from './choice/choice.tsx';
import { type End, endOf } from './ends.ts';
import { Pair } from './pair.tsx';

/** `/compare`: two reps, sides or visits of one athlete, matched by lift. */
export function ComparePage() {
  const [search] = useSearchParams();
  const first = endOf(search.get('first'));
  const second = endOf(search.get('second'));
  const asked = id.safeParse(search.get('athlete'));
  return (
    <Page
      title="Compare"
      lead="Two reps, sides or visits of one athlete: matched by lift, not by the clock."
    >
      {(first ?? second) ? (
        <Chosen first={first} second={second} />
      ) : asked.success ? (
        <Choice athleteId={asked.data} first={null} second={null} />
      ) : (
        <Section title="Whom" wide first>
          <Empty
            title="Choose an athlete first"
            action={<ButtonLink to={paths.athletes()}>Open the athletes</ButtonLink>}
          >
            The ways in stand on the athlete’s page, on a visit and on every reading.
          </Empty>
        </Section>
      )}
    </Page>
  );
}

/** The athlete is that of the first end that is known. */
function Chosen({ first, second }: { first: End | null; second: End | null }) {
  const known = first ?? second;
  const page = useQuery({
    ...sideReadingOptions(known?.visitId ?? '', known?.side ?? 'right'),
    enabled: known !== null,
  });
  const [search] = useSearchParams();
  const athleteId = page.data?.athlete.id ?? id.safeParse(search.get('athlete')).data;
  return (
    <>
      {athleteId !== undefined && (
        <Choice key={athleteId} athleteId={athleteId} first={first} second={second} />
      )}
      {first && second && <Pair first={first} second={second} />}
    </>
  );
}
