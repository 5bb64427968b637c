import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { SidePage } from '#shared/contracts/readings.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { sideReadingOptions, sidesKey } from '#src/api/readings.queries.ts';
import { Checkbox } from '#src/ui/checkbox.tsx';
import { Section } from '#src/ui/page.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** 'The planted thigh turns little': counts only with the belt pointer alone, and is always shown. */
export function AssumptionSection({ page }: { page: SidePage }) {
  const client = useQueryClient();
  const say = useStatus();
  const change = useMutation({
    mutationFn: (on: boolean) =>
      call(routes.setAssumption, {
        params: { id: page.visit.id, side: page.side },
        body: { on },
      }),
    onSuccess: (answer) => {
      client.setQueryData(sideReadingOptions(page.visit.id, page.side).queryKey, answer);
      say(answer.assumption ? 'Computed with the assumption.' : 'Computed without the assumption.');
      return client.invalidateQueries({ queryKey: sidesKey(page.visit.id), refetchType: 'none' });
    },
  });
  if (page.reading?.result.set !== 'belt' && !page.assumption) return null;
  return (
    <Section
      title="Assumption"
      margin={
        <p>
          With the belt pointer alone an early turn of 16° is found 9 times in 10 from one rep under
          it, and not up to 20° without it. A thigh pointer needs no assumption.
        </p>
      }
    >
      <Checkbox
        checked={change.isPending ? change.variables : page.assumption}
        disabled={change.isPending}
        onChange={(event) => change.mutate(event.target.checked)}
        label="Take the planted thigh as turning little"
        note="Within about 8° for 95 of 100 people. From our model, no source. Stored with the reading and shown beside it."
      />
      {change.isError && (
        <div className="mt-3">
          <ErrorState error={change.error} />
        </div>
      )}
    </Section>
  );
}
