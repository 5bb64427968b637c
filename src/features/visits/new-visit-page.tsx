import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type * as z from 'zod';
import type { Athlete } from '#shared/contracts/athletes.ts';
import { id } from '#shared/contracts/primitives.ts';
import { routes } from '#shared/contracts/routes.ts';
import { visitBody } from '#shared/contracts/visits.ts';
import { athleteOptions, athletesKey, athleteVisitsOptions } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { today } from '#src/ui/days.ts';
import { Form } from '#src/ui/form/form.tsx';
import { TextArea, TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { FilmedLike } from './filmed-like.tsx';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution, Empty, ErrorState, Loading } from '#src/ui/states.tsx';

/** Opens a visit: one day's testing of one athlete. Without consent it leads to the consent first. */
export function NewVisitPage() {
  const { id = '' } = useParams();
  const athlete = useQuery(athleteOptions(id));
  const name = athlete.data ? `${athlete.data.givenName} ${athlete.data.familyName}` : 'athlete';
  return (
    <Page
      title="New visit"
      crumbs={[
        { label: 'Athletes', to: paths.athletes() },
        { label: name, to: paths.athlete(id) },
        { label: 'new visit' },
      ]}
      lead="One day’s testing: safety questions, filming, clips, and what you saw."
    >
      {athlete.isPending && <Loading />}
      {athlete.isError && (
        <ErrorState error={athlete.error} onRetry={() => void athlete.refetch()} />
      )}
      {athlete.data &&
        (athlete.data.consentedTo.includes('assessment') ? (
          <OpenVisit athlete={athlete.data} />
        ) : (
          <Section title="Consent">
            <Empty
              title={`There is no consent that is valid today`}
              action={
                <ButtonLink look="primary" to={`${paths.newConsent(id)}?then=visit`}>
                  Record the consent
                </ButtonLink>
              }
            >
              Without it nothing can be filmed. It takes a minute, then you are back here.
            </Empty>
          </Section>
        ))}
    </Page>
  );
}

type Typed = z.input<typeof visitBody>;

/** So many earlier visits are offered. */
const SHOWN = 6;

function OpenVisit({ athlete }: { athlete: Athlete }) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const asked = id.safeParse(search.get('like')).data ?? null;
  const form = useZodForm(visitBody, { day: today(), note: '', likeVisitId: asked });
  const visits = useQuery(athleteVisitsOptions(athlete.id));
  const earlier = (visits.data?.items ?? []).slice(0, SHOWN);
  return (
    <Form
      form={form}
      className="max-w-form space-y-6"
      send={async (body) => {
        const visit = await call(routes.addVisit, { params: { id: athlete.id }, body });
        await client.invalidateQueries({ queryKey: athletesKey });
        // back leads to the athlete, not to this form again
        await navigate(paths.visit(visit.id), { replace: true });
      }}
    >
      {athlete.cautions !== '' && (
        <Caution title="Be careful with:">
          <span className="whitespace-pre-line">{athlete.cautions}</span>
        </Caution>
      )}
      <TextField<Typed> name="day" type="date" max={today()} label="Day" />
      {earlier.length > 0 && <FilmedLike earlier={earlier} form={form} />}
      <TextArea<Typed>
        name="note"
        label="Note"
        optional
        hint="What is different today: after a race, another pair of shoes …"
      />
      <Button type="submit" look="primary" busy={form.formState.isSubmitting} busyLabel="Opening …">
        Open the visit
      </Button>
    </Form>
  );
}
