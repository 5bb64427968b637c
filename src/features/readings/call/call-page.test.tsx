import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Call } from '#shared/contracts/calls.ts';
import { routes } from '#shared/contracts/routes.ts';
import { aClip, anAthlete, aVisit, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { aCall, aSidePage } from '#tests/support/side-page.ts';

function callApi(calls: Call[] = []) {
  return signedInApi()
    .on(routes.visit, () => ({ visit: aVisit(), clips: [aClip()] }))
    .on(routes.listCalls, () => ({ items: calls }))
    .on(routes.recordCall, ({ body }) => {
      const made = aCall(body as Partial<Call>);
      calls.push(made);
      return made;
    })
    .on(routes.athlete, () => anAthlete())
    .on(routes.listReps, () => ({ items: [] }))
    .on(routes.listReplays, () => ({ items: [] }))
    .on(routes.sideReading, () => aSidePage(null, { calls }));
}
const address = `/visits/${visitId}/sides/right/call`;

describe('the call by eye', () => {
  it('asks for no figure, starts unanswered and shows the bare clip', async () => {
    const api = callApi();
    renderAt(address);
    expect(await screen.findByText(/figures stay hidden until you save it/)).toBeVisible();
    const seen = await screen.findByRole('radiogroup', { name: /The right hip, the one stood on/ });
    expect(within(seen).queryByRole('radio', { checked: true })).toBeNull();
    expect(await screen.findByText('swings outwards between 60° and level')).toBeVisible();
    expect(screen.getByLabelText('IMG_2291.MOV, nothing drawn on it')).toBeInTheDocument();
    expect(api.calls(routes.sideReading)).toHaveLength(0);
  });

  it('is not saved before it says what was seen and how sure', async () => {
    const api = callApi();
    const { user } = renderAt(address);
    await user.click(await screen.findByRole('button', { name: 'Save the call' }));
    await waitFor(() => expect(screen.getByRole('alert')).toHaveFocus());
    expect(screen.getAllByText(/Choose what you saw; unsure is an answer too\./)).toHaveLength(2);
    expect(api.calls(routes.recordCall)).toHaveLength(0);
  });

  it('is saved as given and leads to the reading', async () => {
    const api = callApi();
    const { user, place } = renderAt(address);
    await user.click(await screen.findByRole('radio', { name: /^Turned out early/ }));
    await user.click(screen.getByRole('radio', { name: 'Fairly sure' }));
    await user.click(screen.getByRole('checkbox', { name: 'Pelvis hikes' }));
    await user.type(screen.getByLabelText(/^What the hands felt/), 'firm at the top');
    await user.click(screen.getByRole('button', { name: 'Save the call' }));
    await waitFor(() => expect(place()).toBe(`/visits/${visitId}/sides/right`));
    expect(api.calls(routes.recordCall)[0]?.body).toEqual({
      seen: 'early',
      confidence: 'fairly-sure',
      substitutions: ['pelvis-hikes'],
      handsFelt: 'firm at the top',
    });
  });

  it('a second one stands beside the first', async () => {
    callApi([aCall()]);
    renderAt(address);
    expect(await screen.findByText(/yours will stand beside it, with its time/)).toBeVisible();
    // it does not say what the first one was
    expect(screen.getByRole('radio', { name: /^Turned out early/ })).not.toBeChecked();
  });
});
