import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aClip } from '#tests/support/records.ts';
import { aSecondMarking, aSecondSummary, jonas, secondId } from '#tests/support/reliability.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = `/second-markings/${secondId}`;

describe('a finished second marking', () => {
  it('says in plain words how well one’s own marks repeat', async () => {
    signedInApi().on(routes.secondMarking, () => aSecondMarking());
    renderAt(ADDRESS);
    expect(
      await screen.findByRole('heading', { level: 1, name: 'Two markings compared' }),
    ).toBeVisible();
    expect(
      screen.getByText(
        'Your marks repeat within 1.7 px (2.4 mm); what repeats worst is the inner edge of the support knee, within 2.9 px (4.1 mm).',
      ),
    ).toBeVisible();
    expect(screen.getByText(/“Turns out early” by the first marks/)).toBeVisible();
    const rows = within(screen.getByRole('table')).getAllByRole('row');
    expect(rows).toHaveLength(3);
    expect(rows[2]).toHaveTextContent('—');
    expect(screen.getByText(/One landmark was hidden in one marking/)).toBeVisible();
  });

  it('of another’s marks speaks of two markings', async () => {
    signedInApi().on(routes.secondMarking, () =>
      aSecondMarking({ summary: aSecondSummary({ marker: jonas, mine: false }) }),
    );
    renderAt(ADDRESS);
    expect(await screen.findByText(/^The two markings agree within 1\.7 px/)).toBeVisible();
    expect(
      screen.getByText('First marks by Maren Okafor; second marks by Jonas Reed.'),
    ).toBeVisible();
  });
});

describe('a second marking that cannot be shown', () => {
  it('is closed to others while it is open', async () => {
    signedInApi().on(routes.secondMarking, () => new Refuse('not-allowed'));
    renderAt(ADDRESS);
    expect(await screen.findByRole('alert')).toHaveTextContent('Your role does not include this.');
  });

  it('waits for its clip', async () => {
    signedInApi().on(routes.secondMarking, () =>
      aSecondMarking({
        clip: { ...aClip({ state: 'waiting', copy: null }), frames: null },
        agreement: null,
      }),
    );
    renderAt(ADDRESS);
    expect(await screen.findByText('This clip cannot be shown now')).toBeVisible();
  });
});
