import { screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { guardLeaving } from '#src/api/leaving.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

let release = () => {};
afterEach(() => release());

const openMenu = async () => {
  const api = signedInApi()
    .on(routes.listSetUps, () => ({ items: [] }))
    .on(routes.signOut, () => undefined)
    .on(routes.signOutEverywhere, () => undefined);
  const rendered = renderAt('/practice/set-ups');
  await rendered.user.click(await screen.findByRole('button', { name: /your account/ }));
  return { api, ...rendered };
};

describe('the person menu', () => {
  it('signs out and leads to the sign-in page', async () => {
    const { api, user, place } = await openMenu();
    await user.click(screen.getByRole('button', { name: 'Sign out' }));
    await waitFor(() => expect(place()).toBe('/sign-in'));
    expect(api.calls(routes.signOut)).toHaveLength(1);
  });

  it('signs out on every device', async () => {
    const { api, user, place } = await openMenu();
    await user.click(screen.getByRole('button', { name: 'Sign out on every device' }));
    await waitFor(() => expect(place()).toBe('/sign-in'));
    expect(api.calls(routes.signOutEverywhere)).toHaveLength(1);
  });

  it('asks before it throws unsent work away', async () => {
    const discard = vi.fn();
    release = guardLeaving({
      wouldLose: () => Promise.resolve('Three marks are not sent yet.'),
      discard,
    });
    const { api, user, place } = await openMenu();
    await user.click(screen.getByRole('button', { name: 'Sign out' }));
    const dialog = await screen.findByRole('dialog', { name: 'Something is not sent yet' });
    expect(dialog).toHaveTextContent('Three marks are not sent yet.');
    expect(api.calls(routes.signOut)).toHaveLength(0);
    await user.click(within(dialog).getByRole('button', { name: 'Sign out all the same' }));
    await waitFor(() => expect(place()).toBe('/sign-in'));
    expect(discard).toHaveBeenCalledTimes(1);
  });

  it('closes on Escape and gives the focus back', async () => {
    const { user } = await openMenu();
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('button', { name: 'Sign out' })).toBeNull();
    expect(screen.getByRole('button', { name: /your account/ })).toHaveFocus();
  });
});
