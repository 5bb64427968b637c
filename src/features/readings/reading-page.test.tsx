import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Athlete } from '#shared/contracts/athletes.ts';
import type { SidePage } from '#shared/contracts/readings.ts';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import {
  aClip,
  anAthlete,
  aRep,
  aVisit,
  aVisitRow,
  clipId,
  otherId,
  repId,
  visitId,
} from '#tests/support/records.ts';
import { aReplayLink } from '#tests/support/replay-link.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { aSideReview } from '#tests/support/review.ts';
import { aCall, aReading, aSidePage, resultOf } from '#tests/support/side-page.ts';

const aLink = aReplayLink();

function readingApi(page: SidePage | Refuse, athlete: Partial<Athlete> = {}) {
  let shown = page;
  let links: Replay[] = [];
  return signedInApi()
    .on(routes.sideReading, () => shown)
    .on(routes.sideReview, () => aSideReview())
    .on(routes.setAssumption, ({ body }) => {
      if (!(shown instanceof Refuse))
        shown = { ...shown, assumption: (body as { on: boolean }).on };
      return shown;
    })
    .on(routes.athlete, () =>
      anAthlete({ consentedTo: ['assessment', 'sharing-by-link'], ...athlete }),
    )
    .on(routes.visit, () => ({ visit: aVisit(), clips: [aClip()] }))
    .on(routes.listReps, () => ({ items: [1, 2, 3].map(aRep) }))
    .on(routes.listVisits, () => ({ items: [] }))
    .on(routes.listReplays, () => ({ items: links }))
    .on(routes.makeReplay, () => {
      links = [aLink];
      return { replay: aLink, url: 'http://localhost/r/abc' };
    })
    .on(routes.revokeReplay, () => {
      const ended: Replay = { ...aLink, state: 'revoked' };
      links = [ended];
      return ended;
    });
}

const address = `/visits/${visitId}/sides/right`;
const region = (name: string) => screen.findByRole('region', { name });

describe('a measured reading', () => {
  it('stands beside the call by eye, with its probability, its ± and what may be missed', async () => {
    readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep'))));
    renderAt(address);
    expect(await screen.findByRole('heading', { level: 1, name: 'Turns out early' })).toBeVisible();
    const head = within(await region('Reading'));
    expect(head.getByRole('img', { name: /a reading needs 95 in 100/ })).toBeVisible();
    expect(head.getByText('seen, not measured')).toBeVisible();
    expect(head.getByText('Eye and measurement agree.')).toBeVisible();
    expect(head.getByText(/agreed in 14 of 17/)).toBeVisible();
    expect(head.getByText(/turned outwards by \d+\.\d°, give or take \d+\.\d°/)).toBeVisible();
    const course = within(await region('Course'));
    expect(course.getByText(/An early turn smaller than \d+\.\d° may be missed/)).toBeVisible();
    expect(course.getAllByRole('link', { name: /^Rep \d$/ })).toHaveLength(3);
    expect(screen.queryByRole('region', { name: 'What would settle it' })).toBeNull();
  });

  it('gives pelvis and thigh of each rep their own ±, wider than that of all reps together', async () => {
    const result = resultOf('g02_early_mid_3rep');
    readingApi(aSidePage(aReading(result)));
    renderAt(address);
    const parts = within(await region('Pelvis and thigh'));
    const rows = parts.getAllByRole('row').slice(1);
    expect(rows).toHaveLength(3);
    const halves = rows.flatMap((row) =>
      [...(row.textContent ?? '').matchAll(/±\s*(\d+\.\d)/g)].map(([, text]) => Number(text)),
    );
    expect(halves).toHaveLength(9);
    const together = 1.96 * Math.hypot(result.figures?.pelvis.u ?? 0, result.figures?.uS ?? 0);
    for (const half of halves) expect(half).toBeGreaterThan(together - 0.05);
    expect(
      parts.getByText(/From 60° to 90° the pelvis turns .+ by \d+\.\d° ± \d+\.\d/),
    ).toBeVisible();
  });

  it('of a clip from the lifted side says that the pelvis is not seen from there', async () => {
    const result = resultOf('g02_early_mid_3rep');
    const why = [{ code: 'view-cannot-show-turn', view: 'lifted-side' } as const];
    const reps = result.reps.map((rep) => ({
      ...rep,
      used: false,
      fit: null,
      why,
      substitutions: [],
    }));
    readingApi(aSidePage(aReading({ ...result, code: 'not-measurable', figures: null, reps })));
    renderAt(address);
    const section = within(await region('Substitutions'));
    expect(section.getByText(/not seen from the lifted side/)).toBeVisible();
    expect(section.queryByText(/not seen from the front/)).toBeNull();
  });

  it('says why a rep was left out, and keeps it open to be looked at', async () => {
    const result = resultOf('g02_early_mid_3rep');
    const reps = result.reps.map((rep, n) =>
      n === 2
        ? { ...rep, used: false, fit: null, why: [{ code: 'excluded', reason: 'hopped' } as const] }
        : rep,
    );
    readingApi(aSidePage(aReading({ ...result, reps })));
    renderAt(address);
    const course = within(await region('Course'));
    expect(course.getByText(/left out: hopped/)).toBeVisible();
    expect(course.getByRole('link', { name: 'Rep 3' })).toHaveAttribute(
      'href',
      expect.stringContaining(`/clips/${clipId}?frame=`),
    );
  });

  it('names the side clip that a rep’s lift was taken from, or says why it was not', async () => {
    const result = resultOf('g02_early_mid_3rep');
    const [first, second, third] = result.reps.map(({ id }) => id);
    const reps = result.reps.map((rep) => (rep.id === first ? { ...rep, liftFrom: third } : rep));
    const reading = aReading({ ...result, reps });
    const named = reading.reps.map((rep) =>
      rep.id === second && third
        ? { ...rep, liftFrom: third, tieFault: { code: 'not-a-pair' as const } }
        : rep,
    );
    readingApi(aSidePage({ ...reading, reps: named }));
    renderAt(address);
    const course = within(await region('Course'));
    expect(course.getByText('lift from rep 3, filmed at the same time')).toBeVisible();
    expect(course.getByText(/lift from its own clip, not from rep 3: a front and/)).toBeVisible();
  });

  it('tells reps of the same number in two clips apart where they can be marked again', async () => {
    const reading = aReading(resultOf('g02_early_mid_3rep'));
    const reps = reading.reps.map((rep, at) =>
      at === 0 ? rep : { ...rep, number: at, clipId: visitId, clipName: 'IMG_2292.MOV' },
    );
    readingApi(aSidePage({ ...reading, reps }));
    renderAt(address);
    const section = within(await region('Marking error'));
    expect(
      section.getByRole('link', { name: 'Mark rep 1 of IMG_2291.MOV again, blind' }),
    ).toHaveAttribute('href', expect.stringContaining(`/clips/${clipId}`));
    expect(
      section.getByRole('link', { name: 'Mark rep 1 of IMG_2292.MOV again, blind' }),
    ).toBeVisible();
  });

  it('that rests on tracked marks is provisional', async () => {
    const result = { ...resultOf('g02_early_mid_3rep'), provisional: true };
    readingApi(aSidePage(aReading(result)));
    renderAt(address);
    expect(await screen.findByText('Provisional.')).toBeVisible();
    expect(screen.getByText(/cannot be signed off/)).toBeVisible();
  });

  it('that is not settled says what would settle it, and how likely each answer is', async () => {
    readingApi(aSidePage(aReading(resultOf('g07_flat_noisy_bare'))));
    renderAt(address);
    expect(await screen.findByRole('heading', { level: 1, name: 'Can’t tell yet' })).toBeVisible();
    const settle = within(await region('What would settle it'));
    expect(settle.getByText('Add another rep')).toBeVisible();
    const marks = settle.getByText('Mark two more frames of rep 1 with a lift from 54° to 66°');
    expect(marks).toBeVisible();
    expect(settle.getAllByRole('link', { name: 'Open it on the Bench' })[0]).toHaveAttribute(
      'href',
      expect.stringContaining(`/clips/${clipId}?frame=`),
    );
    expect(screen.getByText('Turns out by more than 1°')).toBeVisible();
    expect(screen.getByText('The measurement does not say.')).toBeVisible();
  });

  it('of a lift that stops short shows no figure of the turn', async () => {
    readingApi(aSidePage(aReading(resultOf('g09_range_not_reached'))));
    renderAt(address);
    expect(
      await screen.findByRole('heading', { level: 1, name: 'Lift stops short' }),
    ).toBeVisible();
    expect(screen.getByText('No rep could be used')).toBeVisible();
    expect(screen.queryByText('Turn, from 60° to 90° of lift')).toBeNull();
    expect(screen.getAllByText(/^Lift higher:/)).toHaveLength(1);
  });

  it('stands beside the other side’s, with a difference only where this test can show one', async () => {
    const reading = aReading(resultOf('g02_early_mid_3rep'), { side: 'right' });
    const other = aReading(resultOf('g04_expected_big'), { side: 'left' });
    readingApi(
      aSidePage(reading, {
        otherSide: {
          side: 'left',
          reading: other,
          calls: [aCall({ side: 'left', seen: 'on-time' })],
        },
        compared: { difference: -3.2, plusMinus: 5.1, differ: false },
      }),
    );
    renderAt(address);
    const both = within(await region('Both sides'));
    expect(both.getByText(/No difference that this test can show/)).toBeVisible();
    expect(both.getByText('Standing on the left')).toBeVisible();
    expect(both.getByRole('link', { name: 'Open the left side' })).toHaveAttribute(
      'href',
      `/visits/${visitId}/sides/left`,
    );
  });

  it('names its marking error, and is read again with the own one only when asked', async () => {
    const reading = aReading(resultOf('g02_early_mid_3rep'));
    const api = readingApi(aSidePage(reading, { newerMarkError: { px: 1.8, frames: 24 } }));
    const renewed = { ...reading, markError: { px: 1.8, frames: 24 } };
    api.on(routes.renewReading, () => aSidePage(renewed));
    const { user } = renderAt(address);
    const section = within(await region('Marking error'));
    expect(section.getByText('Assumed marking error, 3 px.')).toBeVisible();
    expect(section.getByText(/your own marking error, 1\.8 px from 24 frames/)).toBeVisible();
    await user.click(await section.findByRole('button', { name: 'Read again with 1.8 px' }));
    expect(
      await section.findByText('Your own marking error, 1.8 px from 24 frames marked twice.'),
    ).toBeVisible();
    expect(section.queryByRole('button')).toBeNull();
    expect(api.calls(routes.renewReading)).toHaveLength(1);
  });

  it('is read again by another engine only when asked, and names all that is new', async () => {
    const reading = aReading(resultOf('g02_early_mid_3rep'));
    const api = readingApi(
      aSidePage(reading, { newerEngine: 9, newerProtocol: { ...reading.protocol, version: 7 } }),
    );
    api.on(routes.renewReading, () => aSidePage(reading));
    const { user } = renderAt(address);
    const section = within(await region('Protocol'));
    expect(section.getByText(/New readings are made by engine 9/)).toBeVisible();
    await user.click(
      await section.findByRole('button', { name: 'Read again with protocol 7 and engine 9' }),
    );
    await waitFor(() => expect(section.queryByText(/engine 9/)).toBeNull());
    expect(api.calls(routes.renewReading)).toHaveLength(1);
  });

  it('offers the assumption with a belt pointer alone, and stores it', async () => {
    const result = { ...resultOf('g02_early_mid_3rep'), set: 'belt' as const };
    const api = readingApi(aSidePage(aReading(result)));
    const { user } = renderAt(address);
    const box = await screen.findByRole('checkbox', {
      name: /Take the planted thigh as turning little/,
    });
    expect(box).not.toBeChecked();
    await user.click(box);
    expect(await screen.findByRole('checkbox', { name: /planted thigh/ })).toBeChecked();
    expect(api.calls(routes.setAssumption)[0]?.body).toEqual({ on: true });
  });
});

describe('a side without a reading', () => {
  it('leads to the call by eye first', async () => {
    readingApi(new Refuse('call-first'));
    renderAt(address);
    expect(await screen.findByRole('link', { name: 'Make the call' })).toHaveAttribute(
      'href',
      `${address}/call`,
    );
    expect(screen.queryByText(/in 100/)).toBeNull();
  });

  it('shows the call in its place, without angle, probability or comparison', async () => {
    readingApi(aSidePage(null, { calls: [aCall({ handsFelt: 'firm' })] }));
    renderAt(address);
    expect(
      await screen.findByRole('heading', { level: 1, name: 'Turned out early' }),
    ).toBeVisible();
    expect(screen.getByText('seen by the coach, not measured')).toBeVisible();
    expect(screen.getByText('Not measured')).toBeVisible();
    expect(screen.getByText(/“firm”/)).toBeVisible();
    expect(screen.queryByText(/ in 100/)).toBeNull();
    expect(screen.queryByText(/Eye and measurement/)).toBeNull();
    expect(await screen.findByRole('link', { name: /^Mark IMG_2291/ })).toBeVisible();
  });

  it('says what is wrong and tries again', async () => {
    const api = readingApi(aSidePage(null));
    api.setOffline(true);
    const { user } = renderAt(address);
    api.setOffline(false);
    api.on(routes.sideReading, () => new Refuse('unexpected'));
    expect(await screen.findByText('Something went wrong on our side.')).toBeVisible();
    api.on(routes.sideReading, () => aSidePage(null));
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('seen by the coach, not measured')).toBeVisible();
  });
});

describe('the replay link', () => {
  it('shows an earlier lift of the same side beside it, where one is chosen', async () => {
    const right = { side: 'right', call: 'early', review: 'none' } as const;
    const reading = {
      code: 'early-turn-out',
      label: 'Turns out early',
      gates: STANDARD_GATES,
      ...{ change: 6, plusMinus: 3, u: 1.5, provisional: false },
    };
    const row = (id: string, day: string, measured: boolean) =>
      aVisitRow({ id, day, sides: [{ ...right, reading: measured ? reading : null }] });
    const api = readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep')))).on(
      routes.listVisits,
      () => ({
        items: [
          row(repId(8), '2027-01-05', true),
          row(visitId, '2026-03-03', true),
          row(otherId, '2026-01-20', true),
          row(repId(9), '2026-01-06', false),
        ],
      }),
    );
    const { user } = renderAt(address);
    const replay = within(await region('Replay for the athlete'));
    const choice = await replay.findByLabelText(/^Beside an earlier lift/);
    // later visits, this one and unmeasured ones are none
    expect(within(choice).getAllByRole('option')).toHaveLength(2);
    await user.selectOptions(choice, '20 January 2026');
    await user.click(replay.getByRole('button', { name: 'Make a link' }));
    expect(await replay.findByDisplayValue('http://localhost/r/abc')).toBeVisible();
    expect(api.calls(routes.makeReplay)[0]?.body).toMatchObject({ beforeVisitId: otherId });
  });

  it('is made, its address shown once, counted, and ended', async () => {
    const api = readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep'))));
    const { user } = renderAt(address);
    const replay = within(await region('Replay for the athlete'));
    await user.click(await replay.findByRole('button', { name: 'Make a link' }));
    expect(await replay.findByDisplayValue('http://localhost/r/abc')).toBeVisible();
    expect(api.calls(routes.makeReplay)[0]?.body).toEqual({
      visitId,
      side: 'right',
      repId: repId(1),
      fromFrame: aRep(1).startFrame,
      toFrame: aRep(1).endFrame,
      beforeVisitId: null,
      showReading: true,
      showCall: true,
      hideHead: false,
      message: '',
      days: 30,
      passPhrase: null,
    });
    await user.click(replay.getByRole('button', { name: 'Done' }));
    expect(replay.queryByDisplayValue('http://localhost/r/abc')).toBeNull();
    expect(await replay.findByText(/opened twice/)).toBeVisible();
    await user.click(replay.getByRole('button', { name: 'End it' }));
    await user.click(screen.getByRole('button', { name: 'End the link' }));
    expect(await replay.findByText('ended')).toBeVisible();
    expect(replay.queryByRole('button', { name: 'End it' })).toBeNull();
  });

  it('plays the frames that are named, and all of another rep once it is chosen', async () => {
    const api = readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep'))));
    const { user } = renderAt(address);
    const replay = within(await region('Replay for the athlete'));
    const from = await replay.findByLabelText('From frame');
    const to = replay.getByLabelText('To frame');
    const second = aRep(2);
    await user.selectOptions(replay.getByLabelText('Rep that is played'), second.id);
    await waitFor(() => expect(from).toHaveValue(second.startFrame));
    expect(to).toHaveValue(second.endFrame);

    await user.clear(to);
    await user.type(to, String(second.startFrame));
    await user.click(replay.getByRole('button', { name: 'Make a link' }));
    expect(
      (await replay.findAllByText(/The last frame comes after the first\./)).length,
    ).toBeGreaterThan(0);
    expect(api.calls(routes.makeReplay)).toHaveLength(0);

    await user.clear(to);
    await user.type(to, String(second.startFrame + 40));
    await user.click(replay.getByRole('button', { name: 'Make a link' }));
    await replay.findByDisplayValue('http://localhost/r/abc');
    expect(api.calls(routes.makeReplay)[0]?.body).toMatchObject({
      repId: second.id,
      fromFrame: second.startFrame,
      toFrame: second.startFrame + 40,
    });
  });

  it('says what consent is missing', async () => {
    readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep'))), {
      consentedTo: ['assessment'],
    });
    renderAt(address);
    const replay = within(await region('Replay for the athlete'));
    expect(await replay.findByText('There is no consent to a replay by link')).toBeVisible();
    expect(replay.getByRole('link', { name: 'Record the consent' })).toBeVisible();
    expect(replay.queryByRole('button', { name: 'Make a link' })).toBeNull();
  });

  it('refuses a pass phrase that is too short before sending', async () => {
    const api = readingApi(aSidePage(aReading(resultOf('g02_early_mid_3rep'))));
    const { user } = renderAt(address);
    const replay = within(await region('Replay for the athlete'));
    await user.type(await replay.findByLabelText(/^Pass phrase/), 'abc');
    await user.click(replay.getByRole('button', { name: 'Make a link' }));
    expect((await replay.findAllByText(/At least 6 characters\./)).length).toBeGreaterThan(0);
    expect(api.calls(routes.makeReplay)).toHaveLength(0);
  });
});
