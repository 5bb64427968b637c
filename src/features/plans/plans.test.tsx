import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { Plan } from '#shared/contracts/plans.ts';
import { routes } from '#shared/contracts/routes.ts';
import { paths } from '#src/ui/paths.ts';
import { Refuse } from '#tests/support/fake-api.ts';
import { aGivenPlan, aPlan, aPlanItem, aPlanStart, planId } from '#tests/support/plans.ts';
import { coachId, visitId } from '#tests/support/records.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

const heading = (name: string | RegExp) => screen.findByRole('heading', { level: 1, name });

/** The plan's page; what is edited is taken as it is sent. */
const open = async (change: Partial<Plan> = {}) => {
  let plan = aPlan(change);
  const api = signedInApi()
    .on(routes.plan, () => plan)
    .on(routes.editPlan, ({ body }) => {
      const { items, ...rest } = body as { items?: Plan['items'] };
      plan = {
        ...plan,
        ...rest,
        version: plan.version + 1,
        items: items ? items.map((item) => ({ ...aPlanItem(item.exercise), ...item })) : plan.items,
      };
      return plan;
    })
    .on(routes.givePlan, () => (plan = { ...plan, state: 'given' }))
    .on(routes.seePain, () => (plan = { ...plan, pain: [] }));
  const page = renderAt(paths.plan(planId));
  await heading('Plan for Ines Marlow');
  const sent = () =>
    api.calls(routes.editPlan).at(-1)?.body as { version: number; items: Plan['items'] };
  return { ...page, api, sent };
};

describe('what a plan starts from', () => {
  it('shows each finding with what the rules make of it, and makes the plan that is chosen', async () => {
    const api = signedInApi()
      .on(routes.planStart, () => aPlanStart())
      .on(routes.makePlan, () => aPlan())
      .on(routes.plan, () => aPlan());
    const { user, place } = renderAt(paths.planStart(visitId, 'right'));
    await heading('Plan for Ines Marlow');
    expect(screen.getByText('Old ankle sprain.')).toBeVisible();
    expect(screen.getByText('“Can’t tell yet”')).toBeVisible();
    expect(screen.getByRole('button', { name: 'Plan the retest alone' })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Make this plan' }));
    await screen.findByText('Starts from');
    expect(place()).toBe(paths.plan(planId));
    expect(api.calls(routes.makePlan)[0]?.body).toEqual({ from: 'call' });
  });

  it('asks for the call by eye, and leads to a plan that is there', async () => {
    signedInApi().on(routes.planStart, () => new Refuse('call-first'));
    renderAt(paths.planStart(visitId, 'right'));
    expect(await screen.findByRole('link', { name: 'Make the call' })).toHaveAttribute(
      'href',
      paths.call(visitId, 'right'),
    );
  });

  it('is left to the coach by a supervisor, and waits for a final reading', async () => {
    const [first] = aPlanStart().findings;
    if (!first) throw new Error('a finding was expected');
    signedInApi('supervisor').on(routes.planStart, () =>
      aPlanStart({
        coachId: planId,
        findings: [{ ...first, hindrance: 'provisional' }],
      }),
    );
    renderAt(paths.planStart(visitId, 'right'));
    expect(await screen.findByText(/The reading is provisional/)).toBeVisible();
    expect(screen.queryByRole('button', { name: /plan/i })).toBeNull();
  });
});

describe('a plan', () => {
  it('shows where it comes from and draws each exercise for its side', async () => {
    await open({ items: [aPlanItem('foot-tripod', { side: 'left' })] });
    expect(screen.getByText('“Turns out early”')).toBeVisible();
    expect(screen.getByText('the measured reading')).toBeVisible();
    expect(screen.getByRole('img', { name: /most of the weight on the left leg/ })).toBeVisible();
    expect(screen.getByText('2 sets of 30 s held, 30 s rest, 6 days a week')).toBeVisible();
  });

  it('says who signed off what it stands on', async () => {
    const by = { id: coachId, name: 'Theo Brandt' };
    await open({ signedOff: { by, at: '2026-03-04T10:00:00Z' } });
    expect(screen.getByText(/^signed off by Theo Brandt, 4 March/)).toBeVisible();
    expect(screen.queryByText('not signed off')).toBeNull();
  });

  it('has all sides confirmed at one press, each of which can still be turned', async () => {
    const unconfirmed = { sideConfirmed: false };
    const { user, sent } = await open({
      items: [aPlanItem('foot-tripod', unconfirmed), aPlanItem('supported-hinge', unconfirmed)],
    });
    expect(screen.getByText('not signed off')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Confirm all two sides' }));
    expect(sent().items).toMatchObject([
      { exercise: 'foot-tripod', side: 'right', sideConfirmed: true },
      { exercise: 'supported-hinge', side: 'right', sideConfirmed: true },
    ]);
    expect(await screen.findAllByText('side confirmed')).toHaveLength(2);
    expect(screen.queryByRole('button', { name: /^Confirm/ })).toBeNull();
    await user.click(screen.getByRole('button', { name: /^Turn Supported hinge to the left/ }));
    expect(sent().items[1]).toMatchObject({ side: 'left', sideConfirmed: false });
  });

  it('puts an exercise earlier, takes one out, adds one', async () => {
    const { user, sent } = await open();
    await user.click(screen.getByRole('button', { name: 'Supported hinge earlier' }));
    expect(sent().version).toBe(3);
    expect(sent().items.map(({ exercise }) => exercise)).toEqual([
      'supported-hinge',
      'foot-tripod',
    ]);
    await user.click(screen.getByRole('button', { name: 'Take out Standing foot tripod' }));
    expect(sent().items.map(({ exercise }) => exercise)).toEqual(['supported-hinge']);
    await user.selectOptions(screen.getByLabelText('Another exercise'), 'Step-up');
    await user.click(screen.getByRole('button', { name: 'Add' }));
    expect(await screen.findByRole('heading', { level: 3, name: 'Step-up' })).toBeVisible();
    expect(sent().items[1]).toMatchObject({
      exercise: 'step-up',
      side: 'right',
      sideConfirmed: false,
    });
  });

  it('has its dose changed, to repetitions or to seconds, never to both', async () => {
    const { user, sent, api } = await open();
    await user.click(screen.getByRole('button', { name: 'Change Standing foot tripod' }));
    await user.type(screen.getByLabelText('Repetitions'), '8');
    await user.click(screen.getAllByRole('button', { name: 'Save' })[0] as HTMLElement);
    expect(
      (await screen.findAllByText('Write either repetitions or seconds of holding.'))[0],
    ).toBeVisible();
    expect(api.calls(routes.editPlan)).toHaveLength(0);
    await user.clear(screen.getByLabelText('Hold'));
    await user.type(screen.getByLabelText(/^Your own cue/), 'Nose over the toes.');
    await user.click(screen.getAllByRole('button', { name: 'Save' })[0] as HTMLElement);
    expect(await screen.findByText('“Nose over the toes.”')).toBeVisible();
    expect(sent().items[0]).toMatchObject({
      dose: { repetitions: 8, holdSeconds: null },
      cue: 'Nose over the toes.',
    });
  });

  it('has each side confirmed; a side that is turned is to be confirmed anew', async () => {
    const { user, sent } = await open({
      items: [aPlanItem('foot-tripod', { sideConfirmed: false })],
    });
    const confirm = { name: 'Confirm the side of Standing foot tripod' };
    await user.click(screen.getByRole('button', confirm));
    expect(await screen.findByText('side confirmed')).toBeVisible();
    await user.click(screen.getByRole('button', { name: /^Turn .* to the left leg$/ }));
    expect(sent().items[0]).toMatchObject({ side: 'left', sideConfirmed: false });
    expect(await screen.findByRole('button', confirm)).toBeVisible();
  });

  it('says why an exercise is held back, and takes a reason to use it all the same', async () => {
    const { user, sent } = await open({
      missing: ['Decide about what is held back, or take it out: Single-leg hinge.'],
      items: [
        aPlanItem('single-leg-hinge', { heldBack: ['vertigo-or-dizziness'], undecided: true }),
        aPlanItem('hold-to-60', {
          heldBack: ['weight-bearing-limits'],
          undecided: true,
          mayNot: 'needs-clearance',
        }),
      ],
    });
    expect(screen.getByText(/Held back for vertigo or dizziness/)).toBeVisible();
    expect(screen.getByText(/Whoever treats this athlete has set the limit/)).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Use Single-leg hold/ })).toBeNull();
    expect(screen.getByRole('button', { name: 'Give it to the athlete' })).toBeDisabled();
    await user.click(screen.getByRole('button', { name: 'Use Single-leg hinge all the same' }));
    await user.type(screen.getByLabelText('Why is it right for this athlete?'), 'ok');
    await user.click(screen.getByRole('button', { name: 'Use it all the same' }));
    expect(await screen.findByText(/at least 10 characters/)).toBeVisible();
    await user.type(screen.getByLabelText('Why is it right for this athlete?'), ', held by hand');
    await user.click(screen.getByRole('button', { name: 'Use it all the same' }));
    expect(sent().items[0]).toMatchObject({ despite: 'ok, held by hand' });
    expect(sent().items[1]).not.toHaveProperty('despite');
  });

  it('is given to the athlete once nothing is missing', async () => {
    const { user, api } = await open();
    await user.click(screen.getByRole('button', { name: 'Give it to the athlete' }));
    expect(await screen.findByText('given to the athlete')).toBeVisible();
    expect(api.calls(routes.givePlan)[0]?.body).toEqual({ version: 3 });
    expect(screen.getByRole('button', { name: 'Stop the plan' })).toBeVisible();
  });

  it('says when somebody else was faster', async () => {
    const { user, api } = await open();
    api.on(routes.editPlan, () => new Refuse('edited-meanwhile'));
    await user.click(screen.getByRole('button', { name: 'Take out Supported hinge' }));
    expect((await screen.findAllByText(/Somebody else changed this meanwhile/))[0]).toBeVisible();
  });

  it('shows what hurts above everything until it was looked at', async () => {
    const { user } = await open({
      state: 'given',
      given: [
        {
          number: 1,
          at: '2026-03-03T16:20:00Z',
          by: { id: coachId, name: 'Maren Okafor' },
          plan: aGivenPlan(),
        },
      ],
      pain: [
        {
          id: planId,
          day: '2026-03-05',
          level: 6,
          places: ['knee', 'groin'],
          which: 'left',
          time: 'afterwards',
          exercise: 'supported-hinge',
          at: '2026-03-05T10:00:00Z',
          seen: null,
        },
      ],
    });
    const pain = within(screen.getByRole('region', { name: 'Pain' }));
    expect(pain.getByText('6 of 10')).toBeVisible();
    expect(pain.getByText(/: knee, groin, left, afterwards, at Supported hinge/)).toBeVisible();
    await user.click(pain.getByRole('button', { name: 'I have looked at it' }));
    expect(await screen.findByText('Nothing was said about pain yet.')).toBeVisible();
  });

  it('is only read by a supervisor', async () => {
    signedInApi('supervisor').on(routes.plan, () => aPlan({ coachId: planId }));
    renderAt(paths.plan(planId));
    await heading('Plan for Ines Marlow');
    for (const name of [/Take out/, /Give it/, /^Save$/, /^Add$/])
      expect(screen.queryByRole('button', { name })).toBeNull();
  });
});
