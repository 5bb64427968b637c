import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { anAthletePlan } from '#tests/support/plans.ts';
import { aPublicReplay, replayToken } from '#tests/support/public-replay.ts';
import { ASK_FILM_EVERY } from './no-film-yet.tsx';
import { tokenOf } from './replay-api.ts';
import { ReplayApp } from './replay-app.tsx';
import { ASK_EVERY } from './use-still-live.ts';

/** Answers by `METHOD path`; what is not given is refused like without a network. */
function server(answers: Record<string, () => Response>) {
  const asked: string[] = [];
  vi.stubGlobal('fetch', (path: string, init?: RequestInit) => {
    const key = `${init?.method ?? 'GET'} ${path}`;
    asked.push(key);
    const answer = answers[key];
    return answer
      ? Promise.resolve().then(answer)
      : Promise.reject(new TypeError('Failed to fetch'));
  });
  return asked;
}
const OPEN = `GET /api/r/${replayToken}`;
const UNLOCK = `POST /api/r/${replayToken}/unlock`;
const open = (change: Partial<PublicReplay> = {}) =>
  server({ [OPEN]: () => Response.json(aPublicReplay(change)) });

const play = vi.fn(() => Promise.resolve());
beforeEach(() => {
  // jsdom plays nothing
  vi.spyOn(HTMLMediaElement.prototype, 'play').mockImplementation(play);
  vi.spyOn(HTMLMediaElement.prototype, 'pause').mockImplementation(() => undefined);
  vi.spyOn(HTMLMediaElement.prototype, 'load').mockImplementation(() => undefined);
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
});
afterEach(() => {
  vi.restoreAllMocks();
  play.mockClear();
});

const heading = (name: string | RegExp) => screen.findByRole('heading', { level: 1, name });

describe('a replay', () => {
  it('says what was measured and what was seen, apart, and where to stop', async () => {
    const asked = open();
    render(<ReplayApp token={replayToken} />);
    expect(await heading('Your right hip turns out early')).toBeVisible();
    expect(screen.getByText(/Three times of three, the hip you stand on turned/)).toBeVisible();
    expect(screen.getByText('seen by your coach, not measured')).toBeVisible();
    expect(screen.getByText(/almost certain of the direction/)).toBeVisible();
    expect(screen.getByText(/It is a way of moving, not an injury/)).toBeVisible();
    expect(screen.getByText('Stop if it hurts.')).toBeVisible();
    expect(screen.getByRole('link', { name: '01632 960 114' })).toHaveAttribute(
      'href',
      'tel:01632960114',
    );
    expect(screen.getByText(/until 2 April 2026/)).toBeVisible();
    expect(asked.every((path) => path.startsWith(`GET /api/r/${replayToken}`))).toBe(true);
    expect(screen.queryByRole('heading', { name: 'Keep the film' })).toBeNull();
  });

  it('hands over the film to keep where there is one', async () => {
    open({ film: { bytes: 2_400_000, madeAt: '2026-03-04T10:00:00Z' } });
    render(<ReplayApp token={replayToken} />);
    const save = await screen.findByRole('link', { name: 'Save the film (2.4 MB)' });
    expect(save).toHaveAttribute('href', `/api/r/${replayToken}/kept-film`);
    expect(save).toHaveAttribute('download');
    expect(screen.getByText(/as they stood on 4 March 2026/)).toBeVisible();
  });

  it('brings the plan until the retest, where one was given', async () => {
    open({ plan: anAthletePlan() });
    render(<ReplayApp token={replayToken} />);
    expect(await screen.findByRole('region', { name: 'Your plan' })).toBeVisible();
    expect(screen.getByText('Supported hinge', { selector: 'h3' })).toBeVisible();
  });

  it('plays slowly by itself, stops at a moment, and shows its angles', async () => {
    open();
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    await heading(/turns out early/);
    await waitFor(() => expect(play).toHaveBeenCalled());
    const video = screen.getByLabelText<HTMLVideoElement>('Your lift, standing on the right leg');
    await waitFor(() => expect(video.playbackRate).toBe(0.25));
    expect(video).toHaveAttribute('src', `/api/r/${replayToken}/video`);
    await user.click(screen.getByRole('button', { name: /^90°/ }));
    // the middle of frame 50 at 50 frames a second
    expect(video.currentTime).toBeCloseTo(1.01, 5);
    video.dispatchEvent(new Event('seeked'));
    expect(await screen.findByText('90° ± 3°', { selector: 'b' })).toBeVisible();
    expect(screen.getByText(/^\d+° out ±\s5°$/, { selector: 'b' })).toBeVisible();
    expect(screen.getByRole('button', { name: /^90°/ })).toHaveAttribute('aria-pressed', 'true');
    await user.click(screen.getByRole('button', { name: 'Half the speed' }));
    expect(video.playbackRate).toBe(0.5);
  });

  it('shows no film while the head is being hidden, and the film once it is there', async () => {
    vi.useFakeTimers({ toFake: ['setInterval', 'clearInterval'] });
    let head: PublicReplay['head'] = 'being-prepared';
    const asked = server({
      [OPEN]: () => Response.json(aPublicReplay({ head })),
      [`${OPEN}/film`]: () => Response.json({ head }),
    });
    render(<ReplayApp token={replayToken} />);
    expect(await screen.findByText('The film is being prepared.')).toBeVisible();
    expect(screen.queryByLabelText(/^Your lift/)).toBeNull();
    expect(screen.getByText(/clothes, room, tattoos and the way of moving/)).toBeVisible();
    vi.advanceTimersByTime(ASK_FILM_EVERY);
    await waitFor(() => expect(asked).toContain(`${OPEN}/film`));
    expect(screen.getByText('The film is being prepared.')).toBeVisible();
    head = 'failed';
    vi.advanceTimersByTime(ASK_FILM_EVERY);
    expect(await screen.findByText('The film is not here yet.')).toBeVisible();
    expect(screen.getByText(/Maren Okafor can see that and make it again/)).toBeVisible();
    head = 'hidden';
    vi.advanceTimersByTime(ASK_FILM_EVERY);
    expect(await screen.findByLabelText(/^Your lift/)).toHaveAttribute(
      'src',
      `/api/r/${replayToken}/video`,
    );
    expect(asked).not.toContain(`${OPEN}/video`);
    vi.useRealTimers();
  });

  it('stands still where motion is to be reduced', async () => {
    vi.stubGlobal('matchMedia', () => ({ matches: true }));
    open();
    render(<ReplayApp token={replayToken} />);
    await heading(/turns out early/);
    const video = screen.getByLabelText<HTMLVideoElement>('Your lift, standing on the right leg');
    await waitFor(() => expect(video.currentTime).toBeCloseTo(1.01, 5));
    expect(play).not.toHaveBeenCalled();
    vi.unstubAllGlobals();
  });

  it('goes to the moment a comment speaks of', async () => {
    open();
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    await user.click(await screen.findByRole('button', { name: 'Show me' }));
    const video = screen.getByLabelText<HTMLVideoElement>('Your lift, standing on the right leg');
    await waitFor(() => expect(video.currentTime).toBeCloseTo(0.81, 5));
    expect(screen.getByRole('button', { name: 'Show me' })).toHaveAttribute('aria-pressed', 'true');
  });

  it('reads out the measure of a comment', async () => {
    const measured = { kind: 'measured', u: 500, v: 900, label: 'Pelvic obliquity' } as const;
    const at = { fromFrame: 50, toFrame: 50, by: 'Tomas Ferreira' };
    const shape = { ...measured, text: '+6.1° ± 4.0' };
    open({ comments: [{ body: 'Your pelvis hikes.', ...at, shape }] });
    render(<ReplayApp token={replayToken} />);
    expect(await screen.findByText('+6.1° ± 4.0')).toBeVisible();
    expect(screen.getByText(/^Pelvic obliquity:/)).toBeVisible();
  });

  it('of a call alone says who saw it, and no angle', async () => {
    open({ reading: null });
    render(<ReplayApp token={replayToken} />);
    expect(await heading('Your right hip turned out early')).toBeVisible();
    expect(screen.getByText('seen by your coach, not measured')).toBeVisible();
    expect(screen.getByText(/Maren Okafor looked, and saw/)).toBeVisible();
    expect(screen.queryByText(/standing hip/)).toBeNull();
    expect(screen.queryByText(/certain/)).toBeNull();
  });

  it('says when the film cannot be loaded, and loads it again', async () => {
    open();
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    await heading(/turns out early/);
    screen.getByLabelText('Your lift, standing on the right leg').dispatchEvent(new Event('error'));
    expect(await screen.findByText(/The film could not be loaded/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(screen.queryByText(/The film could not be loaded/)).toBeNull();
  });
});

describe('a link that ends while its page is open', () => {
  const FILM = `GET /api/r/${replayToken}/film`;
  /** Opens; what is asked of the film answers as the link stands. */
  const living = (film: () => Response) =>
    server({ [OPEN]: () => Response.json(aPublicReplay()), [FILM]: film });
  const over = () => new Response('{}', { status: 404 });

  it('stops and says so as soon as the film is asked for again', async () => {
    living(over);
    render(<ReplayApp token={replayToken} />);
    await heading(/turns out early/);
    screen.getByLabelText('Your lift, standing on the right leg').dispatchEvent(new Event('error'));
    expect(await heading('This link has ended')).toBeVisible();
    expect(screen.queryByLabelText('Your lift, standing on the right leg')).toBeNull();
    expect(screen.getByText(/Ask the person who sent it for a new one/)).toBeVisible();
  });

  it('is asked now and then, and plays on while it lives or nobody can be asked', async () => {
    vi.useFakeTimers({ shouldAdvanceTime: true });
    try {
      let answer: () => Response = () => Response.json({ head: 'shown' });
      const asked = living(() => answer());
      render(<ReplayApp token={replayToken} />);
      await heading(/turns out early/);
      const times = () => asked.filter((path) => path === FILM).length;
      expect(times()).toBe(0);
      await vi.advanceTimersByTimeAsync(ASK_EVERY);
      expect(times()).toBe(1);
      answer = () => {
        throw new TypeError('Failed to fetch');
      };
      await vi.advanceTimersByTimeAsync(ASK_EVERY);
      expect(times()).toBe(2);
      expect(screen.getByLabelText('Your lift, standing on the right leg')).toBeVisible();
      answer = over;
      await vi.advanceTimersByTimeAsync(ASK_EVERY);
      expect(await heading('This link has ended')).toBeVisible();
      await vi.advanceTimersByTimeAsync(3 * ASK_EVERY);
      expect(times()).toBe(3);
    } finally {
      vi.useRealTimers();
    }
  });

  it('is asked at once when its page is seen again', async () => {
    living(over);
    render(<ReplayApp token={replayToken} />);
    await heading(/turns out early/);
    document.dispatchEvent(new Event('visibilitychange'));
    expect(await heading('This link has ended')).toBeVisible();
  });
});

describe('a link that does not open', () => {
  it('says what to do where it is dead', async () => {
    server({ [OPEN]: () => new Response('{}', { status: 404 }) });
    render(<ReplayApp token={replayToken} />);
    expect(await heading('This link no longer opens anything')).toBeVisible();
    expect(screen.getByText(/Ask the person who sent it for a new one/)).toBeVisible();
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('asks nothing of the server where the address cannot be a link', async () => {
    const asked = server({});
    render(<ReplayApp token={tokenOf('/r/short')} />);
    expect(await heading('This link no longer opens anything')).toBeVisible();
    expect(asked).toEqual([]);
  });

  it('tries again after a lost connection', async () => {
    server({});
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    expect(await heading('There is no connection')).toBeVisible();
    open();
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await heading('Your right hip turns out early')).toBeVisible();
  });

  it('asks for the pass phrase, again where it is wrong, then opens', async () => {
    let unlocked = false;
    const asked = server({
      [OPEN]: () =>
        unlocked ? Response.json(aPublicReplay()) : new Response('{}', { status: 401 }),
      [UNLOCK]: () => new Response(null, { status: unlocked ? 204 : 401 }),
    });
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    expect(await heading('Your replay asks for a pass phrase')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Open the replay' }));
    expect(await screen.findByText('Write the pass phrase here.')).toBeVisible();
    expect(asked).not.toContain(UNLOCK);
    await user.type(screen.getByLabelText('Pass phrase'), 'heron');
    await user.click(screen.getByRole('button', { name: 'Open the replay' }));
    expect(await screen.findByText(/This is not the pass phrase/)).toBeVisible();
    expect(screen.getByLabelText('Pass phrase')).toHaveFocus();
    unlocked = true;
    await user.click(screen.getByRole('button', { name: 'Open the replay' }));
    expect(await heading('Your right hip turns out early')).toBeVisible();
  });

  it('waits after too many tries', async () => {
    server({
      [OPEN]: () => new Response('{}', { status: 401 }),
      [UNLOCK]: () => new Response('{}', { status: 429 }),
    });
    const user = userEvent.setup();
    render(<ReplayApp token={replayToken} />);
    await user.type(await screen.findByLabelText('Pass phrase'), 'heron-reed');
    await user.click(screen.getByRole('button', { name: 'Open the replay' }));
    expect(await heading('Too many tries')).toBeVisible();
  });
});
