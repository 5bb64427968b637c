import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { anAthlete, aSetUp } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

describe('the frame', () => {
  it('names the practice, the place, and a way past the navigation', async () => {
    signedInApi().on(routes.listSetUps, () => ({ items: [aSetUp()] }));
    renderAt('/practice/set-ups');
    expect(await screen.findByText('Room 2, floor mark')).toBeVisible();
    expect(screen.getByText('Greywater Row')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: 'To the page' })).toHaveAttribute('href', '#main');
    const here = screen.getAllByRole('link', { name: 'Practice' });
    expect(here[0]).toHaveAttribute('aria-current', 'page');
  });

  it('says when there is nothing at an address, and where to go', async () => {
    signedInApi();
    renderAt('/nowhere');
    expect(await screen.findByRole('heading', { name: 'Nothing here' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Go to Today' })).toHaveAttribute('href', '/');
  });

  it('puts the focus at the heading of the page one comes to', async () => {
    signedInApi();
    const { user } = renderAt('/practice/audit');
    await user.click((await screen.findAllByRole('link', { name: 'Method' }))[0] as HTMLElement);
    const heading = await screen.findByRole('heading', { level: 1, name: 'Method' });
    await waitFor(() => expect(heading).toHaveFocus());
  });

  it('shows what went wrong with its number, and tries again', async () => {
    let down = true;
    signedInApi().on(routes.listSetUps, () =>
      down ? new Refuse('unexpected') : { items: [aSetUp()] },
    );
    const { user } = renderAt('/practice/set-ups');
    const alert = await screen.findByRole('alert');
    expect(alert).toHaveTextContent('req-1');
    down = false;
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Room 2, floor mark')).toBeVisible();
  });

  it('keeps the focus at the heading when the page replaces it after loading', async () => {
    signedInApi()
      .on(routes.listAthletes, () => ({
        items: [anAthlete()],
        total: 1,
        page: 1,
        pageSize: 25,
        coaches: [],
      }))
      .on(routes.athlete, () => anAthlete())
      .on(routes.listVisits, () => ({ items: [] }))
      .on(routes.listReplays, () => ({ items: [] }))
      .on(routes.listConsents, () => ({ items: [] }));
    const { user } = renderAt('/athletes');
    await user.click(await screen.findByRole('link', { name: 'Ines Marlow' }));
    const heading = await screen.findByRole('heading', { level: 1, name: 'Ines Marlow' });
    await waitFor(() => expect(heading).toHaveFocus());
  });
});
