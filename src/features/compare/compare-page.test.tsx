import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { routes } from '#shared/contracts/routes.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import {
  anAthlete,
  athleteId,
  aVisitRow,
  otherId,
  visitId,
  repId,
} from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';
import { aReading, aSidePage, resultOf } from '#tests/support/side-page.ts';

const measured = (trial: string, change: Partial<SidePage> = {}): SidePage => {
  const page = aSidePage(aReading(resultOf(trial)));
  return { ...page, ...change };
};
const early = measured('g02_early_mid_3rep');
const later = measured('g04_expected_big', { visit: { id: otherId, day: '2026-04-14' } });

const sideOf = (side: 'left' | 'right', label: string) =>
  ({
    side,
    call: 'early',
    review: 'none',
    reading: {
      code: 'early-turn-out',
      label,
      gates: STANDARD_GATES,
      change: 6,
      plusMinus: 3,
      u: 1.5,
      provisional: false,
    },
  }) as const;

const open = (search: string, pages: Record<string, SidePage | Refuse> = {}) => {
  const api = signedInApi()
    .on(routes.athlete, () => anAthlete())
    .on(routes.listVisits, () => ({
      items: [
        aVisitRow({ id: otherId, day: '2026-04-14', sides: [sideOf('right', 'Turns in on time')] }),
        aVisitRow({ id: visitId, day: '2026-03-03', sides: [sideOf('right', 'Turns out early')] }),
      ],
    }))
    .on(routes.sideReading, ({ params }) => {
      const there = pages[params.id ?? ''];
      return there ?? (params.id === otherId ? later : early);
    })
    // the films need a real browser
    .on(routes.bench, () => new Refuse('unexpected'));
  return { api, ...renderAt(`/compare${search}`) };
};
const matter = async (name: string) => {
  const [section] = await screen.findAllByRole('region', { name });
  if (!section) throw new Error(`no region ${name}`);
  return within(section);
};

describe('comparing', () => {
  it('begins with an athlete, and says where to find one', async () => {
    open('');
    expect(await screen.findByText('Choose an athlete first')).toBeVisible();
  });

  it('offers the pairs that are asked for most', async () => {
    const { user, place } = open(`?athlete=${athleteId}`);
    await user.click(
      await screen.findByRole('link', {
        name: /^Standing on the right: 3 March( 2026)?, then 14 April( 2026)?$/,
      }),
    );
    expect(place()).toBe(
      `/compare?athlete=${athleteId}&first=${visitId}.right&second=${otherId}.right`,
    );
  });

  it('of two visits says by how much they differ at the gates and between, and whether that counts', async () => {
    open(`?first=${visitId}.right&second=${otherId}.right`);
    expect(
      await screen.findByText(/^Changed by more than the error\. Second less first:/),
    ).toBeVisible();
    const courses = await matter('Courses');
    const rows = courses.getAllByRole('row').slice(1);
    expect(rows.map((row) => row.textContent)).toEqual([
      expect.stringMatching(/^at 60° of lift[+−]\d+\.\d° ±/),
      expect.stringMatching(/^at 90° of lift[+−]\d+\.\d° ±/),
      expect.stringMatching(/^from 60° to 90°−\d+\.\d° ±/),
    ]);
    expect(
      courses.getByText('First, full line: standing on the right, 3 March', { exact: false }),
    ).toBeVisible();
  });

  it('of two reps of one side takes another rep than the first, and puts both into the address', async () => {
    const { place } = open(`?first=${visitId}.right&second=${visitId}.right`);
    await screen.findAllByText(/No difference that this test can show/);
    const [, first, second] =
      /first=[^.]+\.right\.([^&]+)&second=[^.]+\.right\.(.+)$/.exec(place()) ?? [];
    expect(first).toBeDefined();
    expect(second).toBeDefined();
    expect(second).not.toBe(first);
    expect([repId(1), repId(2), repId(3)]).toEqual(expect.arrayContaining([first, second]));
  });

  it('shows no change where none can be shown', async () => {
    open(`?first=${visitId}.right&second=${otherId}.right`, {
      [otherId]: { ...early, visit: later.visit },
    });
    expect(
      await screen.findByText(/^No change that this test can show\. Second less first:/),
    ).toBeVisible();
  });

  it('compares nothing that was read between other gates', async () => {
    const { reading } = later;
    if (!reading) throw new Error('a reading was expected');
    const narrow: Reading = {
      ...reading,
      result: { ...reading.result, rules: { ...reading.result.rules, gateFrom: 55 as never } },
    };
    open(`?first=${visitId}.right&second=${otherId}.right`, {
      [otherId]: { ...later, reading: narrow },
    });
    expect(await screen.findByText(/read between different gates/)).toBeVisible();
    expect(screen.queryByRole('table', { name: 'By how much they differ' })).toBeNull();
  });

  it('asks for the call first, and says what an unmarked side lacks', async () => {
    open(`?first=${visitId}.right&second=${otherId}.right`, {
      [otherId]: new Refuse('call-first'),
    });
    expect(await screen.findByText('The call by eye comes before the figures')).toBeVisible();
  });

  it('says that a side without marks has nothing to match by', async () => {
    open(`?first=${visitId}.right&second=${otherId}.right`, {
      [otherId]: { ...later, reading: null },
    });
    expect(await screen.findByText('Nothing to match by')).toBeVisible();
  });

  it('never puts two people beside each other', async () => {
    open(`?first=${visitId}.right&second=${otherId}.right`, {
      [otherId]: { ...later, athlete: { id: otherId, name: 'Somebody Else' } },
    });
    expect(await screen.findByText('Two people are not compared')).toBeVisible();
  });
});
