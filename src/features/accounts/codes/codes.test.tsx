import { screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Account, Me } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aMe, noSteps } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const SECRET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567';
const secret = { secret: SECRET, uri: `otpauth://totp/Redshank?secret=${SECRET}` };
const recoveryCodes = ['abcd-efgh-ijkl-mnop', 'qrst-uvwx-yz23-4567'];
const on = { since: '2026-03-03T16:20:00Z', recoveryLeft: 9 };

const open = (codes: Account['codes'] = { since: null, recoveryLeft: 0 }) => {
  let account: Account = {
    name: 'Maren Okafor',
    email: 'coach@greywater-row.example',
    emailChange: null,
    codes,
  };
  const api = signedInApi()
    .on(routes.account, () => account)
    .on(routes.sessions, () => ({ items: [] }))
    .on(routes.startCodes, () => secret)
    .on(routes.confirmCodes, () => {
      account = { ...account, codes: on };
      return { recoveryCodes };
    })
    .on(routes.renewRecoveryCodes, () => ({ recoveryCodes }))
    .on(routes.stopCodes, () => {
      account = { ...account, codes: { since: null, recoveryLeft: 0 } };
      return undefined;
    });
  return { api, ...renderAt('/account') };
};

const section = () => within(screen.getByRole('region', { name: 'One-time codes' }));
afterEach(() => vi.restoreAllMocks());

describe('setting up one-time codes', () => {
  it('goes by password, the phone’s first code and the recovery codes', async () => {
    const { api, user } = open();
    await user.click(await screen.findByRole('button', { name: 'Set up one-time codes' }));
    await user.type(section().getByLabelText('Your password'), 'reeds at low water');
    await user.click(section().getByRole('button', { name: 'Go on' }));
    expect(await screen.findByRole('heading', { name: 'On your phone' })).toHaveFocus();
    expect(screen.getByRole('img', { name: /QR code/ })).toBeVisible();
    expect(screen.getByText('ABCD EFGH IJKL MNOP QRST UVWX YZ23 4567')).toBeVisible();
    expect(screen.getByRole('link', { name: 'Open the app' })).toHaveAttribute('href', secret.uri);
    await user.type(section().getByLabelText('The code that the app shows'), '123456');
    await user.click(section().getByRole('button', { name: 'Turn on one-time codes' }));
    expect(await screen.findByRole('heading', { name: 'Your recovery codes' })).toHaveFocus();
    for (const code of recoveryCodes) expect(screen.getByText(code)).toBeVisible();
    expect(api.calls(routes.startCodes)[0]?.body).toEqual({ password: 'reeds at low water' });
    expect(api.calls(routes.confirmCodes)[0]?.body).toEqual({ code: '123456' });
    await user.click(screen.getByRole('button', { name: 'I have kept them' }));
    expect(await screen.findByText(/On since 3 Mar/)).toHaveTextContent('Unused recovery codes: 9');
    expect(screen.queryByText(recoveryCodes[0] ?? '')).toBeNull();
  });

  it('says that a code does not fit, keeps the picture, and can be left', async () => {
    const { api, user } = open();
    api.on(routes.confirmCodes, () => new Refuse('code-wrong'));
    await user.click(await screen.findByRole('button', { name: 'Set up one-time codes' }));
    await user.type(section().getByLabelText('Your password'), 'x');
    await user.click(section().getByRole('button', { name: 'Go on' }));
    await user.type(await screen.findByLabelText('The code that the app shows'), '000000');
    await user.click(section().getByRole('button', { name: 'Turn on one-time codes' }));
    expect(await section().findByRole('alert')).toHaveTextContent('does not fit');
    expect(screen.getByRole('img', { name: /QR code/ })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Not now' }));
    expect(screen.getByRole('button', { name: 'Set up one-time codes' })).toBeVisible();
  });
});

describe('recovery codes', () => {
  it('are made anew, copied and printed', async () => {
    const { api, user } = open({ ...on, recoveryLeft: 1 });
    const print = vi.spyOn(window, 'print').mockImplementation(() => undefined);
    expect(await screen.findByText(/Few recovery codes are left/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Make new recovery codes' }));
    const dialog = within(screen.getByRole('dialog'));
    await user.type(dialog.getByLabelText('Your password'), 'x');
    await user.type(dialog.getByLabelText('Code'), '123456');
    await user.click(dialog.getByRole('button', { name: 'Make new ones' }));
    await screen.findByRole('heading', { name: 'Your recovery codes' });
    expect(api.calls(routes.renewRecoveryCodes)[0]?.body).toEqual({
      password: 'x',
      code: '123456',
    });
    await user.click(screen.getByRole('button', { name: 'Copy' }));
    expect(await navigator.clipboard.readText()).toBe(`${recoveryCodes.join('\n')}\n`);
    await user.click(screen.getByRole('button', { name: 'Print' }));
    expect(print).toHaveBeenCalledOnce();
  });

  it('are copied by hand where the browser does not let the page', async () => {
    const { user } = open(on);
    await user.click(await screen.findByRole('button', { name: 'Make new recovery codes' }));
    const dialog = within(screen.getByRole('dialog'));
    await user.type(dialog.getByLabelText('Your password'), 'x');
    await user.type(dialog.getByLabelText('Code'), '123456');
    await user.click(dialog.getByRole('button', { name: 'Make new ones' }));
    vi.spyOn(navigator.clipboard, 'writeText').mockRejectedValue(new Error('no'));
    await user.click(await screen.findByRole('button', { name: 'Copy' }));
    expect(await screen.findByText(/Mark and copy them/)).toBeVisible();
  });
});

describe('turning codes off', () => {
  it('asks for password and code, and says the server’s no in place', async () => {
    const { api, user } = open(on);
    let refused = true;
    const stop = routes.stopCodes;
    await user.click(await screen.findByRole('button', { name: 'Turn off one-time codes' }));
    const dialog = within(screen.getByRole('dialog'));
    api.on(stop, () => (refused ? new Refuse('codes-needed') : undefined));
    await user.click(dialog.getByRole('button', { name: 'Turn them off' }));
    expect(await dialog.findByRole('alert')).toHaveTextContent('Write your present password.');
    await user.type(dialog.getByLabelText('Your password'), 'x');
    await user.type(dialog.getByLabelText('Code'), '123456');
    await user.click(dialog.getByRole('button', { name: 'Turn them off' }));
    expect(await dialog.findByText(/Your practice asks its owners/)).toBeVisible();
    refused = false;
    await user.click(dialog.getByRole('button', { name: 'Turn them off' }));
    expect(await screen.findByText(/One-time codes are off\./)).toBeVisible();
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  });
});

describe('an owner whose practice asks for codes', () => {
  const openMissing = () => {
    let me: Me = { ...aMe('owner'), codeMissing: true };
    const api = signedInApi('owner')
      .on(routes.me, () => me)
      .on(routes.today, () => ({ items: [], athletes: 0, visitsThisWeek: 0, steps: noSteps }))
      .on(routes.startCodes, () => secret)
      .on(routes.confirmCodes, () => {
        me = aMe('owner');
        return { recoveryCodes };
      });
    return { api, ...renderAt('/') };
  };

  it('sets them up before anything else is asked for, and sees the recovery codes', async () => {
    const { api, user } = openMissing();
    await screen.findByRole('heading', { level: 1, name: 'Set up one-time codes' });
    expect(screen.queryByRole('navigation')).toBeNull();
    expect(api.asked.map(({ route }) => route.path)).toEqual(['/api/me']);
    await user.type(screen.getByLabelText('Your password'), 'x');
    await user.click(screen.getByRole('button', { name: 'Go on' }));
    await user.type(await screen.findByLabelText('The code that the app shows'), '123456');
    await user.click(screen.getByRole('button', { name: 'Turn on one-time codes' }));
    expect(await screen.findByText(recoveryCodes[1] ?? '')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'I have kept them' }));
    expect((await screen.findAllByRole('navigation', { name: 'Main' }))[0]).toBeInTheDocument();
    expect(screen.queryByText(recoveryCodes[1] ?? '')).toBeNull();
  });

  it('can leave instead', async () => {
    const { api, user, place } = openMissing();
    api.on(routes.signOut, () => undefined);
    await user.click(await screen.findByRole('button', { name: 'Sign out' }));
    await waitFor(() => expect(place()).toBe('/sign-in'));
  });

  it('is led there in the middle of the work, once the practice begins to ask', async () => {
    let missing = false;
    signedInApi('owner')
      .on(routes.me, () => ({ ...aMe('owner'), codeMissing: missing }))
      .on(routes.listSetUps, () => {
        missing = true;
        return new Refuse('codes-needed');
      });
    renderAt('/practice/set-ups');
    expect(
      await screen.findByRole('heading', { level: 1, name: 'Set up one-time codes' }),
    ).toBeVisible();
  });
});
