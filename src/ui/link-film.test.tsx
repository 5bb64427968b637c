import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, it, vi } from 'vitest';
import type { KeptFilm } from '#shared/contracts/kept-film.ts';
import { aReplayLink } from '#tests/support/replay-link.ts';
import { LinkFilm } from './link-film.tsx';

const aFilm = (change: Partial<KeptFilm> = {}): KeptFilm => ({
  state: 'ready',
  bytes: 2_400_000,
  madeAt: '2026-03-04T10:00:00Z',
  taken: 0,
  lastTakenAt: null,
  ...change,
});
const show = (film: KeptFilm | null, may = true) => {
  const acts = { onSave: vi.fn(() => Promise.resolve()), onMake: vi.fn(() => Promise.resolve()) };
  const link = aReplayLink({ film });
  const { onSave, onMake } = acts;
  const { container } = render(
    <LinkFilm link={link} onSave={onSave} onMake={may ? onMake : undefined} />,
  );
  return { ...acts, link, container, user: userEvent.setup({ delay: null }) };
};

it('is asked for where there is none', async () => {
  const { user, onMake, link } = show(null);
  await user.click(screen.getByRole('button', { name: 'Make a film to keep' }));
  expect(onMake).toHaveBeenCalledExactlyOnceWith(link);
  expect(screen.queryByRole('button', { name: 'Save the film' })).toBeNull();
});

it('is not spoken of to who may not ask for it, until there is one', () => {
  expect(show(null, false).container).toBeEmptyDOMElement();
});

it.each([
  ['asked', 'The film to keep is being made.'],
  ['head-first', /once the film with the hidden head is there/],
] as const)('says that it comes, and offers nothing meanwhile: %s', (state, words) => {
  show(aFilm({ state, bytes: null, madeAt: null }));
  expect(screen.getByText(words)).toBeVisible();
  expect(screen.queryByRole('button')).toBeNull();
});

it('is saved, made anew, and says how often it was taken', async () => {
  const { user, onSave, onMake, link } = show(
    aFilm({ taken: 2, lastTakenAt: '2026-03-05T10:00:00Z' }),
  );
  expect(screen.getByText(/2\.4 MB: taken twice, last 5 March/)).toBeVisible();
  await user.click(screen.getByRole('button', { name: 'Save the film' }));
  expect(onSave).toHaveBeenCalledExactlyOnceWith(link);
  await user.click(screen.getByRole('button', { name: 'Make it anew' }));
  expect(onMake).toHaveBeenCalledExactlyOnceWith(link);
});

it('may be saved by who may not have it made', () => {
  show(aFilm(), false);
  expect(screen.getByText(/not taken yet/)).toBeVisible();
  expect(screen.getAllByRole('button').map((button) => button.textContent)).toEqual([
    'Save the film',
  ]);
});

it('says what to do where it could not be made, and where asking failed', async () => {
  const { user, onMake } = show(aFilm({ state: 'failed', bytes: null, madeAt: null }));
  expect(screen.getByText(/still plays on the Bench/)).toBeVisible();
  onMake.mockRejectedValueOnce(new Error('away'));
  await user.click(screen.getByRole('button', { name: 'Try again' }));
  expect(await screen.findByRole('alert')).toBeVisible();
});
