import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import type { Today } from '#shared/contracts/today.ts';
import { athleteId, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const athlete = { id: athleteId, name: 'Ines Marlow' };
const at = '2026-03-03T16:20:00Z';
const full: Today = {
  athletes: 3,
  visitsThisWeek: 1,
  items: [
    { kind: 'reading-ready', visitId, side: 'left', label: 'Turns out early', athlete, at },
    { kind: 'call-missing', visitId, side: 'right', athlete, at },
  ],
};
const open = (today: Today, role: 'coach' | 'supervisor' = 'coach') => {
  signedInApi(role).on(routes.today, () => today);
  return renderAt('/');
};

describe('Today', () => {
  it('leads an empty practice to its first athlete', async () => {
    open({ items: [], athletes: 0, visitsThisWeek: 0 });
    const first = await screen.findByRole('link', { name: 'Add the first athlete' });
    expect(first).toHaveAttribute('href', '/athletes/new');
    expect(screen.getByText('Welcome, Maren. It starts with an athlete.')).toBeVisible();
  });

  it('says so when nothing waits', async () => {
    open({ items: [], athletes: 3, visitsThisWeek: 2 });
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
