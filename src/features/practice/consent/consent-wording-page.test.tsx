import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { aWording, aWordingPage } from '#tests/support/consent-wording.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { maren } from '#tests/support/reliability.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = '/practice/consent';
const first = aWording({ consents: 3 });
const second = aWording({
  id: '00000000-0000-4000-8000-000000000811',
  version: 2,
  by: maren,
  note: 'Our learners come from elsewhere.',
  texts: { ...first.texts, teaching: 'Learners of another school look at it.' },
});

describe('the consent wording', () => {
  it('is read by a coach, with every version, who wrote it and what it changed', async () => {
    signedInApi('coach').on(routes.consentWording, () => aWordingPage(second, first));
    renderAt(ADDRESS);
    expect(await screen.findByText(/^Wording 2 of .+, .+\. Each consent names/)).toBeVisible();
    expect(screen.getByText('Learners of another school look at it.')).toBeVisible();
    expect(screen.queryByRole('textbox')).toBeNull();
    const versions = within(screen.getByRole('region', { name: 'Versions' }));
    expect(versions.getByText(/by Maren Okafor/)).toBeVisible();
    expect(
      versions.getByText(/came with the practice\. 3 consents were given to it/),
    ).toBeVisible();
    expect(versions.getByText(/Changed: Use in teaching/)).toBeVisible();
  });

  it('is changed by the owner, who says why', async () => {
    const api = signedInApi('owner').on(routes.consentWording, () => aWordingPage(first));
    api.on(routes.changeConsentWording, () => aWordingPage(second, first));
    const { user } = renderAt(ADDRESS);
    const teaching = await screen.findByLabelText(/^Use in teaching/);
    expect(screen.getByText('Nothing yet. Change a part above.')).toBeVisible();
    await user.clear(teaching);
    await user.type(teaching, 'Learners of another school look at it.');
    await user.click(screen.getByRole('button', { name: 'Make wording 2' }));
    expect(await screen.findAllByText(/At least 3 characters/)).not.toHaveLength(0);
    expect(api.calls(routes.changeConsentWording)).toHaveLength(0);
    await user.type(screen.getByLabelText('Why'), 'Our learners come from elsewhere.');
    await user.click(screen.getByRole('button', { name: 'Make wording 2' }));
    expect(await screen.findByText('Wording 2 is read out from now on.')).toBeVisible();
    expect(api.calls(routes.changeConsentWording)[0]?.body).toEqual({
      after: 1,
      texts: second.texts,
      note: 'Our learners come from elsewhere.',
    });
  });

  it('says why it cannot be shown', async () => {
    signedInApi('coach').on(routes.consentWording, () => new Refuse('unexpected'));
    renderAt(ADDRESS);
    expect(await screen.findByRole('alert')).toHaveTextContent('Something went wrong on our side.');
  });
});
