import { screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import type { Report } from '#shared/contracts/reports.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aClip, anAthlete, aVisit, coachId, otherId, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const aReport = (change: Partial<Report> = {}): Report => ({
  id: otherId,
  visitId,
  number: 1,
  state: 'ready',
  pages: 2,
  bytes: 48_000,
  by: { id: coachId, name: 'Maren Okafor' },
  at: '2026-03-03T16:20:00Z',
  ...change,
});

const opened = (reports: Report[], role: Role = 'coach') => {
  const state = { reports };
  const api = signedInApi(role)
    .on(routes.visit, () => ({ visit: aVisit(), clips: [aClip()] }))
    .on(routes.athlete, () =>
      anAthlete(role === 'supervisor' ? { coach: { id: otherId, name: 'Runa Vance' } } : {}),
    )
    .on(routes.listSetUps, () => ({ items: [] }))
    .on(routes.listCalls, () => ({ items: [] }))
    .on(routes.listReports, () => ({ items: state.reports }));
  return { api, state, ...renderAt(`/visits/${visitId}`) };
};
const section = async () =>
  within(await screen.findByRole('region', { name: 'Report for the referring clinician' }));

afterEach(() => vi.restoreAllMocks());

describe('reports of a visit', () => {
  it('are asked for, and say that they are being made', async () => {
    const { api, state, user } = opened([]);
    const part = await section();
    await part.findByText('No report has been made yet.');
    api.on(routes.makeReport, () => {
      state.reports = [aReport({ state: 'asked', pages: null, bytes: null })];
      return aReport({ state: 'asked', pages: null, bytes: null });
    });
    await user.click(part.getByRole('button', { name: 'Make a report' }));
    expect(await part.findByText('Being made')).toBeInTheDocument();
    expect(part.queryByRole('button', { name: 'Make a report' })).toBeNull();
    expect(api.calls(routes.makeReport)[0]?.params).toEqual({ id: visitId });
  });

  it('say in words what comes first', async () => {
    const { api, user } = opened([]);
    const part = await section();
    api.on(routes.makeReport, () => new Refuse('call-first'));
    await user.click(await part.findByRole('button', { name: 'Make a report' }));
    expect(await part.findByRole('alert')).toHaveTextContent('Record your call by eye first.');
  });

  it('are kept as a file once they are ready', async () => {
    const names: string[] = [];
    vi.stubGlobal(
      'URL',
      Object.assign(URL, { createObjectURL: () => 'blob:1', revokeObjectURL: () => undefined }),
    );
    vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (
      this: HTMLAnchorElement,
    ) {
      names.push(this.download);
    });
    const { api, user } = opened([aReport({ number: 2 })]);
    const part = await section();
    api.on(
      routes.reportFile,
      () =>
        new Response('%PDF', {
          headers: { 'content-disposition': 'attachment; filename="2026-03-03-report-2.pdf"' },
        }),
    );
    expect(await part.findByText('Ready: 2 pages, PDF, 48 kB')).toBeInTheDocument();
    await user.click(part.getByRole('button', { name: 'Save: Report 2' }));
    await vi.waitFor(() => expect(names).toEqual(['2026-03-03-report-2.pdf']));
  });

  it('that failed are tried again by who may, and by nobody else', async () => {
    const failed = aReport({ state: 'failed', pages: null, bytes: null });
    const { api, state, user } = opened([failed]);
    const part = await section();
    api.on(routes.makeReportAgain, () => {
      state.reports = [{ ...failed, state: 'asked' }];
      return aReport({ ...failed, state: 'asked' });
    });
    await user.click(await part.findByRole('button', { name: 'Try again: Report 1' }));
    expect(await part.findByText('Being made')).toBeInTheDocument();
  });

  it('are read, not made, by a supervisor', async () => {
    opened([aReport({ state: 'failed', pages: null, bytes: null })], 'supervisor');
    const part = await section();
    expect(await part.findByText('Could not be made')).toBeInTheDocument();
    expect(part.queryByRole('button')).toBeNull();
  });
});
