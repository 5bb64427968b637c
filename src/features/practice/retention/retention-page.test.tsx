import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Erasure, GoingAthlete } from '#shared/contracts/retention.ts';
import { routes } from '#shared/contracts/routes.ts';
import { anAthlete, athleteId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = '/practice/retention';
const going: GoingAthlete = {
  athlete: { id: athleteId, name: 'Ines Marlow' },
  why: 'withdrawn',
  on: '2099-02-03',
  visits: 2,
  clips: 3,
  bytes: 1_200_000_000,
};
const erased: Erasure = {
  id: '00000000-0000-4000-8000-000000000960',
  athleteId,
  why: 'asked',
  askedBy: null,
  askedAt: '2026-03-03T16:20:00Z',
  visits: 2,
  clips: 0,
  bytes: 0,
  doneAt: '2026-03-03T16:21:00Z',
};
const ofOwner = (keepMonths: number | null = null, erasures: Erasure[] = []) =>
  signedInApi('owner')
    .on(routes.retention, () => ({ term: { keepMonths, withdrawalDays: 30 }, erasures }))
    .on(routes.previewRetention, () => ({ until: '2100-01-01', items: [going] }));

describe('retention', () => {
  it('shows who goes, when, why and with what, before the term is set', async () => {
    const api = ofOwner(null, [erased]);
    const { user } = renderAt(ADDRESS);
    const what = within(await screen.findByRole('region', { name: 'What goes' }));
    expect(await what.findByText('2 visits, 3 clips (1.2 GB)')).toBeVisible();
    expect(what.getByText(/filming withdrawn/)).toBeVisible();
    expect(what.getByRole('link', { name: /^Export/ })).toHaveAttribute(
      'href',
      `/api/athletes/${athleteId}/export`,
    );
    expect(screen.getByText(/2 visits, no clip; asked for/)).toBeVisible();
    await user.type(screen.getByLabelText(/^Keep an athlete after/), '24');
    await waitFor(() =>
      expect(api.calls(routes.previewRetention).at(-1)?.query.get('keepMonths')).toBe('24'),
    );
    expect(what.getByText('Within a year, if the term above is set.')).toBeVisible();
    api.on(routes.setRetention, () => ({
      term: { keepMonths: 24, withdrawalDays: 30 },
      erasures: [],
    }));
    await user.click(screen.getByRole('button', { name: 'Set the term' }));
    await waitFor(() =>
      expect(api.calls(routes.setRetention)[0]?.body).toEqual({
        keepMonths: 24,
        withdrawalDays: 30,
      }),
    );
  });

  it('erases one person only after their name is typed', async () => {
    const api = ofOwner()
      .on(routes.listAthletes, () => ({
        items: [anAthlete()],
        total: 1,
        page: 1,
        pageSize: 10,
        coaches: [],
      }))
      .on(routes.eraseAthlete, () => ({ ...erased, doneAt: null }));
    const { user } = renderAt(`${ADDRESS}?q=ines`);
    const person = within(await screen.findByRole('region', { name: 'One person' }));
    await user.click(await person.findByRole('button', { name: /^Erase/ }));
    const name = screen.getByLabelText('Type Ines Marlow to erase it');
    await user.type(name, 'ines');
    await user.click(screen.getByRole('button', { name: 'Erase for good' }));
    expect(await screen.findAllByText('Type the name exactly: Ines Marlow')).not.toHaveLength(0);
    expect(api.calls(routes.eraseAthlete)).toHaveLength(0);
    await user.clear(name);
    await user.type(name, 'Ines Marlow');
    await user.click(screen.getByRole('button', { name: 'Erase for good' }));
    await waitFor(() =>
      expect(api.calls(routes.eraseAthlete)[0]).toMatchObject({
        params: { id: athleteId },
        body: { name: 'Ines Marlow' },
      }),
    );
  });

  it('is the owner’s', async () => {
    signedInApi('coach');
    renderAt(ADDRESS);
    expect(await screen.findByText('The owner of the practice sets this')).toBeVisible();
  });
});
