import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { LinkHead } from './link-head.tsx';

describe('the hidden head of a link', () => {
  it('says that it failed and is asked for again, and the keyboard stays in its row', async () => {
    const ask = vi.fn(() => Promise.resolve());
    function Row() {
      const [head, setHead] = useState<'failed' | 'being-prepared'>('failed');
      return (
        <LinkHead
          head={head}
          onAgain={async () => {
            await ask();
            setHead('being-prepared');
          }}
        />
      );
    }
    render(<Row />);
    expect(screen.getByText(/could not be made, so the link shows none/)).toBeVisible();
    await userEvent.tab();
    await userEvent.keyboard('{Enter}');
    const now = await screen.findByText(/is being prepared/);
    expect(ask).toHaveBeenCalledOnce();
    expect(screen.queryByRole('button')).toBeNull();
    expect(document.activeElement).toContainElement(now);
  });

  it('says so where asking did not work, and lets it be asked once more', async () => {
    render(<LinkHead head="failed" onAgain={() => Promise.reject(new Error('No connection.'))} />);
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('No connection.');
    expect(screen.getByRole('button', { name: 'Try again' })).toBeEnabled();
  });

  it('offers nothing to those who make no links', () => {
    render(<LinkHead head="failed" />);
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('names the earlier lift that is meant', () => {
    const { rerender } = render(<LinkHead head="shown" besideOf="2026-03-03" />);
    expect(screen.getByText('Beside it 3 March: it is shown.')).toBeVisible();
    rerender(<LinkHead head="to-be-looked-at" besideOf="2026-03-03" />);
    expect(screen.getByText(/^Beside it 3 March: the box .* is not shown until/)).toBeVisible();
  });
});
