import { screen, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import type { AuditEntry, AuditPage } from '#shared/contracts/audit.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { athleteId, clipId, coachId, otherId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const ADDRESS = '/practice/audit';
let count = 0;
const entry = (change: Partial<AuditEntry>): AuditEntry => {
  count += 1;
  return {
    id: `00000000-0000-4000-8000-${String(count).padStart(12, '0')}`,
    at: '2026-03-03T16:20:00Z',
    actor: 'user',
    by: { id: coachId, name: 'Maren Okafor' },
    role: 'coach',
    action: 'clip.open',
    athlete: { id: athleteId, name: 'Ines Marlow' },
    subject: { kind: 'clip', id: clipId, name: 'knee-lift.mp4' },
    detail: null,
    network: '203.0.113.0/24',
    requestId: 'abc',
    ...change,
  };
};
const FULL = [
  entry({}),
  entry({
    action: 'athlete.edit',
    athlete: { id: otherId, name: null },
    subject: { kind: 'athlete', id: otherId, name: null },
    detail: { fields: 'familyName sport' },
  }),
  entry({ action: 'replay.open', actor: 'link', by: null, role: null }),
];
const pageOf = (items: AuditEntry[], total = items.length): AuditPage => ({
  ...{ items, total, page: 1, pageSize: 50 },
});
const open = (answer: () => AuditPage | Refuse, search = '') => {
  const api = signedInApi('owner')
    .on(routes.audit, answer)
    .on(routes.auditNames, () => ({
      people: [{ id: coachId, name: 'Maren Okafor' }],
      athletes: [
        { id: athleteId, name: 'Ines Marlow' },
        { id: otherId, name: null },
      ],
    }));
  return { api, ...renderAt(ADDRESS + search) };
};

describe('the audit trail', () => {
  it('says who did what to whom, from which network, and leads there', async () => {
    open(() => pageOf(FULL));
    const [, looked, edited, opened] = await screen.findAllByRole('row');
    const first = within(looked as HTMLElement);
    expect(first.getByText('Looked at a clip')).toBeVisible();
    expect(first.getByRole('link', { name: 'knee-lift.mp4' })).toHaveAttribute(
      'href',
      `/clips/${clipId}`,
    );
    expect(first.getByRole('link', { name: 'Ines Marlow' })).toHaveAttribute(
      'href',
      `/athletes/${athleteId}`,
    );
    expect(first.getByText('203.0.113.0/24')).toBeVisible();
    expect(within(edited as HTMLElement).getByText('family name, sport')).toBeVisible();
    expect(within(edited as HTMLElement).getByText('no longer here')).toBeVisible();
    expect(within(opened as HTMLElement).getByText('Whoever has the link')).toBeVisible();
  });

  it('is narrowed in the address, and asked anew', async () => {
    const { api, user, place } = open(() => pageOf(FULL), '?page=2');
    await user.selectOptions(await screen.findByLabelText('What'), 'Looked at a clip');
    await screen.findByRole('option', { name: 'Maren Okafor' });
    await user.selectOptions(screen.getByLabelText('Who'), 'Maren Okafor');
    expect(place()).toBe(`${ADDRESS}?action=clip.open&person=${coachId}`);
    await vi.waitFor(() => {
      const last = api.calls(routes.audit).at(-1)?.query;
      expect(Object.fromEntries(last ?? [])).toEqual({
        ...{ action: 'clip.open', person: coachId, pageSize: '50' },
      });
    });
  });

  it('has pages', async () => {
    open(() => pageOf(FULL, 120));
    expect(await screen.findByRole('link', { name: 'Next' })).toHaveAttribute(
      'href',
      `${ADDRESS}?page=2`,
    );
    expect(screen.getByText('120 entries')).toBeVisible();
  });

  it('says what to do where nothing is or nothing fits', async () => {
    open(() => pageOf([]));
    expect(await screen.findByText('Nothing yet')).toBeVisible();
  });

  it('leads back from a filter that finds nothing', async () => {
    open(() => pageOf([]), '?from=2026-01-01');
    expect(await screen.findByRole('link', { name: 'Show the whole trail' })).toHaveAttribute(
      'href',
      ADDRESS,
    );
  });

  it('says why a file is not made', async () => {
    const { api, user } = open(() => pageOf(FULL));
    api.on(routes.auditFile, () => new Refuse('invalid-input', { detail: 'Choose fewer days.' }));
    await user.click(await screen.findByRole('button', { name: 'Save these entries (CSV)' }));
    expect(await screen.findByText('Choose fewer days.')).toBeVisible();
  });

  it('says what failed and tries again', async () => {
    let fails = true;
    const { user } = open(() => (fails ? new Refuse('unexpected') : pageOf(FULL)));
    const again = await screen.findByRole('button', { name: 'Try again' });
    fails = false;
    await user.click(again);
    expect(await screen.findAllByRole('row')).toHaveLength(4);
  });

  it('is the owner’s: a coach’s page asks for nothing', async () => {
    const api = signedInApi('coach');
    renderAt(ADDRESS);
    expect(await screen.findByText('The owner reads this')).toBeVisible();
    expect(api.calls(routes.audit)).toEqual([]);
  });
});
