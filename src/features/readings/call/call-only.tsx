import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Call } from '#shared/contracts/calls.ts';
import type { SidePage } from '#shared/contracts/readings.ts';
import { routes } from '#shared/contracts/routes.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import { addressOf } from '#src/api/client.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { moment } from '#src/ui/days.ts';
import { capital } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { SideMark } from '#src/ui/side-mark.tsx';
import { ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { SEEN_WORDS } from '#src/ui/words.ts';
import { SeenTag } from '../head/seen-tag.tsx';
import { ReplaySection } from '../link/replay-section.tsx';
import { PlanSection } from '../plan-section.tsx';
import { SignOffSection } from '../sign-off/sign-off-section.tsx';
import { clipsOfSide } from '../side-clips.ts';
import { callSentence } from '../words/call-sentence.ts';
import { CONFIDENCE_WORDS, SEEN_SUBSTITUTIONS, SUBSTITUTION_WORDS } from '../words/seen-words.ts';

/** A side that was seen and not measured: no angle, no probability, no comparison. */
export function CallOnly({ page, call }: { page: SidePage; call: Call }) {
  const { visit, side } = page;
  return (
    <>
      <section aria-label="Call by eye" className="section section-first">
        <div className="section-head">
          <p className="flex items-center gap-2 font-bold">
            <SideMark kind="support" /> {capital(side)} support
          </p>
          <p className="mt-1 text-note text-soft">No rep of this side is marked.</p>
        </div>
        <div className="section-matter">
          <p className="flex flex-wrap items-center gap-x-3 gap-y-1 text-soft">
            Call by eye <SeenTag by="coach" />
          </p>
          <h1 tabIndex={-1} className="text-title font-bold tracking-[-0.015em] desk:text-reading">
            {SEEN_WORDS[call.seen]}
          </h1>
          <p className="mt-2 text-lead">
            <b>{CONFIDENCE_WORDS[call.confidence]}.</b> {call.by.name}, {moment(call.at)}
          </p>
          <p className="mt-4 max-w-lead text-lead">{callSentence(call, side, otherSide(side))}</p>
        </div>
        <div className="section-margin">
          <div className="text-body text-ink desk:border-l desk:border-rule desk:pl-8">
            <p className="text-soft">Measured reading</p>
            <p className="text-filled text-soft">Not measured</p>
            <p className="mt-2 text-note">
              <b>To measure it: mark the clip, or film again with two light sticks.</b> A straw on
              the belt and a straw above the support knee, three slow lifts. Filming takes three
              minutes, marking by hand fifteen.
            </p>
            <ButtonLink to={paths.visit(visit.id)} className="mt-3">
              Film with pointers
            </ButtonLink>
          </div>
        </div>
      </section>
      <SeenSection page={page} />
      <ClipSection page={page} />
      <Section title="What it can carry">
        <p className="border-b border-rule pb-3">
          <b>Yes:</b> a review, a plan, the athlete’s replay, always labelled as seen.
        </p>
        <p className="pt-3">
          <b>No:</b> an angle, a probability, a comparison of sides, or a change at the retest.
        </p>
      </Section>
      <SignOffSection page={page} />
      <PlanSection page={page} />
      <ReplaySection page={page} />
    </>
  );
}

function SeenSection({ page }: { page: SidePage }) {
  const { agreement } = page;
  return (
    <Section
      title="What was seen"
      margin={
        agreement && (
          <p>
            <b className="text-ink">How good is this eye?</b> Where {agreement.coach.name}’s calls
            stood beside a measured reading, they agreed in {agreement.agreed} of {agreement.of}.
          </p>
        )
      }
    >
      {page.calls.map((call, n) => {
        const not = SEEN_SUBSTITUTIONS.filter((each) => !call.substitutions.includes(each));
        return (
          <div key={call.id} className={n === 0 ? undefined : 'mt-5 border-t border-ink pt-4'}>
            {n > 0 && (
              <p className="mb-2">
                <b>{SEEN_WORDS[call.seen]}.</b> {CONFIDENCE_WORDS[call.confidence]}. {call.by.name},{' '}
                {moment(call.at)}
              </p>
            )}
            <ul>
              {call.substitutions.map((each) => (
                <li key={each} className="border-b border-rule py-2.5 font-bold first:pt-0">
                  {SUBSTITUTION_WORDS[each]}
                </li>
              ))}
              <li className="border-b border-rule py-2.5 first:pt-0">
                <b>Not ticked:</b>{' '}
                {not.map((each) => SUBSTITUTION_WORDS[each].toLowerCase()).join(', ')}
              </li>
              {call.handsFelt !== '' && (
                <li className="py-2.5">
                  <b>What the hands felt:</b> “{call.handsFelt}”{' '}
                  <span className="text-soft">never used in a computation</span>
                </li>
              )}
            </ul>
          </div>
        );
      })}
      <p>
        <Link to={paths.call(page.visit.id, page.side)} className="inline-block py-2.5">
          Add a second call
        </Link>
      </p>
    </Section>
  );
}

function ClipSection({ page }: { page: SidePage }) {
  const visit = useQuery(visitOptions(page.visit.id));
  const clips = clipsOfSide(visit.data?.clips ?? [], page.side);
  return (
    <Section
      title="Clip"
      margin={<p>Lift, trunk and pelvic obliquity can be marked from any front clip.</p>}
    >
      {visit.isPending && (
        <Loading label="Loading the clip">
          <Skeleton className="h-60 w-40" />
        </Loading>
      )}
      {visit.isError && !visit.data && (
        <ErrorState error={visit.error} onRetry={() => void visit.refetch()} />
      )}
      {visit.data && clips.length === 0 && <p className="text-soft">No clip of this side.</p>}
      <ul className="flex flex-wrap gap-6">
        {clips.map((clip) => (
          <li key={clip.id}>
            {clip.state === 'ready' && (
              <img
                src={addressOf(routes.clipPoster, { params: { id: clip.id } })}
                alt={`First picture of ${clip.name}`}
                className="h-60 w-auto rounded bg-dusk"
              />
            )}
            <Link to={paths.bench(clip.id)} className="inline-block py-2.5">
              Mark {clip.name} on the Bench
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}
