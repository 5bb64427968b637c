import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athleteOptions, athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import { Button } from '#src/ui/button.tsx';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution, ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { AthleteForm, type AthleteValues } from './athlete-form.tsx';
import { fullName } from './athlete-words.ts';

export function EditAthletePage() {
  const { id = '' } = useParams();
  const athlete = useQuery(athleteOptions(id));
  return (
    <Page
      title="Change details"
      crumbs={[
        { label: 'Athletes', to: paths.athletes() },
        { label: athlete.data ? fullName(athlete.data) : 'athlete', to: paths.athlete(id) },
        { label: 'details' },
      ]}
    >
      {athlete.isPending && <Loading />}
      {athlete.isError && (
        <ErrorState error={athlete.error} onRetry={() => void athlete.refetch()} />
      )}
      {athlete.data && <Edit athlete={athlete.data} />}
    </Page>
  );
}

const valuesOf = (athlete: Athlete): AthleteValues => ({
  givenName: athlete.givenName,
  familyName: athlete.familyName,
  birthDate: athlete.birthDate,
  heightMm: athlete.heightMm,
  sport: athlete.sport,
  cautions: athlete.cautions,
  contactEmail: athlete.contactEmail,
});

function Edit({ athlete }: { athlete: Athlete }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  // what the form started from: a newer version that arrives meanwhile must not empty what is being typed
  const [base, setBase] = useState(athlete);
  const [conflict, setConflict] = useState(false);

  const save = async (values: AthleteValues) => {
    const { id, version } = base;
    try {
      await call(routes.editAthlete, { params: { id }, body: { ...values, version } });
    } catch (error) {
      setConflict(isProblem(error, 'edited-meanwhile'));
      throw error;
    }
    await client.invalidateQueries({ queryKey: athletesKey });
    say('Saved.');
    await navigate(paths.athlete(id));
  };
  const loadNewer = async () => {
    setBase(await client.fetchQuery({ ...athleteOptions(base.id), staleTime: 0 }));
    setConflict(false);
  };
  return (
    <>
      {conflict && (
        <div className="mb-6 max-w-form">
          <Caution title="Changed meanwhile.">
            Copy what you want to keep; loading the newer version empties what you typed here.
          </Caution>
          <Button className="mt-3" onClick={() => void loadNewer()}>
            Load the newer version
          </Button>
        </div>
      )}
      <AthleteForm
        key={base.version}
        submit="Save"
        back={paths.athlete(base.id)}
        initial={valuesOf(base)}
        send={save}
      />
    </>
  );
}
