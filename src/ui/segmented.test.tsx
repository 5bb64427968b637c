import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { Segmented } from './segmented.tsx';

function Example() {
  const [value, setValue] = useState<'no' | 'yes' | null>(null);
  return (
    <Segmented
      legend="Vertigo or dizziness?"
      choices={[
        { value: 'no', label: 'No' },
        { value: 'yes', label: 'Yes' },
      ]}
      value={value}
      onChange={setValue}
      error={value === null ? 'Answer yes or no.' : undefined}
    />
  );
}

describe('Segmented', () => {
  it('starts with nothing chosen and is answered by keyboard alone', async () => {
    render(<Example />);
    const user = userEvent.setup();
    const group = screen.getByRole('radiogroup', { name: 'Vertigo or dizziness?' });
    expect(group).toHaveAccessibleDescription('Answer yes or no.');
    expect(screen.queryByRole('radio', { checked: true })).toBeNull();
    await user.tab();
    await user.keyboard(' ');
    expect(screen.getByRole('radio', { name: 'No' })).toBeChecked();
    await user.keyboard('{ArrowRight}');
    expect(screen.getByRole('radio', { name: 'Yes' })).toBeChecked();
  });
});
