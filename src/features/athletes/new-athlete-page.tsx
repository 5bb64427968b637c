import { useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { useStatus } from '#src/ui/status.tsx';
import { AthleteForm } from './athlete-form.tsx';
import { fullName } from './athlete-words.ts';

export function NewAthletePage() {
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  return (
    <Page
      title="Add an athlete"
      crumbs={[{ label: 'Athletes', to: paths.athletes() }, { label: 'new' }]}
      lead="They join your own caseload."
    >
      <AthleteForm
        submit="Add"
        back={paths.athletes()}
        send={async (body) => {
          const athlete = await call(routes.addAthlete, { body });
          await Promise.all([
            client.invalidateQueries({ queryKey: athletesKey }),
            client.invalidateQueries({ queryKey: todayQuery.queryKey }),
          ]);
          say(`${fullName(athlete)} is added. Next: the consent.`);
          await navigate(paths.athlete(athlete.id));
        }}
      />
    </Page>
  );
}
