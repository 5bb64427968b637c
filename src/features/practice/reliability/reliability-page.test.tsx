import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aPair, aReliability, aSecondSummary, jonas, maren } from '#tests/support/reliability.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = '/practice/reliability';
const region = (name: string) => screen.findByRole('region', { name });

describe('the reliability page', () => {
  it('says what to do where nothing is marked twice', async () => {
    signedInApi().on(routes.reliability, () => aReliability());
    renderAt(ADDRESS);
    expect(await screen.findByText('Nothing is marked twice yet')).toBeVisible();
    expect(screen.getByText('3 px, assumed')).toBeVisible();
    expect(screen.getByText('none marked twice yet; 20 are needed')).toBeVisible();
    expect(screen.getByText('No side has the calls of two people yet.')).toBeVisible();
  });

  it('says what failed and tries again', async () => {
    let fails = true;
    signedInApi().on(routes.reliability, () => (fails ? new Refuse('unexpected') : aReliability()));
    const { user } = renderAt(ADDRESS);
    const again = await screen.findByRole('button', { name: 'Try again' });
    fails = false;
    await user.click(again);
    expect(await screen.findByText('Nothing is marked twice yet')).toBeVisible();
  });

  it('gives marks, turn and lift with their figures, and says why one is missing', async () => {
    signedInApi().on(routes.reliability, () =>
      aReliability({
        people: [{ person: maren, px: 1.72, fromFrames: 24, frames: 24 }],
        repeats: [aPair()],
        practice: aPair(),
      }),
    );
    renderAt(ADDRESS);
    const own = within(await region('Maren Okafor'));
    expect(own.getByText('1.7 px (2.4 mm)')).toBeVisible();
    expect(own.getByText(/what repeats worst is the inner edge of the support knee/)).toBeVisible();
    const turn = within(own.getByRole('region', { name: 'Turn: Maren Okafor' }));
    expect(turn.getByText('6 frames measured twice.')).toBeVisible();
    expect(turn.getByText('ICC (2,1)')).toBeVisible();
    expect(turn.getByText(/^bias .+, limits −/)).toBeVisible();
    const lift = within(own.getByRole('region', { name: 'Lift: Maren Okafor' }));
    expect(lift.getByText(/Too few pairs yet/)).toBeVisible();
    expect(lift.queryByText('ICC (2,1)')).toBeNull();
    expect(own.getByText('No readings on both sides yet.')).toBeVisible();
    expect(screen.getByText('1.7 px, own')).toBeVisible();
    // one person is the whole practice
    expect(screen.queryByRole('region', { name: 'All repeats together' })).toBeNull();
  });

  it('shows two people, their calls, and what waits to be marked again', async () => {
    signedInApi('owner').on(routes.reliability, () =>
      aReliability({
        between: [aPair({ second: jonas })],
        waiting: [
          { summary: aSecondSummary({ askedBy: jonas }), athlete: { id: maren.id, name: 'Ines' } },
        ],
        calls: [
          {
            one: maren,
            other: jonas,
            agreement: { pairs: 9, same: 7, kappa: 0.64, why: null },
          },
        ],
      }),
    );
    renderAt(ADDRESS);
    expect(await region('Maren Okafor and Jonas Reed')).toBeVisible();
    expect(screen.getByText('The same in 7 of 9. Beyond chance: kappa 0.64.')).toBeVisible();
    const waiting = within(await region('To mark again'));
    expect(waiting.getByText(/3 of 10 frames done, asked by Jonas Reed/)).toBeVisible();
    expect(waiting.getByRole('link', { name: 'Go on' })).toHaveAttribute(
      'href',
      `/second-markings/${aSecondSummary().id}`,
    );
  });
});
