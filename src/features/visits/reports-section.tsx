import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Report } from '#shared/contracts/reports.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call, download } from '#src/api/client.ts';
import { reportsOptions } from '#src/api/reports.queries.ts';
import type { May } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { fileSize } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { saveAs } from '#src/ui/save-as.ts';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';

/** The visit on paper for a referring clinician: every report that was asked for, newest first. */
export function ReportsSection({
  visitId,
  clips,
  may,
}: {
  visitId: string;
  clips: readonly Clip[];
  may: May;
}) {
  const ready = clips.some(({ state }) => state === 'ready');
  const reports = useQuery(reportsOptions(visitId));
  // what was made stays when the clips are gone
  if (!ready && !reports.data?.items.length) return null;
  return (
    <Section
      id="reports"
      title="Report for the referring clinician"
      margin={
        <p>
          A report names the athlete and says what stood when it was asked for. A later one stands
          beside it and changes nothing in it.
        </p>
      }
    >
      <p className="max-w-lead">
        One to three pages: what was tested, calls by eye, courses and values with their error,
        sign-off, plan and limits.
      </p>
      {reports.isPending && (
        <Loading label="Loading the reports">
          <SkeletonLines count={2} />
        </Loading>
      )}
      {reports.isError && (
        <ErrorState error={reports.error} onRetry={() => void reports.refetch()} />
      )}
      {reports.data && <Reports visitId={visitId} reports={reports.data.items} may={may} />}
    </Section>
  );
}

function Reports({
  visitId,
  reports,
  may,
}: {
  visitId: string;
  reports: readonly Report[];
  may: May;
}) {
  const making = reports.some(({ state }) => state === 'asked');
  const make = useAsked(visitId, () => call(routes.makeReport, { params: { id: visitId } }));
  return (
    <>
      {reports.length === 0 && <p className="mt-3 text-soft">No report has been made yet.</p>}
      {reports.length > 0 && (
        <ul className="mt-3" aria-label="Reports">
          {reports.map((report) => (
            <Row key={report.id} report={report} may={may} />
          ))}
        </ul>
      )}
      {may('report.make') && !making && (
        <div className="mt-4">
          <Button busy={make.isPending} busyLabel="Asking …" onClick={() => make.mutate()}>
            Make a report
          </Button>
          <Failure error={make.error} />
        </div>
      )}
    </>
  );
}

/** Asks the server to make one; how it goes is then told by the list. */
function useAsked(visitId: string, mutationFn: () => Promise<Report>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn,
    onSettled: () => client.invalidateQueries({ queryKey: reportsOptions(visitId).queryKey }),
  });
}

function Failure({ error }: { error: Error | null }) {
  return (
    error && (
      <p role="alert" className="w-full text-note text-alarm">
        {error.message}
      </p>
    )
  );
}

const STATE_WORDS = {
  asked: () => 'Being made',
  ready: ({ pages, bytes }) =>
    `Ready: ${pages ?? 0} ${pages === 1 ? 'page' : 'pages'}, PDF, ${fileSize(bytes ?? 0)}`,
  failed: () => 'Could not be made',
} as const satisfies Record<Report['state'], (report: Report) => string>;

function Row({ report, may }: { report: Report; may: May }) {
  const { id, visitId, number, state, by, at } = report;
  const again = useAsked(visitId, () => call(routes.makeReportAgain, { params: { id } }));
  const save = useMutation({
    mutationFn: () => download(routes.reportFile, { params: { id } }),
    onSuccess: ({ name, blob }) => saveAs(name, blob),
  });
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-1 last:border-0">
      <span className="py-2">
        <strong>Report {number}</strong> <span role="status">{STATE_WORDS[state](report)}</span>
        <span className="block text-note text-soft">
          asked for by {by.name}, {moment(at)}
        </span>
      </span>
      {state === 'ready' && (
        <Button
          look="plain"
          busy={save.isPending}
          onClick={() => save.mutate()}
          aria-label={`Save: Report ${number}`}
        >
          Save
        </Button>
      )}
      {state === 'failed' && may('report.make') && (
        <Button
          look="plain"
          busy={again.isPending}
          onClick={() => again.mutate()}
          aria-label={`Try again: Report ${number}`}
        >
          Try again
        </Button>
      )}
      <Failure error={save.error ?? again.error} />
    </li>
  );
}
