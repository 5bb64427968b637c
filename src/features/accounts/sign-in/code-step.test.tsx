import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aMe } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

/** Right password, codes on: the page that asks for the code. */
const half = async () => {
  const api = signedInApi()
    .on(routes.signIn, () => ({ codeNeeded: true as const }))
    .on(routes.listSetUps, () => ({ items: [] }));
  const at = renderAt('/sign-in?to=/practice/set-ups');
  const { user } = at;
  const first = async () => {
    await user.type(await screen.findByLabelText('E-mail'), 'coach@greywater-row.example');
    await user.type(screen.getByLabelText('Password'), 'long enough');
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
  };
  await first();
  const code = await screen.findByLabelText('Code');
  const send = async (text: string) => {
    await user.type(screen.getByRole('textbox'), text);
    await user.click(screen.getByRole('button', { name: 'Sign in' }));
  };
  return { api, ...at, first, code, send };
};

describe('the second step of a sign-in', () => {
  it('asks for the code of the phone, and leads to where one wanted to be', async () => {
    const { api, place, code, send } = await half();
    api.on(routes.signInCode, () => aMe());
    await waitFor(() => expect(code).toHaveFocus());
    expect(code).toHaveAttribute('autocomplete', 'one-time-code');
    expect(code).toHaveAttribute('inputmode', 'numeric');
    await send('123 456');
    expect(await screen.findByRole('heading', { name: 'Set-ups' })).toBeVisible();
    expect(place()).toBe('/practice/set-ups');
    expect(api.calls(routes.signInCode)[0]?.body).toEqual({ code: '123 456' });
  });

  it('takes a recovery code in its place', async () => {
    const { api, user, send } = await half();
    api.on(routes.signInCode, () => aMe());
    await user.click(screen.getByRole('button', { name: /Use a recovery code/ }));
    const field = await screen.findByLabelText('Recovery code');
    await waitFor(() => expect(field).toHaveFocus());
    expect(screen.getByRole('heading', { name: 'Recovery code' })).toBeVisible();
    await send('abcd-efgh-ijkl-mnop');
    expect(await screen.findByRole('heading', { name: 'Set-ups' })).toBeVisible();
    expect(api.calls(routes.signInCode)[0]?.body).toEqual({ code: 'abcd-efgh-ijkl-mnop' });
  });

  it('says that a code does not fit, and stays', async () => {
    const { api, send } = await half();
    api.on(routes.signInCode, () => new Refuse('code-wrong'));
    await send('000000');
    expect(await screen.findByRole('alert')).toHaveTextContent('This code does not fit');
    expect(screen.getByLabelText('Code')).toHaveValue('000000');
  });

  it('begins anew where it took too long, and says so until one is past it', async () => {
    const { api, first, send, user } = await half();
    api.on(routes.signInCode, () => new Refuse('half-gone'));
    await send('123456');
    expect(await screen.findByRole('heading', { name: 'Sign in' })).toBeVisible();
    expect(screen.getByRole('alert')).toHaveTextContent('Start the sign-in again');
    await first();
    await user.click(await screen.findByRole('button', { name: 'Start again' }));
    expect(await screen.findByLabelText('E-mail')).toBeVisible();
    expect(screen.queryByRole('alert')).toBeNull();
  });
});
