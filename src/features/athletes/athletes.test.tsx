import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import {
  aConsent,
  anAthlete,
  athleteId,
  aVisitRow,
  coachId,
  otherId,
  visitId,
} from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';

const page = (total: number, items = [anAthlete()]) => ({
  items,
  total,
  page: 1,
  pageSize: 25,
  coaches: [],
});
/** The athlete's page with its parts; consents and visits empty unless given. */
const athleteApi = (athlete = anAthlete(), role: Role = 'coach') =>
  signedInApi(role)
    .on(routes.listReplays, () => ({ items: [] }))
    .on(routes.athlete, () => athlete)
    .on(routes.listConsents, () => ({ items: [] }))
    .on(routes.listVisits, () => ({ items: [] }));

describe('the list of athletes', () => {
  it('keeps search, filter and page in the address', async () => {
    const api = signedInApi().on(routes.listAthletes, () => page(57));
    const { user, place } = renderAt('/athletes');
    await user.type(await screen.findByLabelText('Name or sport'), 'ines');
    await waitFor(() => expect(place()).toBe('/athletes?q=ines'));
    await user.selectOptions(screen.getByLabelText('Consent'), 'none');
    await user.click(await screen.findByRole('link', { name: 'Next' }));
    await waitFor(() => expect(place()).toBe('/athletes?q=ines&consent=none&page=2'));
    await waitFor(() =>
      expect(Object.fromEntries(api.calls(routes.listAthletes).at(-1)?.query ?? [])).toEqual({
        q: 'ines',
        consent: 'none',
        page: '2',
      }),
    );
    expect(screen.getByLabelText('Name or sport')).toHaveValue('ines');
  });

  it('lets an owner choose a coach', async () => {
    const coaches = [
      { id: coachId, name: 'Maren Okafor' },
      { id: otherId, name: 'Jonas Reed' },
    ];
    const api = signedInApi('owner').on(routes.listAthletes, () => ({ ...page(3), coaches }));
    const { user, place } = renderAt('/athletes');
    await screen.findByRole('option', { name: 'Jonas Reed' });
    await user.selectOptions(screen.getByLabelText('Coach'), 'Jonas Reed');
    await waitFor(() => expect(place()).toBe(`/athletes?coach=${otherId}`));
    await waitFor(() =>
      expect(api.calls(routes.listAthletes).at(-1)?.query.get('coach')).toBe(otherId),
    );
  });

  it('tells an empty practice from a search without a hit', async () => {
    signedInApi().on(routes.listAthletes, ({ query }) => page(0, query.has('q') ? [] : []));
    const { router } = renderAt('/athletes');
    expect(await screen.findByText('No athletes yet')).toBeVisible();
    await router.navigate('/athletes?q=nobody');
    expect(await screen.findByText('Nobody fits')).toBeVisible();
  });
});

describe('adding an athlete', () => {
  it('sends millimetres and null for what is not known, then leads to the athlete', async () => {
    const api = athleteApi().on(routes.addAthlete, () => anAthlete());
    const { user, place } = renderAt('/athletes/new');
    await user.type(await screen.findByLabelText('Given name'), 'Ines');
    await user.type(screen.getByLabelText('Family name'), 'Marlow');
    await user.type(screen.getByLabelText('Date of birth'), '2004-05-02');
    await user.type(screen.getByLabelText(/^Body height/), '174,5');
    await user.click(screen.getByRole('button', { name: 'Add' }));
    await waitFor(() => expect(place()).toBe(`/athletes/${athleteId}`));
    expect(api.calls(routes.addAthlete)[0]?.body).toEqual({
      givenName: 'Ines',
      familyName: 'Marlow',
      birthDate: '2004-05-02',
      heightMm: 1745,
      sport: '',
      cautions: '',
      contactEmail: null,
    });
  });

  it('shows a fault of the server at its field, in the field’s own unit', async () => {
    athleteApi().on(
      routes.addAthlete,
      () =>
        new Refuse('invalid-input', {
          faults: [{ path: 'body.heightMm', message: 'At most 2400 mm.' }],
        }),
    );
    const { user } = renderAt('/athletes/new');
    await user.type(await screen.findByLabelText('Given name'), 'Ines');
    await user.type(screen.getByLabelText('Family name'), 'Marlow');
    await user.type(screen.getByLabelText('Date of birth'), '2004-05-02');
    await user.click(screen.getByRole('button', { name: 'Add' }));
    const height = await screen.findByLabelText(/^Body height/);
    await waitFor(() => expect(height).toBeInvalid());
    expect(height).toHaveAccessibleDescription(/At most 240 cm\./);
  });
});

describe('changing an athlete', () => {
  it('never writes over a newer version, and offers to load it', async () => {
    let stored = anAthlete({ version: 1 });
    const api = athleteApi()
      .on(routes.athlete, () => stored)
      .on(routes.editAthlete, ({ body }) =>
        (body as { version: number }).version === stored.version
          ? stored
          : new Refuse('edited-meanwhile'),
      );
    const { user, place } = renderAt(`/athletes/${athleteId}/edit`);
    const sport = await screen.findByLabelText(/^Sport/);
    stored = anAthlete({ version: 2, sport: 'sprint' });
    await user.clear(sport);
    await user.type(sport, 'long jump');
    await user.click(screen.getByRole('button', { name: 'Save' }));
    await user.click(await screen.findByRole('button', { name: 'Load the newer version' }));
    await waitFor(() => expect(screen.getByLabelText(/^Sport/)).toHaveValue('sprint'));
    await user.click(screen.getByRole('button', { name: 'Save' }));
    await waitFor(() => expect(place()).toBe(`/athletes/${athleteId}`));
    expect(
      api.calls(routes.editAthlete).map(({ body }) => (body as { version: number }).version),
    ).toEqual([1, 2]);
  });
});

describe('consent', () => {
  it('takes a minor’s only from a named guardian, with nothing ticked beforehand', async () => {
    const api = athleteApi(anAthlete({ minor: true, consentedTo: [], consentUntil: null })).on(
      routes.recordConsent,
      () => aConsent(),
    );
    const { user, place } = renderAt(`/athletes/${athleteId}/consents/new?then=visit`);
    const save = await screen.findByRole('button', { name: 'Record the consent' });
    expect(screen.queryByRole('checkbox', { checked: true })).toBeNull();
    await user.click(save);
    // the fault is the group's: no single purpose is named for it
    const summary = within(await screen.findByRole('alert'));
    expect(summary.getByRole('button', { name: 'Choose at least one purpose.' })).toBeVisible();
    await user.click(screen.getByRole('checkbox', { name: /^Filming and marking/ }));
    await user.click(save);
    expect(await screen.findByRole('alert')).toHaveTextContent('Write who gave the consent.');
    // the child's own yes is asked for at once, not only after the guardian's
    expect(screen.getByRole('alert')).toHaveTextContent(/Without the athlete’s own yes/);
    expect(api.calls(routes.recordConsent)).toHaveLength(0);
    await user.type(screen.getByLabelText('Guardian’s name'), 'Anita Marlow');
    await user.click(screen.getByRole('checkbox', { name: /was asked in words/ }));
    await user.click(save);
    await waitFor(() => expect(place()).toBe(`/athletes/${athleteId}/visits/new`));
    expect(api.calls(routes.recordConsent)[0]?.body).toMatchObject({
      givenBy: 'guardian',
      guardianName: 'Anita Marlow',
      assent: true,
      purposes: ['assessment'],
    });
  });

  it('is withdrawn purpose by purpose, after a question that says what stops', async () => {
    const api = athleteApi()
      .on(routes.listConsents, () => ({
        items: [
          aConsent({
            purposes: ['assessment', 'teaching'],
            held: ['assessment', 'teaching'],
          }),
        ],
      }))
      .on(routes.withdrawPurposes, () => anAthlete());
    const { user } = renderAt(`/athletes/${athleteId}`);
    await user.click(await screen.findByRole('button', { name: /^Withdraw: Use in teaching/ }));
    expect(api.calls(routes.withdrawPurposes)).toHaveLength(0);
    expect(screen.getByText(/no clip of Ines may be shown to learners/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Withdraw it' }));
    await waitFor(() => expect(api.calls(routes.withdrawPurposes)).toHaveLength(1));
    expect(api.calls(routes.withdrawPurposes)[0]).toMatchObject({
      params: { id: athleteId },
      body: { purposes: ['teaching'] },
    });
    await user.click(await screen.findByRole('button', { name: /^Withdraw: Filming/ }));
    expect(screen.getByText(/deleted after the days that the practice has\s+set/)).toBeVisible();
  });

  it('that was withdrawn says on which day everything goes, and what is no longer held', async () => {
    athleteApi(anAthlete({ consentedTo: [], deletionDue: '2099-02-03' })).on(
      routes.listConsents,
      () => ({
        items: [aConsent({ state: 'withdrawn', held: [], withdrawnAt: '2026-03-03T16:20:00Z' })],
      }),
    );
    renderAt(`/athletes/${athleteId}`);
    expect(await screen.findByText(/everything about/)).toHaveTextContent(/3 February 2099/);
    expect(await screen.findByText('Earlier consents (1)')).toBeVisible();
  });

  it('takes a scan of the paper, and says what is wrong with one', async () => {
    const scan = { type: 'application/pdf', bytes: 10, at: '2026-03-03T16:20:00Z' } as const;
    let kept = aConsent();
    const api = athleteApi()
      .on(routes.listConsents, () => ({ items: [kept] }))
      .on(routes.addConsentScan, () => new Refuse('unsupported-media-type', { detail: 'No.' }));
    const { user } = renderAt(`/athletes/${athleteId}`);
    const input = await screen.findByLabelText('Scan of the paper');
    const paper = new File(['%PDF-'], 'paper.pdf', { type: 'application/pdf' });
    await user.upload(input, paper);
    expect(await screen.findByText('No.')).toBeVisible();
    api.on(routes.addConsentScan, () => (kept = aConsent({ scan })));
    await user.upload(input, paper);
    expect(await screen.findByRole('button', { name: /^Save the scan \(PDF/ })).toBeVisible();
    expect(screen.getByRole('button', { name: 'Replace the scan' })).toBeVisible();
  });
});

const aLink: Replay = {
  id: '00000000-0000-4000-8000-000000000950',
  visitId,
  side: 'right',
  repId: '00000000-0000-4000-8000-000000000701',
  fromFrame: 0,
  toFrame: 300,
  showReading: true,
  showCall: true,
  head: 'shown',
  before: null,
  film: null,
  message: '',
  passPhrase: true,
  state: 'live',
  openings: 2,
  lastOpenedAt: '2026-03-04T10:00:00Z',
  expiresAt: '2026-04-03T10:00:00Z',
  by: { id: coachId, name: 'Maren Okafor' },
  at: '2026-03-03T17:00:00Z',
};

describe('the athlete’s links', () => {
  it('show state, end and openings, and are ended after a question', async () => {
    let link = aLink;
    const api = athleteApi(anAthlete({ consentedTo: ['assessment', 'sharing-by-link'] }))
      .on(routes.listReplays, () => ({ items: [link] }))
      .on(routes.revokeReplay, () => (link = { ...aLink, state: 'revoked' }));
    const { user } = renderAt(`/athletes/${athleteId}`);
    const links = within(await screen.findByRole('region', { name: 'Links' }));
    expect(await links.findByText(/opened twice/)).toBeVisible();
    expect(links.getByText('open')).toBeVisible();
    expect(links.getByText(/with a pass phrase; ends 3 April/)).toBeVisible();
    expect(api.calls(routes.listReplays)[0]?.query.get('athleteId')).toBe(athleteId);
    await user.click(links.getByRole('button', { name: 'End it' }));
    await user.click(screen.getByRole('button', { name: 'End the link' }));
    expect(await links.findByText('ended')).toBeVisible();
    expect(api.calls(routes.revokeReplay)[0]?.params.id).toBe(aLink.id);
  });

  it('are looked at, not ended, by a supervisor, who is shown no button that would be refused', async () => {
    athleteApi(anAthlete({ coach: { id: otherId, name: 'Jonas Reed' } }), 'supervisor')
      .on(routes.listReplays, () => ({ items: [aLink] }))
      .on(routes.listConsents, () => ({ items: [aConsent()] }));
    renderAt(`/athletes/${athleteId}`);
    const links = within(await screen.findByRole('region', { name: 'Links' }));
    expect(await links.findByText(/opened twice/)).toBeVisible();
    expect(await screen.findByText(/Recorded by/)).toBeVisible();
    for (const name of ['End it', /^Withdraw/])
      expect(screen.queryByRole('button', { name })).toBeNull();
    for (const name of ['Change details', 'New visit', 'Record another consent'])
      expect(screen.queryByRole('link', { name })).toBeNull();
  });
});

describe('the athlete’s page', () => {
  it('keeps what was seen and what was measured apart', async () => {
    athleteApi().on(routes.listVisits, () => ({
      items: [
        aVisitRow({
          sides: [
            {
              side: 'right',
              call: 'unsure',
              review: 'signed-off',
              reading: {
                code: 'early-turn-out',
                label: 'Turns out early',
                gates: STANDARD_GATES,
                change: 6.8,
                plusMinus: 3.6,
                u: 1.84,
                provisional: true,
              },
            },
            { side: 'left', call: 'on-time', review: 'waits', reading: null },
          ],
        }),
      ],
    }));
    renderAt(`/athletes/${athleteId}`);
    const table = await screen.findByRole('table', { name: 'Visits' });
    const [, right, left] = within(table).getAllByRole('row')[1]?.children ?? [];
    expect(right).toHaveTextContent('Turns out early+6.8° ± 3.6, by eye: unsureprovisional');
    expect(left).toHaveTextContent('Turned in on timeseen by the coach, not measured');
  });

  it('leads to the consent before it leads to a visit', async () => {
    athleteApi(anAthlete({ consentedTo: [], consentUntil: null }));
    renderAt(`/athletes/${athleteId}`);
    await screen.findByRole('heading', { name: 'Ines Marlow' });
    expect(screen.queryByRole('link', { name: 'New visit' })).toBeNull();
    expect(screen.getAllByRole('link', { name: 'Record the consent' })[0]).toHaveAttribute(
      'href',
      `/athletes/${athleteId}/consents/new`,
    );
  });
});
