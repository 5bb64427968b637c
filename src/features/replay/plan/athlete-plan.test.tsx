import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { today } from '#src/ui/days.ts';
import { anAthletePlan } from '#tests/support/plans.ts';
import { replayToken } from '#tests/support/public-replay.ts';
import { AthletePlan } from './athlete-plan.tsx';

afterEach(() => vi.unstubAllGlobals());

/** The plan with a server that answers so; what was sent, and what the page was told. */
const open = (answer: () => Response | Promise<never>, given = anAthletePlan()) => {
  const sent: [string, unknown][] = [];
  vi.stubGlobal('fetch', (path: string, init: RequestInit) => {
    sent.push([path, JSON.parse(init.body as string)]);
    return Promise.resolve().then(answer);
  });
  const told = { onEnded: vi.fn(), onChanged: vi.fn() };
  render(
    <AthletePlan
      token={replayToken}
      given={given}
      coach="Maren Okafor"
      contact="reception: 01632 960 114"
      {...told}
    />,
  );
  return { sent, told, user: userEvent.setup() };
};
const TODAY = { name: /^today/ };
const tripod = () => within(screen.getByRole('group', { name: 'Done on, Standing foot tripod' }));

describe('the plan on a replay', () => {
  it('says when to stop above what is ticked off, and draws each exercise for its leg', () => {
    open(() => Response.json({}));
    const section = screen.getByRole('region', { name: 'Your plan' });
    const words = section.textContent ?? '';
    expect(words.indexOf('Stop on pain')).toBeGreaterThan(-1);
    expect(words.indexOf('Stop on pain')).toBeLessThan(words.indexOf('Standing foot tripod'));
    expect(words.indexOf('Does something hurt?')).toBeLessThan(
      words.indexOf('Standing foot tripod'),
    );
    expect(screen.getByText('14 April 2026')).toBeVisible();
    expect(screen.getByText('“Slowly, and barefoot.”')).toBeVisible();
    expect(screen.getAllByRole('img', { name: /on the left leg/i })[0]).toBeVisible();
    expect(screen.getAllByText('Toes long.')[0]).toBeVisible();
  });

  it('says that a newer one was given, above its own exercises', () => {
    open(() => Response.json({}), anAthletePlan({ newerGivenAt: '2026-05-02T09:00:00Z' }));
    const words = screen.getByRole('region', { name: 'Your plan' }).textContent ?? '';
    expect(words).toMatch(
      /There is a newer plan\. It was given to you on 2 May 2026, .+ Ask Maren Okafor for its link/,
    );
    expect(words.indexOf('newer plan')).toBeLessThan(words.indexOf('Standing foot tripod'));
  });

  it('ticks a day off, and takes a slip back', async () => {
    const tick = { exercise: 'foot-tripod', day: today() };
    let ticks = [tick];
    const { sent, user } = open(() => Response.json({ ticks }, { status: 201 }));
    await user.click(tripod().getByRole('button', TODAY));
    expect(sent).toEqual([[`/api/r/${replayToken}/ticks`, { ...tick, done: true }]]);
    expect(await tripod().findByRole('button', { ...TODAY, pressed: true })).toBeVisible();
    ticks = [];
    await user.click(tripod().getByRole('button', TODAY));
    expect(sent.at(-1)?.[1]).toEqual({ ...tick, done: false });
    expect(await tripod().findByRole('button', { ...TODAY, pressed: false })).toBeVisible();
    expect(tripod().getAllByRole('button')).toHaveLength(7);
  });

  it('keeps nothing that was not kept, and says why', async () => {
    const { user, told } = open(() => Promise.reject(new TypeError('Failed to fetch')));
    await user.click(tripod().getByRole('button', TODAY));
    expect(await screen.findByText(/There is no connection/)).toBeVisible();
    expect(tripod().getByRole('button', { ...TODAY, pressed: false })).toBeVisible();
    expect(told.onChanged).not.toHaveBeenCalled();
  });

  it.each([
    [404, 'onEnded'],
    [409, 'onChanged'],
  ] as const)('tells the page that what it shows is over: %i', async (status, which) => {
    const { user, told } = open(() => new Response('{}', { status }));
    await user.click(tripod().getByRole('button', TODAY));
    await vi.waitFor(() => expect(told[which]).toHaveBeenCalledOnce());
  });

  it('of a stopped plan shows no exercise', () => {
    open(() => Response.json({}), anAthletePlan({ plan: null }));
    expect(screen.getByText('Your plan is stopped')).toBeVisible();
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.queryByRole('img')).toBeNull();
  });
});

describe('the answer about pain', () => {
  const form = async (user: ReturnType<typeof userEvent.setup>) => {
    await user.click(screen.getByRole('button', { name: 'Say how it feels' }));
    return (name: string) => user.click(screen.getByRole('button', { name }));
  };

  it('asks how much and where, sends it, and says to stop and whom to call', async () => {
    const { sent, user } = open(() => new Response(null, { status: 204 }));
    const tap = await form(user);
    await tap('Send');
    expect(await screen.findByText('Choose a number from 0 to 10.')).toBeVisible();
    await tap('6');
    await tap('Send');
    expect(await screen.findByText('Say where it hurts.')).toBeVisible();
    for (const name of ['knee', 'groin', 'groin', 'left', 'afterwards', 'Supported hinge'])
      await tap(name);
    await tap('Send');
    expect(await screen.findByText('Sent to Maren Okafor. Stop what hurts.')).toBeVisible();
    expect(screen.getByRole('link', { name: '01632 960 114' })).toBeVisible();
    expect(screen.getByText(/go to a doctor today/)).toBeVisible();
    expect(sent).toEqual([
      [
        `/api/r/${replayToken}/pain`,
        {
          day: today(),
          level: 6,
          places: ['knee'],
          which: 'left',
          time: 'afterwards',
          exercise: 'supported-hinge',
        },
      ],
    ]);
  });

  it('of nothing that hurts is sent without more', async () => {
    const { sent, user } = open(() => new Response(null, { status: 204 }));
    const tap = await form(user);
    await tap('0');
    expect(screen.queryByRole('button', { name: 'knee' })).toBeNull();
    await tap('Send');
    expect(await screen.findByText('Sent: nothing hurts. Thank you.')).toBeVisible();
    expect(sent[0]?.[1]).toMatchObject({ level: 0, places: [], exercise: null });
  });

  it('that was not kept stays to be sent again', async () => {
    const { user } = open(() => new Response('{}', { status: 429 }));
    const tap = await form(user);
    await tap('0');
    await tap('Send');
    expect(await screen.findByText(/many answers at once/)).toBeVisible();
    expect(screen.getByRole('button', { name: 'Send' })).toBeVisible();
  });
});
