import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { ReviewItem } from '#shared/contracts/reviews.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { clipId, otherId, visitId } from '#tests/support/records.ts';
import { aReliability } from '#tests/support/reliability.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { aWaitingReview } from '#tests/support/review.ts';

const open = (items: readonly ReviewItem[], total = items.length) => {
  const api = signedInApi('supervisor')
    .on(routes.reviewQueue, () => ({ items: [...items], total }))
    .on(routes.reliability, () => aReliability())
    .on(routes.eyeAgreement, () => ({
      items: [
        {
          person: { id: otherId, name: 'Jonas Reed' },
          agreement: { pairs: 13, same: 8, kappa: 0.384, why: null },
          unsaid: 5,
        },
      ],
    }));
  return { api, ...renderAt('/review') };
};

describe('the review page', () => {
  it('lists what waits in the server’s order, each with its clip at the moment and its sign-off', async () => {
    open([
      aWaitingReview({}),
      aWaitingReview({ side: 'left' as const, label: 'Turns in on time', opens: null }),
    ]);
    await screen.findByText(/^Two sides wait for your word, the oldest since/);
    const queue = within(await screen.findByRole('region', { name: 'To review' }));
    const rows = (await queue.findAllByRole('listitem')).map((row) => within(row));
    expect(rows).toHaveLength(2);
    expect(rows[0]?.getByRole('link', { name: /^Open the clip/ })).toHaveAttribute(
      'href',
      `/clips/${clipId}?frame=96&comment=${otherId}`,
    );
    expect(rows[1]?.queryByRole('link', { name: /^Open the clip/ })).toBeNull();
    expect(rows[1]?.getByRole('link', { name: /^Reading and sign-off/ })).toHaveAttribute(
      'href',
      `/visits/${visitId}/sides/left#sign-off`,
    );
  });

  it('says how well each eye agrees, and links to how well hands do', async () => {
    open([]);
    const eyes = within(await screen.findByRole('region', { name: 'How well each eye agrees' }));
    expect(await eyes.findByRole('row', { name: /Jonas Reed.*8 of 13.*5.*0\.38/ })).toBeVisible();
    expect(await screen.findByRole('link', { name: 'All agreement figures' })).toHaveAttribute(
      'href',
      '/practice/reliability',
    );
  });

  it('says what would stand here where nothing waits', async () => {
    open([]);
    expect(await screen.findByText('No side waits for your word')).toBeVisible();
    expect(screen.getByText('Nothing waits for your word.')).toBeVisible();
  });

  it('says how many more there are than it lists', async () => {
    open([aWaitingReview({})], 130);
    expect(await screen.findByText(/129 more follow/)).toBeVisible();
  });

  it('asks again after an error', async () => {
    const { api, user } = open([]);
    api.on(routes.reviewQueue, () => new Refuse('unexpected'));
    const retry = await screen.findByRole('button', { name: 'Try again' });
    api.on(routes.reviewQueue, () => ({ items: [aWaitingReview({})], total: 1 }));
    await user.click(retry);
    expect(await screen.findByText(/^One side waits for your word/)).toBeVisible();
  });
});
