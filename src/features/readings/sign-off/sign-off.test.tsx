import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { SideReview } from '#shared/contracts/reviews.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aClip, anAthlete, aVisit, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { aReviewStep, aSideReview } from '#tests/support/review.ts';
import { aCall, aReading, aSidePage, resultOf } from '#tests/support/side-page.ts';

const REVIEWER = { handIn: false, decide: true };
const HANDED_IN = { state: 'waits' as const, steps: [aReviewStep('handed-in')] };

const open = (review: Partial<SideReview>, measured = true) => {
  let shown = aSideReview(review);
  const reading = aReading(resultOf('g02_early_mid_3rep'));
  const page = measured ? aSidePage(reading) : { ...aSidePage(reading), reading: null };
  const api = signedInApi(shown.may.decide ? 'supervisor' : 'coach')
    .on(routes.sideReading, () => page)
    .on(routes.sideReview, () => shown)
    .on(routes.athlete, () => anAthlete())
    .on(routes.visit, () => ({ visit: aVisit(), clips: [aClip()] }))
    .on(routes.listReps, () => ({ items: [] }))
    .on(routes.listReplays, () => ({ items: [] }))
    .on(routes.handIn, () => {
      shown = { ...shown, ...HANDED_IN };
      return shown;
    })
    .on(routes.decideReview, ({ body }) => {
      const sent = (body as { verdict: string }).verdict === 'send-back';
      const step = sent ? 'sent-back' : 'signed-off';
      const reason = sent ? (body as { reason: string }).reason : '';
      shown = { ...shown, state: step, steps: [aReviewStep(step, { reason }), ...shown.steps] };
      return shown;
    });
  return { api, page, ...renderAt(`/visits/${visitId}/sides/right`) };
};
const panel = async () => within(await screen.findByRole('region', { name: 'Sign-off' }));

describe('the sign-off', () => {
  it('lets a coach hand a reading in, and then waits for the reviewer by name', async () => {
    const { api, user, page } = open({});
    const section = await panel();
    expect(await section.findByText('This reading is not handed in')).toBeVisible();
    expect(section.queryByRole('button', { name: 'Sign off' })).toBeNull();
    await user.click(section.getByRole('button', { name: 'Hand in for review' }));
    expect(await section.findByText('Waiting for Tobias Lindqvist')).toBeVisible();
    expect(section.queryByRole('button', { name: /Hand in/ })).toBeNull();
    expect(api.calls(routes.handIn)[0]?.body).toEqual({
      about: { kind: 'reading', id: page.reading?.id },
    });
  });

  it('lets a reviewer sign off, and says what stays', async () => {
    const { user } = open({ ...HANDED_IN, may: REVIEWER });
    const section = await panel();
    await user.click(await section.findByRole('button', { name: 'Sign off' }));
    expect(
      await section.findByRole('heading', { name: /^Signed off by Tobias Lindqvist/ }),
    ).toBeVisible();
    expect(section.getByText(/stays as it was signed off/)).toBeVisible();
    expect(section.queryByRole('button', { name: 'Sign off' })).toBeNull();
    expect(section.getByRole('button', { name: 'Send back with a reason' })).toBeVisible();
  });

  it('sends back with a reason only, and shows it to the coach', async () => {
    const { api, user } = open({ ...HANDED_IN, may: REVIEWER });
    const section = await panel();
    await user.click(await section.findByRole('button', { name: 'Send back with a reason' }));
    await user.click(section.getByRole('button', { name: 'Send back' }));
    expect(await section.findByLabelText(/What is to be mended/)).toHaveAccessibleDescription(
      /Write something here/,
    );
    expect(api.calls(routes.decideReview)).toHaveLength(0);
    await user.type(section.getByLabelText(/What is to be mended/), 'The knee, past 80°.');
    await user.click(section.getByRole('button', { name: 'Send back' }));
    expect(
      await section.findByRole('heading', { name: 'Sent back by Tobias Lindqvist' }),
    ).toBeVisible();
    expect(section.getByText('“The knee, past 80°.”')).toBeVisible();
  });

  it('is of the latest call where nothing is measured', async () => {
    const { api, user } = open({}, false);
    const section = await panel();
    expect(await section.findByText('This call is not handed in')).toBeVisible();
    await user.click(section.getByRole('button', { name: 'Hand in for review' }));
    expect(api.calls(routes.handIn)[0]?.body).toEqual({
      about: { kind: 'call', id: aCall().id },
    });
  });

  it('says so where something changed meanwhile', async () => {
    const { api, user } = open({ ...HANDED_IN, may: REVIEWER });
    api.on(routes.decideReview, () => new Refuse('edited-meanwhile'));
    const section = await panel();
    await user.click(await section.findByRole('button', { name: 'Sign off' }));
    expect(await section.findByText(/Somebody else changed this meanwhile/)).toBeVisible();
  });

  it('says who could review where nobody can', async () => {
    open({ reviewers: [] });
    expect(await (await panel()).findByText(/Nobody here can sign it off yet/)).toBeVisible();
  });
});
