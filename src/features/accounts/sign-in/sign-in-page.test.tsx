import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aMe } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const fill = async (user: ReturnType<typeof renderAt>['user']) => {
  await user.type(await screen.findByLabelText('E-mail'), 'coach@greywater-row.example');
  await user.type(screen.getByLabelText('Password'), 'long enough');
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
};

describe('signing in', () => {
  it('leads from the page asked for to the sign-in and back to that page', async () => {
    let signedIn = false;
    const api = signedInApi()
      .on(routes.me, () => (signedIn ? aMe() : new Refuse('sign-in-needed')))
      .on(routes.listSetUps, () => ({ items: [] }))
      .on(routes.signIn, () => {
        signedIn = true;
        return aMe();
      });
    const { user, place } = renderAt('/practice/set-ups?x=1');
    await waitFor(() => expect(place()).toBe('/sign-in?to=%2Fpractice%2Fset-ups%3Fx%3D1'));
    await fill(user);
    expect(await screen.findByRole('heading', { name: 'Set-ups' })).toBeVisible();
    expect(place()).toBe('/practice/set-ups?x=1');
    expect(api.calls(routes.signIn)[0]?.body).toEqual({
      email: 'coach@greywater-row.example',
      password: 'long enough',
    });
  });

  it('says what is missing before it sends, and puts the focus on it', async () => {
    const api = signedInApi();
    const { user } = renderAt('/sign-in');
    await user.click(await screen.findByRole('button', { name: 'Sign in' }));
    const summary = await screen.findByRole('alert');
    await waitFor(() => expect(summary).toHaveFocus());
    expect(summary).toHaveTextContent('Password: Write your password.');
    expect(screen.getByLabelText('E-mail')).toBeInvalid();
    expect(api.calls(routes.signIn)).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: /^Password:/ }));
    expect(screen.getByLabelText('Password')).toHaveFocus();
  });

  it('says the server’s no and keeps what was typed', async () => {
    signedInApi().on(routes.signIn, () => new Refuse('sign-in-refused'));
    const { user } = renderAt('/sign-in');
    await fill(user);
    expect(await screen.findByRole('alert')).toHaveTextContent('do not belong together');
    expect(screen.getByLabelText('E-mail')).toHaveValue('coach@greywater-row.example');
  });
});
