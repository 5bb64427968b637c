import { PROBLEMS, type Fault, type ProblemCode } from '#shared/contracts/problems.ts';

/**
 * Why a call brought no answer. Besides the server's own codes: `offline` where it was not reached at all,
 * `unreadable-answer` where what came back is not what the contract promises.
 */
export type ApiProblemCode = ProblemCode | 'offline' | 'unreadable-answer';

const OWN_TITLES = {
  offline: 'There is no connection to Redshank right now.',
  'unreadable-answer': 'The answer could not be read. Load the page again; it may be an old one.',
} as const satisfies Record<Exclude<ApiProblemCode, ProblemCode>, string>;

type Details = {
  status?: number;
  detail?: string;
  faults?: Fault[];
  requestId?: string;
  cause?: unknown;
};

const titleOf = (code: ApiProblemCode): string =>
  code === 'offline' || code === 'unreadable-answer' ? OWN_TITLES[code] : PROBLEMS[code][1];

/** The one kind of error that a call throws, an aborted one excepted. `message` can be shown to people. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  readonly code: ApiProblemCode;
  readonly title: string;
  readonly detail: string | null;
  /** 0 where no answer came. */
  readonly status: number;
  /** What is wrong with the input, by place (`body.givenName`); empty for other problems. */
  readonly faults: readonly Fault[];
  /** Finds the line in the server's log; null where no answer came. */
  readonly requestId: string | null;

  constructor(code: ApiProblemCode, details: Details = {}) {
    super(details.detail ?? titleOf(code), { cause: details.cause });
    this.code = code;
    this.title = titleOf(code);
    this.detail = details.detail ?? null;
    this.status = details.status ?? 0;
    this.faults = details.faults ?? [];
    this.requestId = details.requestId ?? null;
  }
}

export const isProblem = (error: unknown, ...codes: ApiProblemCode[]): error is ApiProblem =>
  error instanceof ApiProblem && (codes.length === 0 || codes.includes(error.code));

const isCode = (value: unknown): value is ProblemCode =>
  typeof value === 'string' && Object.hasOwn(PROBLEMS, value);

const isFault = (value: unknown): value is Fault =>
  typeof value === 'object' &&
  value !== null &&
  'path' in value &&
  'message' in value &&
  typeof value.path === 'string' &&
  typeof value.message === 'string';

const textOf = (value: unknown): string | undefined =>
  typeof value === 'string' && value !== '' ? value : undefined;

/**
 * A no by its status and body. A body that is no problem document (a proxy's page) becomes `unexpected`,
 * or `shutting-down` for the answers of a gateway whose server restarts.
 */
export function problemFrom(status: number, body: unknown, requestId?: string | null): ApiProblem {
  const fields: Record<string, unknown> =
    typeof body === 'object' && body !== null ? Object.fromEntries(Object.entries(body)) : {};
  const fallback = [502, 503, 504].includes(status) ? 'shutting-down' : 'unexpected';
  return new ApiProblem(isCode(fields.code) ? fields.code : fallback, {
    status,
    detail: textOf(fields.detail),
    faults: Array.isArray(fields.faults) ? fields.faults.filter(isFault) : [],
    requestId: textOf(fields.requestId) ?? requestId ?? undefined,
  });
}

/** Reads an answer that says no. */
export async function problemOf(response: Response): Promise<ApiProblem> {
  const body: unknown = await response.json().catch(() => null);
  return problemFrom(response.status, body, response.headers.get('x-request-id'));
}
