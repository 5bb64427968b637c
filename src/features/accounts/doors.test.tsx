import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { MailLinkLook } from '#shared/contracts/mail-links.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aMe, noSteps } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const look = (change: Partial<MailLinkLook> = {}): MailLinkLook => ({
  kind: 'invitation',
  email: 'wren@test.example',
  practiceName: 'Greywater Row',
  personName: '',
  role: 'coach',
  newEmail: null,
  ...change,
});

describe('a forgotten password', () => {
  it('is asked for from the sign-in page, and says the same whoever asks', async () => {
    const api = signedInApi().on(routes.forgot, () => undefined);
    const { user, place } = renderAt('/sign-in');
    await user.click(await screen.findByRole('link', { name: 'Forgotten password' }));
    await screen.findByRole('heading', { name: 'Forgotten password' });
    expect(place()).toBe('/forgot');
    await user.type(await screen.findByLabelText('E-mail'), 'Wren@Test.Example');
    await user.click(screen.getByRole('button', { name: 'Send the letter' }));
    expect(await screen.findByRole('heading', { name: 'Look into your mail' })).toHaveFocus();
    expect(screen.getByText('wren@test.example')).toBeVisible();
    expect(api.calls(routes.forgot)[0]?.body).toEqual({ email: 'wren@test.example' });
  });

  it('is set anew by the link, which leads to the sign-in', async () => {
    const api = signedInApi()
      .on(routes.lookAtMailLink, () => look({ kind: 'reset' }))
      .on(routes.resetPassword, () => undefined);
    const { user, place } = renderAt('/reset/a-token');
    await user.type(await screen.findByLabelText('New password'), 'too short');
    await user.click(screen.getByRole('button', { name: 'Set the password' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('At least 12 characters');
    await user.type(screen.getByLabelText('New password'), ' no longer');
    await user.click(screen.getByRole('button', { name: 'Set the password' }));
    await waitFor(() => expect(place()).toBe('/sign-in'));
    expect(api.calls(routes.resetPassword)[0]?.body).toEqual({
      token: 'a-token',
      password: 'too short no longer',
    });
  });
});

describe('a link that opens nothing', () => {
  it.each(['/reset/a-token', '/join/a-token'])(
    'says so before anything is typed: %s',
    async (at) => {
      signedInApi().on(routes.lookAtMailLink, () => new Refuse('link-gone'));
      renderAt(at);
      expect(await screen.findByRole('heading', { name: 'This link opens nothing' })).toBeVisible();
      expect(screen.queryByRole('textbox')).toBeNull();
    },
  );

  it('is one of another purpose too', async () => {
    signedInApi().on(routes.lookAtMailLink, () => look({ kind: 'reset' }));
    renderAt('/join/a-token');
    expect(await screen.findByRole('heading', { name: 'This link opens nothing' })).toBeVisible();
  });
});

describe('joining', () => {
  it('says where to and as what, makes the account and leads to Today', async () => {
    const api = signedInApi()
      .on(routes.lookAtMailLink, () => look())
      .on(routes.today, () => ({ items: [], athletes: 0, visitsThisWeek: 0, steps: noSteps }))
      .on(routes.join, () => aMe());
    const { user, place } = renderAt('/join/a-token');
    expect(await screen.findByRole('heading', { name: 'Join Greywater Row' })).toBeVisible();
    expect(screen.getByText(/You will be a coach/)).toHaveTextContent('wren@test.example');
    await user.type(screen.getByLabelText('Your name'), 'Wren Alder');
    await user.type(screen.getByLabelText('Password'), 'reeds at low water');
    await user.click(screen.getByRole('button', { name: 'Join the practice' }));
    await waitFor(() => expect(place()).toBe('/'));
    expect(api.calls(routes.join)[0]?.body).toEqual({
      token: 'a-token',
      name: 'Wren Alder',
      password: 'reeds at low water',
    });
  });

  it('of a new practice begins with a letter', async () => {
    const api = signedInApi().on(routes.startPractice, () => undefined);
    const { user } = renderAt('/start');
    await user.type(await screen.findByLabelText('Name of the practice'), 'Saltmarsh Lane');
    await user.type(screen.getByLabelText('Your name'), 'Wren Alder');
    await user.type(screen.getByLabelText('Your e-mail'), 'wren@test.example');
    await user.click(screen.getByRole('button', { name: 'Send the letter' }));
    expect(await screen.findByRole('heading', { name: 'Look into your mail' })).toBeVisible();
    expect(api.calls(routes.startPractice)).toHaveLength(1);
  });
});
