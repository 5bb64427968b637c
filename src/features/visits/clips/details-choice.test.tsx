import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { detailsComplete, type ClipDetails } from '../uploads/upload-item.ts';
import { DetailsChoice } from './details-choice.tsx';

function Example() {
  const [details, setDetails] = useState<ClipDetails>({
    view: 'front',
    supportSide: null,
    mirrored: false,
  });
  return (
    <>
      <DetailsChoice
        item={details}
        onChange={(change) => setDetails((now) => ({ ...now, ...change }))}
      />
      <output>{detailsComplete(details) ? 'complete' : 'incomplete'}</output>
    </>
  );
}

describe('DetailsChoice', () => {
  it('lets one take from the front hold both sides', () => {
    render(<Example />);
    expect(screen.getByRole('radio', { name: 'Both, in turn' })).toBeChecked();
    expect(screen.getByText('complete')).toBeVisible();
  });

  it('asks a side view which leg is stood on', async () => {
    render(<Example />);
    const user = userEvent.setup();
    await user.click(screen.getByRole('radio', { name: 'Lifted side' }));
    expect(screen.queryByRole('radio', { name: 'Both, in turn' })).toBeNull();
    expect(screen.getByText('incomplete')).toBeVisible();
    await user.click(screen.getByRole('radio', { name: 'Left' }));
    expect(screen.getByText('complete')).toBeVisible();
  });
});
