import { screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it } from 'vitest';
import type { Role } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { SAFETY_QUESTIONS, type Visit } from '#shared/contracts/visits.ts';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_PROTOCOL } from '#shared/protocol/protocol.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aProtocol, aProtocolPage } from '#tests/support/protocol.ts';
import {
  aClip,
  anAthlete,
  aSafety,
  aSetUp,
  athleteId,
  aVisit,
  clipId,
  otherId,
  setUpId,
  visitId,
} from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { moment } from '#src/ui/days.ts';
import { uploads } from './uploads/uploads.ts';

beforeEach(() => uploads.clear());

/** A visit with its athlete, set-ups and no calls; what a test changes is stored like on the server. */
function visitApi(
  start: {
    visit?: Partial<Visit>;
    clips?: ReturnType<typeof aClip>[];
    athlete?: Parameters<typeof anAthlete>[0];
    role?: Role;
  } = {},
) {
  const state = { visit: aVisit(start.visit), clips: start.clips ?? [] };
  const api = signedInApi(start.role)
    .on(routes.visit, () => state)
    .on(routes.athlete, () => anAthlete(start.athlete))
    .on(routes.listSetUps, () => ({ items: [aSetUp()] }))
    .on(routes.listCalls, () => ({ items: [] }))
    .on(routes.answerSafety, ({ body }) => {
      const { answers, clearedBy, chaperone } = body as Omit<
        NonNullable<Visit['safety']>,
        'mayFilm'
      >;
      const yes = Object.values(answers).some(Boolean);
      state.visit = {
        ...state.visit,
        version: state.visit.version + 1,
        safety: aSafety({ answers, clearedBy, chaperone, mayFilm: !yes || clearedBy !== null }),
      };
      return state.visit;
    })
    .on(routes.editVisit, ({ body }) => {
      const { setUpId: taken } = body as { setUpId?: string };
      const { name, distanceMm, lensHeightMm, rodMm, beltPointerMm, thighPointerMm } = aSetUp();
      if (taken !== undefined)
        state.visit = {
          ...state.visit,
          setUpName: name,
          filming: { distanceMm, lensHeightMm, rodMm, beltPointerMm, thighPointerMm },
        };
      return state.visit;
    });
  return { api, state, ...renderAt(`/visits/${visitId}`) };
}

const section = (name: string) => screen.findByRole('region', { name });
type User = ReturnType<typeof renderAt>['user'];

async function answerAll(
  user: User,
  within_: HTMLElement,
  answer: 'No' | 'Yes',
  but: Record<number, 'No' | 'Yes'> = {},
) {
  const groups = within(within_).getAllByRole('radiogroup');
  for (const [n, group] of groups.entries())
    await user.click(within(group).getByRole('radio', { name: but[n] ?? answer }));
}

describe('the safety check', () => {
  it('starts unanswered, and stays closed until every question has an answer', async () => {
    const { api, user } = visitApi();
    const safety = await section('2 Safety');
    expect(within(safety).queryByRole('radio', { checked: true })).toBeNull();
    expect(within(safety).getAllByRole('radiogroup')).toHaveLength(SAFETY_QUESTIONS.length);
    await user.click(within(safety).getByRole('button', { name: 'Record the safety check' }));
    await waitFor(() => expect(within(safety).getByRole('alert')).toHaveFocus());
    expect(within(safety).getAllByText('Answer yes or no.')).toHaveLength(SAFETY_QUESTIONS.length);
    expect(api.calls(routes.answerSafety)).toHaveLength(0);
    expect(screen.getByText('Closed until consent and safety check are there')).toBeVisible();
  });

  it('and the guide speak of the practice’s own gates', async () => {
    const { api } = visitApi();
    const values = { ...STANDARD_PROTOCOL, gateFrom: degrees(50), gateTo: degrees(80) };
    api.on(routes.protocol, () => aProtocolPage(aProtocol({ values })));
    expect(await screen.findByText('The lift passes 80°.')).toBeVisible();
    expect(screen.getByText(/nine times in ten, worked out for 60° to 90°\./)).toBeInTheDocument();
    expect(screen.queryByText(/(passes|at) 90°/)).toBeNull();
  });

  it('opens the upload once all is answered with no', async () => {
    const { api, user } = visitApi();
    const safety = await section('2 Safety');
    await answerAll(user, safety, 'No');
    for (const box of within(safety).getAllByRole('checkbox')) await user.click(box);
    await user.click(within(safety).getByRole('button', { name: 'Record the safety check' }));
    expect(await screen.findByText(/All answered with no/)).toBeVisible();
    expect(screen.getByRole('button', { name: 'Choose files' })).toBeVisible();
    expect(api.calls(routes.answerSafety)[0]?.body).toMatchObject({
      chaperone: null,
      clearedBy: null,
    });
  });

  it('stops at a yes, unless a named clinician has cleared it', async () => {
    const { user } = visitApi();
    const safety = await section('2 Safety');
    await answerAll(user, safety, 'No', { 0: 'Yes' });
    for (const box of within(safety).getAllByRole('checkbox')) await user.click(box);
    expect(within(safety).getByText('Do not film.')).toBeVisible();
    await user.click(within(safety).getByRole('button', { name: 'Record the answers' }));
    expect(await within(safety).findByText(/Not to be filmed/)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Choose files' })).toBeNull();
    await user.click(within(safety).getByRole('button', { name: 'Ask again' }));
    await answerAll(user, safety, 'No', { 0: 'Yes' });
    for (const box of within(safety).getAllByRole('checkbox')) await user.click(box);
    await user.type(within(safety).getByLabelText('Cleared by a clinician'), 'Dr Varga, today');
    await user.click(within(safety).getByRole('button', { name: 'Record the answers' }));
    expect(await within(safety).findByText(/Cleared by Dr Varga, today/)).toBeVisible();
    expect(screen.getByRole('button', { name: 'Choose files' })).toBeVisible();
  });

  it('does not let a minor be filmed without somebody they trust', async () => {
    const { api, user } = visitApi({
      visit: { athlete: { id: athleteId, name: 'Milo Ashdown', minor: true, heightMm: null } },
      athlete: { minor: true },
    });
    const safety = await section('2 Safety');
    await answerAll(user, safety, 'No');
    await user.click(within(safety).getByRole('checkbox', { name: /within reach/ }));
    await user.click(within(safety).getByRole('checkbox', { name: /stop on pain/ }));
    await user.click(within(safety).getByRole('button', { name: 'Record the safety check' }));
    expect(await within(safety).findByRole('alert')).toHaveTextContent(
      'A minor is not filmed alone',
    );
    expect(api.calls(routes.answerSafety)).toHaveLength(0);
  });
});

describe('filming', () => {
  it('takes a saved set-up in one touch', async () => {
    const { api, user } = visitApi();
    const chip = await screen.findByRole('button', { name: /^Room 2, floor mark/ });
    expect(chip).toHaveAttribute('aria-pressed', 'false');
    await user.click(chip);
    expect(await screen.findByText('0.95 m', { selector: 'dd' })).toBeVisible();
    expect(screen.getByRole('button', { name: /^Room 2, floor mark/ })).toHaveAttribute(
      'aria-pressed',
      'true',
    );
    expect(api.calls(routes.editVisit)[0]?.body).toEqual({ setUpId, version: 1 });
  });

  it('shows the guide before the first clip, and says what an unknown figure costs', async () => {
    visitApi();
    expect(await screen.findByText('Phone at pelvis height, level')).toBeVisible();
    expect(screen.getAllByRole('figure')).toHaveLength(9);
    expect(screen.getByText(/lift is known to ± 7° instead of ± 2°/)).toBeVisible();
    expect(screen.queryByText(/^For clips that are still to be sent/)).toBeNull();
  });

  it('says whose figures these are once a clip with its own is there', async () => {
    visitApi({ visit: { safety: aSafety() }, clips: [aClip()] });
    expect(await screen.findByText(/^For clips that are still to be sent/)).toBeVisible();
  });
});

describe('without consent', () => {
  it('asks for the child’s own yes where only that is missing', async () => {
    const missing = { minor: true, consentedTo: [], consentUntil: null, assentMissing: true };
    visitApi({ visit: { safety: aSafety() }, athlete: missing });
    const consent = await section('1 Consent');
    expect(
      await within(consent).findByText(/The child’s assent is missing: ask Ines and record it/),
    ).toBeVisible();
    expect(within(consent).getByRole('link', { name: 'Record the consent' })).toBeVisible();
  });

  it('keeps filming closed and leads to the consent', async () => {
    visitApi({ visit: { safety: aSafety() }, athlete: { consentedTo: [], consentUntil: null } });
    const consent = await section('1 Consent');
    expect(await within(consent).findByText(/filming stays closed/)).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Choose files' })).toBeNull();
  });
});

describe('clips', () => {
  const open = { safety: aSafety() };

  it('shows each state with its words and its way on', async () => {
    visitApi({
      visit: open,
      clips: [
        aClip(),
        aClip({ id: athleteId, name: 'b.mov', state: 'preparing', progress: 42, secondsLeft: 50 }),
      ],
    });
    const list = await screen.findByRole('list', { name: 'Clips of this visit' });
    const [ready, preparing] = within(list).getAllByRole('listitem');
    expect(within(ready as HTMLElement).getByText('ready')).toBeVisible();
    expect(
      await within(ready as HTMLElement).findByRole('link', { name: 'Call by eye, then mark' }),
    ).toHaveAttribute('href', `/visits/${visitId}/sides/right/call`);
    expect(
      within(ready as HTMLElement).getByRole('link', { name: 'Open the Bench' }),
    ).toHaveAttribute('href', `/clips/${clipId}`);
    expect(
      within(preparing as HTMLElement).getByText(/preparing, 42 %, about 50 s left/),
    ).toBeVisible();
  });

  it('offers the part that is there of a clip that was cut', async () => {
    const refusal = {
      code: 'truncated',
      sentence: 'The file stops after 2.8 s of 4.0 s.',
      usablePartSeconds: 2.8,
    };
    const { api, user } = visitApi({ visit: open, clips: [aClip({ state: 'refused', refusal })] });
    api.on(routes.usePart, () => aClip({ state: 'waiting' }));
    await user.click(await screen.findByRole('button', { name: 'Use the 2.8 s that are there' }));
    await waitFor(() =>
      expect(api.calls(routes.usePart)[0]?.body).toEqual({ fromSeconds: 0, toSeconds: null }),
    );
  });

  it('says why a clip could not be prepared, when it is tried again, and does it at once if asked', async () => {
    const soon = new Date(Date.now() + 60_000);
    const trouble = {
      code: 'no-space',
      sentence: 'The server’s disk is full.',
      nextTryAt: soon.toISOString(),
    } as const;
    const { api, user, state } = visitApi({
      visit: open,
      clips: [aClip({ state: 'waiting', trouble })],
    });
    api.on(routes.prepareAgain, () => {
      const waiting = aClip({ state: 'waiting' });
      state.clips = [waiting];
      return waiting;
    });
    expect(await screen.findByText('waits for another try')).toBeVisible();
    const words = `The server’s disk is full. The clip is kept and tried again by itself at ${moment(trouble.nextTryAt)}.`;
    expect(screen.getByText(words)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Try now' }));
    expect(await screen.findByText('waits to be prepared')).toBeVisible();
    expect(api.calls(routes.prepareAgain)).toHaveLength(1);
    expect(screen.queryByText(/The server’s disk/)).toBeNull();
  });

  it('leaves the next try to a person where the machine has given up', async () => {
    const trouble = { code: 'machine', sentence: 'It failed.', nextTryAt: null } as const;
    visitApi({ visit: open, clips: [aClip({ state: 'waiting', trouble })] });
    expect(await screen.findByText('not prepared')).toBeVisible();
    expect(screen.getByText(/kept, but it is not tried again by itself/)).toBeVisible();
    expect(screen.getByRole('button', { name: 'Try again' })).toBeVisible();
  });

  it('looks at a chosen file before anything is sent, and says why it cannot be used', async () => {
    const { api, user } = visitApi({ visit: open });
    api.on(routes.openUpload, () => new Refuse('storage-full'));
    await screen.findByRole('button', { name: 'Choose files' });
    const input = document.querySelector<HTMLInputElement>('input[type=file][multiple]');
    await user.upload(
      input as HTMLInputElement,
      new File(['no video at all'], 'notes.mov', { type: 'video/quicktime' }),
    );
    const list = await screen.findByRole('list', { name: 'Clips of this visit' });
    expect(await within(list).findByText(/not a video that can be read here/)).toBeVisible();
    expect(api.calls(routes.openUpload)).toHaveLength(0);
    await user.click(within(list).getByRole('button', { name: 'Send it all the same: notes.mov' }));
    expect(await within(list).findByText(/no room left/)).toBeVisible();
    expect(api.calls(routes.openUpload)[0]?.body).toEqual({
      name: 'notes.mov',
      bytes: 15,
      view: 'front',
      supportSide: null,
      mirrored: false,
    });
  });
});

describe('a supervisor’s look at a visit', () => {
  it('shows what was done and no button that would be refused', async () => {
    visitApi({
      role: 'supervisor',
      athlete: { coach: { id: otherId, name: 'Jonas Reed' } },
      visit: { safety: aSafety() },
      clips: [aClip()],
    });
    expect(await screen.findByRole('link', { name: 'Open the Bench' })).toBeVisible();
    expect(await screen.findByText('not made yet')).toBeVisible();
    for (const name of [
      'Ask again',
      'Choose files',
      'Delete',
      'Write the figures down',
      'Change these figures',
    ])
      expect(screen.queryByRole('button', { name })).toBeNull();
    expect(screen.queryByRole('link', { name: /^(Call by eye,|Make the call)/ })).toBeNull();
  });
});
