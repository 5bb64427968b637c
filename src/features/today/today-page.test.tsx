import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { Today } from '#shared/contracts/today.ts';
import { athleteId, noSteps, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const athlete = { id: athleteId, name: 'Ines Marlow' };
const at = '2026-03-03T16:20:00Z';
const full: Today = {
  athletes: 3,
  visitsThisWeek: 1,
  steps: { contact: true, consent: true, clip: true, call: true, athleteId },
  items: [
    {
      kind: 'reading-ready',
      visitId,
      side: 'left',
      label: 'Turns out early',
      signedOff: false,
      athlete,
      at,
    },
    { kind: 'call-missing', visitId, side: 'right', athlete, at },
  ],
};
const open = (today: Today, role: Role = 'coach') => {
  signedInApi(role).on(routes.today, () => today);
  return renderAt('/');
};

describe('Today', () => {
  it('leads an empty practice to its first athlete', async () => {
    open({ items: [], athletes: 0, visitsThisWeek: 0, steps: noSteps });
    const begin = within(await screen.findByRole('region', { name: 'To begin' }));
    const first = begin.getByRole('link', { name: 'Add an athlete' });
    expect(first).toHaveAttribute('href', '/athletes/new');
    expect(screen.getByText('Welcome, Maren. It starts with an athlete.')).toBeVisible();
  });

  it('ticks off what is done and leads to the next step', async () => {
    const steps = { ...noSteps, contact: true, consent: true, athleteId };
    open({ items: [], athletes: 1, visitsThisWeek: 0, steps }, 'owner');
    const begin = within(await screen.findByRole('region', { name: 'To begin' }));
    expect(begin.getAllByText('done', { exact: false })).toHaveLength(4);
    expect(begin.getByText('3 of 5 done')).toBeVisible();
    expect(begin.getByRole('link')).toHaveTextContent('Film and send a clip');
    expect(begin.getByRole('link')).toHaveAttribute('href', `/athletes/${athleteId}/visits/new`);
  });

  it('asks an owner for a way to reach the practice before anything else', async () => {
    open({ ...full, items: [], steps: { ...full.steps, contact: false } }, 'owner');
    const begin = within(await screen.findByRole('region', { name: 'To begin' }));
    expect(begin.getByRole('link')).toHaveAttribute('href', '/practice');
  });

  it('does not send a supervisor to add athletes', async () => {
    open({ items: [], athletes: 0, visitsThisWeek: 0, steps: noSteps }, 'supervisor');
    expect(await screen.findByText('No athlete in your sight yet')).toBeVisible();
    expect(screen.queryByRole('link', { name: /athlete/ })).toBeNull();
  });

  it('says so when nothing waits', async () => {
    open({ ...full, items: [], visitsThisWeek: 2 });
    expect(await screen.findByText('Nothing waits for you, Maren.')).toBeVisible();
    expect(screen.getByText('All done for now')).toBeVisible();
  });

  it('shows what waits, the call first for a coach', async () => {
    open(full);
    expect(await screen.findByText('Two things wait for you, Maren.')).toBeVisible();
    const sections = screen.getAllByRole('region');
    expect(within(sections[0] as HTMLElement).getByRole('link')).toHaveAttribute(
      'href',
      `/visits/${visitId}/sides/right/call`,
    );
  });

  it('shows a supervisor the readings first', async () => {
    open(full, 'supervisor');
    const section = await screen.findByRole('region', { name: 'Readings' });
    expect(screen.getAllByRole('region')[0]).toBe(section);
    expect(within(section).getByText('“Turns out early”')).toBeVisible();
  });
});
