import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { degrees } from '#shared/geometry/units.ts';
import { FIGURES } from '#shared/protocol/figures.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aProtocol, aProtocolPage } from '#tests/support/protocol.ts';
import { maren } from '#tests/support/reliability.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = '/practice/protocol';
const apiOf = (role: 'owner' | 'coach') =>
  signedInApi(role).on(routes.listSetUps, () => ({ items: [] }));
const second = aProtocol({
  version: 2,
  at: '2026-05-03T09:00:00Z',
  by: maren,
  note: 'Our juniors lift lower.',
  values: { ...STANDARD_PROTOCOL, gateFrom: degrees(55) },
});

describe('the protocol', () => {
  it('is read by a coach: every figure with its value and its source, and no field', async () => {
    apiOf('coach').on(routes.protocol, () => aProtocolPage(second, aProtocol()));
    renderAt(ADDRESS);
    expect(await screen.findByText(/^Protocol 2 of .+, .+\. Each reading names/)).toBeVisible();
    for (const { label } of FIGURES) expect(screen.getAllByText(label).length).toBeGreaterThan(0);
    const gates = within(screen.getByRole('table', { name: 'Gates' }));
    expect(gates.getByText('55°')).toBeVisible();
    expect(gates.getAllByText('(common practice, no source)')).toHaveLength(2);
    expect(screen.getByText('Worked out for 60° to 90° only.', { exact: false })).toBeVisible();
    expect(screen.queryByRole('textbox')).toBeNull();
  });

  it('names each version with who, when, why and what it changed', async () => {
    apiOf('coach').on(routes.protocol, () => aProtocolPage(second, aProtocol()));
    renderAt(ADDRESS);
    const versions = within(await screen.findByRole('region', { name: 'Versions' }));
    expect(versions.getByText(/by Maren Okafor/)).toBeVisible();
    expect(versions.getByText('Our juniors lift lower.')).toBeVisible();
    expect(versions.getByText(/Lower gate: 60° becomes/)).toBeVisible();
    expect(versions.getByText(/came with the practice/)).toBeVisible();
  });

  it('is changed by the owner, who sees in words what changes, and says why', async () => {
    const api = apiOf('owner').on(routes.protocol, () => aProtocolPage());
    api.on(routes.changeProtocol, () => aProtocolPage(second, aProtocol()));
    const { user } = renderAt(ADDRESS);
    const gate = await screen.findByLabelText('Lower gate');
    expect(screen.getByText('Nothing yet. Change a figure above.')).toBeVisible();
    await user.clear(gate);
    await user.type(gate, '55');
    const changes = within(screen.getByRole('region', { name: 'What changes' }));
    expect(changes.getByText(/Lower gate: 60° becomes/)).toBeVisible();
    expect(screen.getByText(/Readings between different gates are not compared/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Make protocol 2' }));
    // the summary has taken the focus before anybody types on
    expect(await screen.findAllByText(/At least 3 characters/)).not.toHaveLength(0);
    expect(api.calls(routes.changeProtocol)).toHaveLength(0);
    await user.type(changes.getByLabelText('Why'), 'Our juniors lift lower.');
    await user.click(screen.getByRole('button', { name: 'Make protocol 2' }));
    expect(await screen.findByText('Protocol 2 holds from now on.')).toBeVisible();
    expect(api.calls(routes.changeProtocol)[0]?.body).toEqual({
      after: 1,
      values: { ...STANDARD_PROTOCOL, gateFrom: 55 },
      note: 'Our juniors lift lower.',
    });
  });

  it('refuses figures out of their bounds at their fields, and sends nothing', async () => {
    const api = apiOf('owner');
    const { user } = renderAt(ADDRESS);
    const early = await screen.findByLabelText('Turns out early');
    await user.clear(early);
    await user.type(early, '80');
    await user.type(screen.getByLabelText('Why'), 'To find more.');
    await user.click(screen.getByRole('button', { name: 'Make protocol 2' }));
    expect(await screen.findAllByText('Choose 90 in 100 to 99 in 100.')).not.toHaveLength(0);
    expect(early).toHaveAttribute('aria-invalid', 'true');
    await user.click(screen.getByRole('button', { name: 'Put everything back' }));
    expect(early).toHaveValue('95');
    expect(api.calls(routes.changeProtocol)).toHaveLength(0);
  });

  it('says what failed and tries again', async () => {
    let fails = true;
    apiOf('coach').on(routes.protocol, () => (fails ? new Refuse('unexpected') : aProtocolPage()));
    const { user } = renderAt(ADDRESS);
    const again = await screen.findByRole('button', { name: 'Try again' });
    fails = false;
    await user.click(again);
    expect(await screen.findByRole('region', { name: 'Versions' })).toBeVisible();
  });
});
