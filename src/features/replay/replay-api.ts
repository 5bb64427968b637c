import type { PainBody, Tick, TickBody } from '#shared/contracts/athlete-plan.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';

/** What asking for a replay can come to. */
export type Opening =
  | { readonly is: 'open'; readonly replay: PublicReplay }
  | { readonly is: 'phrase' }
  /** Lapsed, ended or never there: the server does not say which. */
  | { readonly is: 'gone' }
  /** It ended while its page was open. */
  | { readonly is: 'ended' }
  | { readonly is: 'too-many-tries' }
  | { readonly is: 'offline' }
  | { readonly is: 'broken' };

export type Unlocking = 'unlocked' | 'wrong' | 'gone' | 'too-many-tries' | 'offline' | 'broken';

/** The token of `/r/:token`; null where the address cannot be one. */
export const tokenOf = (pathname: string): string | null =>
  /^\/r\/([A-Za-z0-9_-]{43})\/?$/.exec(pathname)?.[1] ?? null;

export const videoAddress = (token: string): string => `/api/r/${token}/video`;
export const beforeVideoAddress = (token: string): string => `/api/r/${token}/before/video`;
export const filmAddress = (token: string): string => `/api/r/${token}/kept-film`;
export const posterAddress = (token: string): string => `/api/r/${token}/poster`;

const ask = async (path: string, init: RequestInit): Promise<Response | 'offline'> => {
  try {
    return await fetch(path, { credentials: 'same-origin', cache: 'no-store', ...init });
  } catch (error) {
    if (init.signal?.aborted) throw error;
    return 'offline';
  }
};

const refusal = (status: number): 'gone' | 'too-many-tries' | 'broken' => {
  if (status === 404) return 'gone';
  return status === 429 ? 'too-many-tries' : 'broken';
};

/** The server checks its answers against the contract; here only whether it is one at all. */
const isReplay = (value: unknown): value is PublicReplay =>
  typeof value === 'object' && value !== null && 'overlay' in value && 'frames' in value;

/** Throws only where `signal` says stop. */
export const openReplay = async (token: string, signal?: AbortSignal): Promise<Opening> => {
  const response = await ask(`/api/r/${token}`, { signal });
  if (response === 'offline') return { is: 'offline' };
  if (response.status === 401) return { is: 'phrase' };
  if (!response.ok) return { is: refusal(response.status) };
  const value: unknown = await response.json().catch(() => null);
  if (signal?.aborted) throw signal.reason;
  return isReplay(value) ? { is: 'open', replay: value } : { is: 'broken' };
};

/** How a link stands that was open: what of its film there is, `gone`, or null where nobody could be asked. */
export type FilmState = PublicReplay['head'] | 'gone' | null;

const isFilm = (value: unknown): value is Pick<PublicReplay, 'head'> =>
  typeof value === 'object' && value !== null && 'head' in value;

/** Asked past every cache. Throws only where `signal` says stop. */
export const filmState = async (token: string, signal: AbortSignal): Promise<FilmState> => {
  const response = await ask(`/api/r/${token}/film`, { signal });
  if (response === 'offline') return null;
  if (!response.ok) return response.status === 404 ? 'gone' : null;
  const value: unknown = await response.json().catch(() => null);
  if (signal.aborted) throw signal.reason;
  return isFilm(value) ? value.head : null;
};

export const unlockReplay = async (token: string, passPhrase: string): Promise<Unlocking> => {
  const response = await ask(`/api/r/${token}/unlock`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ passPhrase }),
  });
  if (response === 'offline') return 'offline';
  if (response.ok) return 'unlocked';
  return response.status === 401 ? 'wrong' : refusal(response.status);
};

/** What became of an answer of the athlete; `changed`: the plan is not the one on this page any more. */
export type Answered = 'kept' | 'changed' | 'gone' | 'too-many-tries' | 'offline' | 'broken';

const add = async (path: string, body: object): Promise<Response | Exclude<Answered, 'kept'>> => {
  const response = await ask(path, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  if (response === 'offline' || response.ok) return response;
  // locked again is over for this page; it asks for the phrase when it is opened anew
  if (response.status === 401) return 'gone';
  return response.status === 409 || response.status === 422 ? 'changed' : refusal(response.status);
};

const isTicks = (value: unknown): value is { ticks: Tick[] } =>
  typeof value === 'object' && value !== null && 'ticks' in value;

/** Says that an exercise was done on a day, or that this was a slip. */
export const sendTick = async (
  token: string,
  tick: TickBody,
): Promise<readonly Tick[] | Exclude<Answered, 'kept'>> => {
  const answer = await add(`/api/r/${token}/ticks`, tick);
  if (typeof answer === 'string') return answer;
  const value: unknown = await answer.json().catch(() => null);
  return isTicks(value) ? value.ticks : 'broken';
};

export const sendPain = async (token: string, pain: PainBody): Promise<Answered> => {
  const answer = await add(`/api/r/${token}/pain`, pain);
  return typeof answer === 'string' ? answer : 'kept';
};
