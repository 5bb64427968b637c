import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Account, SessionRow } from '#shared/contracts/accounts.ts';
import { type WaitingMail, waitingMailKind } from '#shared/contracts/waiting-mail.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const anAccount = (change: Partial<Account> = {}): Account => ({
  name: 'Maren Okafor',
  email: 'coach@greywater-row.example',
  emailChange: null,
  codes: { since: null, recoveryLeft: 0 },
  ...change,
});
const at = '2026-03-03T16:20:00Z';
const HERE = '00000000-0000-4000-8000-000000000801';
const THERE = '00000000-0000-4000-8000-000000000802';
const aSession = (change: Partial<SessionRow> = {}): SessionRow => ({
  id: HERE,
  device: 'Firefox on Linux',
  createdAt: at,
  lastSeenAt: at,
  current: true,
  ...change,
});

const open = (account = anAccount()) => {
  let items = [aSession(), aSession({ id: THERE, device: 'Safari on iPhone', current: false })];
  let letters: WaitingMail = {
    items: waitingMailKind.options.map((kind) => ({ kind, on: kind !== 'comment' })),
  };
  const api = signedInApi()
    .on(routes.account, () => account)
    .on(routes.waitingMail, () => letters)
    .on(routes.setWaitingMail, ({ body }) => {
      const { kind, on } = body as { kind: string; on: boolean };
      letters = {
        items: letters.items.map((each) => (each.kind === kind ? { ...each, on } : each)),
      };
      return letters;
    })
    .on(routes.sessions, () => ({ items }))
    .on(routes.endSession, ({ params }) => {
      items = items.filter(({ id }) => id !== params.id);
      return undefined;
    });
  return { api, ...renderAt('/account') };
};

describe('one’s own account', () => {
  it('changes the password, and says at the form that the present one is wrong', async () => {
    const { api, user } = open();
    let right = false;
    api.on(routes.changePassword, () => (right ? undefined : new Refuse('password-wrong')));
    await user.type(await screen.findByLabelText('Present password'), 'a word');
    await user.type(screen.getByLabelText('New password'), 'reeds at low water');
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('not your present password');
    right = true;
    await user.click(screen.getByRole('button', { name: 'Change the password' }));
    expect(await screen.findByText(/Your new password holds/)).toBeVisible();
    expect(screen.getByLabelText('New password')).toHaveValue('');
  });

  it('turns the letters of each kind on and off by themselves', async () => {
    const { api, user } = open();
    const section = within(await screen.findByRole('region', { name: 'Letters' }));
    const boxes = await section.findAllByRole('checkbox');
    expect(boxes.map((box) => (box as HTMLInputElement).checked)).toEqual([
      true,
      true,
      false,
      true,
      true,
    ]);
    await user.click(section.getByRole('checkbox', { name: 'A side of mine was sent back' }));
    await waitFor(() =>
      expect(
        section.getByRole('checkbox', { name: 'A side of mine was sent back' }),
      ).not.toBeChecked(),
    );
    expect(api.calls(routes.setWaitingMail)[0]?.body).toEqual({ kind: 'sent-back', on: false });
    expect(section.getByRole('checkbox', { name: 'A side waits for my review' })).toBeChecked();
  });

  it('lists where one is signed in, and signs out there', async () => {
    const { api, user } = open();
    const table = await screen.findByRole('table', { name: 'Where you are signed in' });
    const here = within(table).getByRole('row', { name: /Firefox on Linux/ });
    expect(here).toHaveTextContent('this one');
    expect(within(here).queryByRole('button')).toBeNull();
    await user.click(
      within(table).getByRole('button', { name: 'Sign out there: Safari on iPhone' }),
    );
    await user.click(screen.getByRole('button', { name: 'Sign out there' }));
    await waitFor(() => expect(table).not.toHaveTextContent('iPhone'));
    expect(api.calls(routes.endSession)[0]?.params.id).toBe(THERE);
  });

  it('shows which letter of a new address still waits, and gives the change up', async () => {
    const { api, user } = open(
      anAccount({
        emailChange: {
          to: 'new@test.example',
          confirmedFromOld: true,
          confirmedFromNew: false,
          until: at,
        },
      }),
    );
    api.on(routes.dropEmailChange, () => anAccount());
    expect(await screen.findByText('from the address so far: confirmed')).toBeVisible();
    expect(screen.getByText('from the new address: not confirmed yet')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Give it up' }));
    await user.click(screen.getByRole('button', { name: 'Give the change up' }));
    expect(await screen.findByLabelText('New e-mail')).toBeVisible();
  });

  it('that cannot be loaded says so', async () => {
    signedInApi().on(routes.account, () => new Refuse('unexpected'));
    renderAt('/account');
    expect(await screen.findByRole('alert')).toHaveTextContent('went wrong');
  });
});
