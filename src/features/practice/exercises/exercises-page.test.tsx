import { screen, within } from '@testing-library/react';
import { expect, it } from 'vitest';
import { EXERCISES } from '#shared/plan/library.ts';
import { paths } from '#src/ui/paths.ts';
import { renderAt, signedInApi } from '#tests/support/render-app.tsx';

it('shows every exercise with a drawing, its criteria and what holds it back, for either leg', async () => {
  signedInApi();
  const { user } = renderAt(paths.exercises());
  await screen.findByRole('heading', { level: 1, name: 'Exercises' });
  for (const { name, purpose, goBackWhen } of EXERCISES) {
    const section = within(screen.getByRole('region', { name }));
    expect(section.getByText(purpose)).toBeVisible();
    expect(section.getByRole('img', { name: /right/ })).toBeVisible();
    for (const line of goBackWhen) expect(section.getByText(line)).toBeVisible();
  }
  const hold = within(screen.getByRole('region', { name: 'Single-leg hold to 90°' }));
  expect(hold.getByText(/Held back for .*vertigo or dizziness/)).toBeVisible();
  expect(hold.getByText('Stand on the right leg.')).toBeVisible();
  await user.click(screen.getByLabelText('Left leg'));
  expect(hold.getByText('Stand on the left leg.')).toBeVisible();
  expect(hold.getByRole('img', { name: /^On the left leg/ })).toBeVisible();
});

it('says in words what leads to what', async () => {
  signedInApi();
  renderAt(paths.exercises());
  const rules = within(await screen.findByRole('region', { name: 'What leads to what' }));
  expect(rules.getByText('“Turns out early”, mostly by the pelvis')).toBeVisible();
  expect(rules.getByText('“Turns out early”, or “Turned out early” by eye')).toBeVisible();
  expect(rules.getAllByRole('link', { name: 'Supported hinge' })[0]).toHaveAttribute(
    'href',
    '/practice/exercises#supported-hinge',
  );
});
