import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { ConfirmButton } from './confirm.tsx';

const setUp = (onConfirm: () => Promise<unknown>) => {
  render(
    <ConfirmButton
      label="Delete"
      title="Delete this clip?"
      confirm="Delete it"
      onConfirm={onConfirm}
    >
      <p>Its marks go with it.</p>
    </ConfirmButton>,
  );
  return userEvent.setup();
};

describe('ConfirmButton', () => {
  it('does nothing before it is confirmed, and gives the focus back', async () => {
    const act = vi.fn(() => Promise.resolve());
    const user = setUp(act);
    await user.click(screen.getByRole('button', { name: 'Delete' }));
    expect(screen.getByRole('dialog', { name: 'Delete this clip?' })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Keep it' }));
    expect(act).not.toHaveBeenCalled();
    expect(screen.getByRole('button', { name: 'Delete' })).toHaveFocus();
  });

  it('stays open and says why when the act is refused', async () => {
    const user = setUp(() => Promise.reject(new Error('Your role does not include this.')));
    await user.click(screen.getByRole('button', { name: 'Delete' }));
    await user.click(screen.getByRole('button', { name: 'Delete it' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('Your role does not include this.');
    expect(screen.getByRole('dialog')).toBeVisible();
  });
});
