import { setTimeout as pause } from 'node:timers/promises';

export interface Answer {
  readonly status: number;
  readonly headers: Headers;
  readonly body: Record<string, unknown>;
}

/** Asks once; null where no answer came, so that nothing is known of what was done. */
export type Ask = (method: string, path: string, given?: Given) => Promise<Answer | null>;
interface Given {
  readonly json?: unknown;
  readonly bytes?: Buffer;
  readonly form?: FormData;
  readonly headers?: Record<string, string>;
}

export const asker =
  (url: string, cookie: string): Ask =>
  async (method, path, { json, bytes, form, headers = {} } = {}) => {
    try {
      const answer = await fetch(`${url}${path}`, {
        method,
        headers: {
          Cookie: cookie,
          Origin: url,
          ...(json === undefined ? {} : { 'Content-Type': 'application/json' }),
          ...headers,
        },
        ...(json === undefined ? {} : { body: JSON.stringify(json) }),
        ...(bytes ? { body: new Uint8Array(bytes) } : {}),
        ...(form ? { body: form } : {}),
      });
      const text = await answer.text();
      const isJson = answer.headers.get('content-type')?.includes('json') === true;
      const body = (isJson && text !== '' ? JSON.parse(text) : {}) as Record<string, unknown>;
      return { status: answer.status, headers: answer.headers, body };
    } catch {
      return null;
    }
  };

const TRIES = 1500;

/** As a browser does that has lost its connection: again, until an answer comes that is no failure of the server's. */
export const patiently = async (ask: () => Promise<Answer | null>): Promise<Answer> => {
  for (let tries = 0; tries < TRIES; tries++) {
    const answer = await ask();
    if (answer && answer.status < 500 && answer.status !== 429) return answer;
    await pause(100);
  }
  throw new Error('No answer came, long after everything was started again.');
};
