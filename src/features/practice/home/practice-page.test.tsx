import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const settings = {
  name: 'Greywater Row',
  contact: 'desk@greywater-row.example',
  ownersNeedCode: false,
};
const anAccount = (since: string | null) => ({
  name: 'Wren Alder',
  email: 'owner@greywater-row.example',
  emailChange: null,
  codes: { since, recoveryLeft: since === null ? 0 : 10 },
});
const open = (role: Role, given = settings) => {
  const api = signedInApi(role)
    .on(routes.practice, () => given)
    .on(routes.account, () => anAccount(null));
  return { api, ...renderAt('/practice') };
};
const places = async () => {
  const list = await screen.findByRole('region', { name: 'Settings' });
  return within(list)
    .getAllByRole('link')
    .map((link) => link.getAttribute('href'));
};

describe('the practice', () => {
  it('leads an owner to everything that is set for it', async () => {
    open('owner');
    expect(await places()).toEqual([
      '/practice/people',
      '/practice/consent',
      '/practice/retention',
      '/practice/set-ups',
      '/practice/exercises',
      '/practice/protocol',
      '/practice/reliability',
      '/practice/audit',
    ]);
  });

  it.each(['coach', 'supervisor'] as const)('shows a %s only what they may see', async (role) => {
    open(role);
    expect(await places()).toEqual([
      '/practice/set-ups',
      '/practice/exercises',
      '/practice/protocol',
      '/practice/reliability',
    ]);
    expect(await screen.findByText(settings.contact)).toBeVisible();
    expect(screen.queryByRole('textbox')).toBeNull();
  });

  it('says what is missing where nobody can be reached', async () => {
    open('coach', { ...settings, contact: '' });
    expect(await screen.findByText(/cannot say whom to call/)).toBeVisible();
  });

  it('is named by the owner', async () => {
    const { api, user } = open('owner');
    api.on(routes.changePractice, ({ body }) => ({ ...settings, ...(body as object) }));
    const contact = await screen.findByLabelText(/How athletes reach you/);
    expect(contact).toHaveValue(settings.contact);
    await user.clear(contact);
    await user.type(contact, '01632 960 001');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText(/^Saved\./)).toBeVisible();
    expect(api.calls(routes.changePractice)[0]?.body).toEqual({
      name: settings.name,
      contact: '01632 960 001',
    });
  });

  it('is not saved without a name', async () => {
    const { api, user } = open('owner');
    await user.clear(await screen.findByLabelText('Name'));
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findAllByText('At least 2 characters.')).not.toHaveLength(0);
    expect(api.calls(routes.changePractice)).toEqual([]);
  });

  it('says what failed and tries again', async () => {
    const { api, user } = open('owner');
    api.on(routes.practice, () => new Refuse('unexpected'));
    const again = await screen.findByRole('button', { name: 'Try again' });
    api.on(routes.practice, () => settings);
    await user.click(again);
    expect(await screen.findByLabelText('Name')).toHaveValue(settings.name);
  });
});

describe('one-time codes of owners', () => {
  const withCodes = (role: Role, since: string | null) => {
    const opened = open(role);
    opened.api
      .on(routes.account, () => anAccount(since))
      .on(routes.setOwnersCode, ({ body }) => ({ ...settings, ownersNeedCode: neededIn(body) }));
    return opened;
  };
  const neededIn = (body: unknown) => (body as { needed: boolean }).needed;

  it('are asked for by an owner who has them on, and left to each again', async () => {
    const { api, user } = withCodes('owner', '2026-03-03T16:20:00Z');
    await user.click(await screen.findByRole('button', { name: 'Ask owners for one-time codes' }));
    await user.click(await screen.findByRole('button', { name: 'Let owners choose' }));
    expect(await screen.findByText(/Owners choose for themselves whether/)).toBeVisible();
    expect(api.calls(routes.setOwnersCode).map(({ body }) => body)).toEqual([
      { needed: true },
      { needed: false },
    ]);
  });

  it('begin with one’s own', async () => {
    withCodes('owner', null);
    expect(await screen.findByRole('link', { name: /set them up for your own/ })).toHaveAttribute(
      'href',
      '/account#codes',
    );
    expect(screen.queryByRole('button', { name: /Ask owners/ })).toBeNull();
  });

  it('stay as they are where the server refuses, which is said', async () => {
    const { api, user } = withCodes('owner', '2026-03-03T16:20:00Z');
    api.on(routes.setOwnersCode, () => new Refuse('codes-first'));
    await user.click(await screen.findByRole('button', { name: 'Ask owners for one-time codes' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('your own account first');
  });

  it('are no matter of a coach', async () => {
    withCodes('coach', null);
    await screen.findByText(settings.contact);
    expect(screen.queryByText(/Sign-in of owners/)).toBeNull();
  });
});
