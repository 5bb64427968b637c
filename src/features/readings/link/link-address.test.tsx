import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, it, vi } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { fakeApi, Refuse } from '#tests/support/fake-api.ts';
import { aReplayLink } from '#tests/support/replay-link.ts';
import { LinkAddress } from './link-address.tsx';

const token = 'k'.repeat(43);
const made = (passPhrase = false) => ({
  replay: aReplayLink({ passPhrase }),
  url: `https://redshank.test/r/${token}`,
});

const show = (contactEmail: string | null, passPhrase = false) => {
  const onDone = vi.fn();
  const athlete = { name: 'Wren Alder', contactEmail };
  render(<LinkAddress made={made(passPhrase)} athlete={athlete} onDone={onDone} />);
  return { user: userEvent.setup({ delay: null }), onDone };
};

it('sends the link to the address of the athlete’s page', async () => {
  const api = fakeApi().on(routes.sendReplay, () => undefined);
  const { user } = show('wren@test.example');
  await user.click(screen.getByRole('button', { name: 'Send the link' }));
  expect(await screen.findByText('Sent to wren@test.example.')).toBeVisible();
  expect(api.calls(routes.sendReplay)[0]).toMatchObject({
    params: { id: made().replay.id },
    body: { token, email: 'wren@test.example' },
  });
});

it('asks for an address where none is known, and sends nothing without one', async () => {
  const api = fakeApi().on(routes.sendReplay, () => undefined);
  const { user } = show(null);
  await user.click(screen.getByRole('button', { name: 'Send the link' }));
  expect((await screen.findAllByText(/Write an e-mail address/)).length).toBeGreaterThan(0);
  expect(api.calls(routes.sendReplay)).toHaveLength(0);
  await user.type(screen.getByLabelText(/^Send it by e-mail to/), 'guardian@test.example');
  await user.click(screen.getByRole('button', { name: 'Send the link' }));
  expect(await screen.findByText('Sent to guardian@test.example.')).toBeVisible();
});

it('says what to do when the letter could not be sent', async () => {
  fakeApi().on(routes.sendReplay, () => new Refuse('letter-not-sent'));
  const { user } = show('wren@test.example');
  await user.click(screen.getByRole('button', { name: 'Send the link' }));
  expect(await screen.findByText(/Copy the address instead/)).toBeVisible();
  expect(screen.queryByText(/^Sent to/)).toBeNull();
});

it('prints the code alone, with whose it is and how long it opens', async () => {
  fakeApi();
  const { user, onDone } = show(null, true);
  const code = screen.getByRole('img', { name: 'QR code of the link' });
  const sheet = () => code.closest('[data-print-alone]');
  const print = vi.fn(() => expect(sheet()).not.toBeNull());
  vi.stubGlobal('print', print);
  expect(sheet()).toBeNull();
  await user.click(screen.getByRole('button', { name: 'Print the code' }));
  expect(print).toHaveBeenCalledOnce();
  expect(sheet()).toHaveTextContent(/Wren Alder’s replay.*until 3 April.*pass phrase/);
  window.dispatchEvent(new Event('afterprint'));
  await vi.waitFor(() => expect(sheet()).toBeNull());
  await user.click(screen.getByRole('button', { name: 'Done' }));
  expect(onDone).toHaveBeenCalledOnce();
});
