import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { seconds } from '#shared/timing/units.ts';
import type { TakeLook } from '#src/tracking/take/look-at-take.ts';
import { TakeLookState } from './take-look.tsx';
import type { TakeLooked } from './use-take-look.ts';

const good: TakeLook = {
  head: { told: 'yes', room: 0.25 },
  feet: { told: 'yes', room: 0.17 },
  still: { told: 'yes', seconds: seconds(3.1) },
  rise: { told: 'yes', seconds: seconds(2.3), lifts: 3 },
  dots: { told: 'yes', dots: 7 },
  lookedAt: seconds(15),
  length: seconds(15),
};

const lookAtRest = vi.fn();

const show = (
  look: TakeLook | undefined,
  more: { failed?: boolean; asksPointers?: boolean; rest?: TakeLooked['rest'] } = {},
) => {
  const { failed = false, asksPointers = false, rest = 'open' } = more;
  const looked = { look, failed, rest, lookAtRest };
  render(
    <MemoryRouter>
      <TakeLookState name="a.mov" looked={looked} asksPointers={asksPointers} />
    </MemoryRouter>,
  );
  return screen.getByRole('status');
};

describe('TakeLookState', () => {
  it('says good with its figures, and nothing more', () => {
    const said = show(good);
    expect(said).toHaveTextContent(
      'The take is good: head, feet and floor in the picture, still for 3.1 s, up in 2.3 s or slower, dots found.',
    );
    expect(screen.queryByRole('listitem')).toBeNull();
  });

  it('says film again with each reason first, and where it stands how to do it', () => {
    const said = show({
      ...good,
      feet: { told: 'no', room: 0 },
      still: { told: 'yes', seconds: seconds(1.6) },
      rise: { told: 'no', seconds: seconds(0.7), lifts: 2 },
    });
    expect(said).toHaveTextContent(/^Film again, while the athlete is still here:/);
    const lines = screen.getAllByRole('listitem').map(({ textContent }) => textContent);
    expect(lines).toHaveLength(3);
    expect(lines[0]).toMatch(/^The feet are cut off: step back/);
    expect(lines[1]).toMatch(/0\.7\u00a0s after the first movement: the leg is swung/);
    expect(lines[2]).toMatch(/^Still for 1\.6\u00a0s before the first lift; 3 seconds/);
    expect(screen.getByRole('link', { name: 'How: Whole body in the picture' })).toHaveAttribute(
      'href',
      '/#guide-frame',
    );
  });

  it.each([
    ['the head', { head: { told: 'no', room: 0 } }, /The head is cut off/],
    ['no still start', { still: { told: 'no', seconds: seconds(0) } }, /moves from the first/],
    [
      'half a second',
      { still: { told: 'no', seconds: seconds(0.5) } },
      /Still for 0\.5\u00a0s before/,
    ],
    ['no dots', { dots: { told: 'no', dots: 0 } }, /No round dots were found: stick them/],
  ] as const)('asks to film again for %s', (_, change, words) => {
    const said = show({ ...good, ...change });
    expect(said).toHaveTextContent(/^Film again/);
    expect(said.textContent).toMatch(words);
  });

  it('a take that will do names what would be better', () => {
    const said = show({ ...good, still: { told: 'yes', seconds: seconds(1.6) } });
    expect(said).toHaveTextContent(/^The take will do: .*still for 1\.6 s/);
    expect(said).toHaveTextContent(/3 seconds make zero firmer/);
  });

  it('what could not be told is left to the eye, with why', () => {
    const why = { told: 'cannot-tell', why: 'camera-moved' } as const;
    const said = show({ ...good, head: why, feet: why, still: why, rise: why, dots: why });
    expect(said).toHaveTextContent(/^Whether this take will do could not be told:/);
    expect(screen.getAllByRole('listitem')).toHaveLength(1);
    expect(said).toHaveTextContent(/The whole picture moves; put the phone on a stand\. Look at/);
  });

  it('a look that was cut short says so where it found nothing', () => {
    const why = { told: 'cannot-tell', why: 'no-lift' } as const;
    const nothing = { head: why, feet: why, still: why, rise: why, dots: why };
    const said = show({ ...good, ...nothing, lookedAt: seconds(4) });
    expect(said).toHaveTextContent(/could not be told:/);
    expect(said).toHaveTextContent(/Only the first 4\.0 s of 15\.0 s were looked at/);
  });

  it('one thing that could not be told speaks against nothing', () => {
    const said = show({ ...good, dots: { told: 'cannot-tell', why: 'few-round' } });
    expect(said).toHaveTextContent(
      /^Nothing speaks against this take: .* Look at the rest yourself:/,
    );
    expect(said).toHaveTextContent(/dots on the skin could not be told: there are a few round/);
  });

  it('pointers are left to the eye, and a part is called a part', () => {
    const said = show({ ...good, lookedAt: seconds(9) }, { asksPointers: true });
    expect(said).toHaveTextContent(/Only the first 9\.0 s of 15\.0 s were looked at/);
    expect(said).toHaveTextContent(/pointers are worn could not be told/);
    expect(said).toHaveTextContent(/^The take is good/);
  });

  it('offers to look at the rest, says that it does, and that it could not', async () => {
    const part = { ...good, lookedAt: seconds(9) };
    show(part);
    await userEvent.click(screen.getByRole('button', { name: 'Look at the rest of a.mov' }));
    expect(lookAtRest).toHaveBeenCalledOnce();
    cleanup();
    show(part, { rest: 'looking' });
    expect(screen.getByRole('button', { name: 'Looking at the rest …' })).toBeInTheDocument();
    cleanup();
    expect(show(part, { rest: 'failed' })).toHaveTextContent(
      /Only the first 9\.0 s of 15\.0 s were looked at\. The rest cannot be read: look at it yourself/,
    );
    cleanup();
    show(good);
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('says that it is looking, and that it could not', () => {
    expect(show(undefined)).toHaveTextContent('Looking at the pictures of a.mov: some seconds …');
  });

  it('says what to do where the pictures cannot be read', () => {
    expect(show(undefined, { failed: true })).toHaveTextContent(
      /cannot be read\. Look at it before the athlete leaves/,
    );
  });
});
