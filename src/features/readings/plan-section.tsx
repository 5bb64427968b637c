import type { SidePage } from '#shared/contracts/readings.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';

/** The way from what was found to what is done about it. */
export function PlanSection({ page: { visit, side } }: { page: SidePage }) {
  return (
    <Section
      title="Plan"
      note="what to do until the retest"
      margin={<p>The practice’s rules suggest; you decide. What is not known leads to a retest.</p>}
    >
      <ButtonLink to={paths.planStart(visit.id, side)}>Open the plan</ButtonLink>
    </Section>
  );
}
