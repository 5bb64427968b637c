import { Client } from 'pg';

interface Statement {
  readonly text: string;
  readonly values: readonly unknown[];
}

/** What the driver is given: a text with its values, or an object that has both. */
type Given = string | { readonly text?: unknown; readonly values?: readonly unknown[] };

const statementOf = (given: Given, values: unknown): Statement | null => {
  if (typeof given === 'string')
    return { text: given, values: Array.isArray(values) ? (values as unknown[]) : [] };
  return typeof given.text === 'string' ? { text: given.text, values: given.values ?? [] } : null;
};

/** Every statement that this process sends to PostgreSQL while `work` runs, in order. */
export const statementsOf = async (work: () => Promise<unknown>): Promise<Statement[]> => {
  const seen: Statement[] = [];
  const prototype = Client.prototype as unknown as { query: (...args: unknown[]) => unknown };
  const { query } = prototype;
  prototype.query = function (this: Client, ...args: unknown[]) {
    const statement = statementOf(args[0] as Given, args[1]);
    if (statement) seen.push(statement);
    return query.apply(this, args);
  };
  try {
    await work();
  } finally {
    prototype.query = query;
  }
  return seen;
};

/** Sends them again, one after the other; answers how long the slowest took, ms. */
export const replay = async (client: Client, statements: readonly Statement[]): Promise<number> => {
  let slowest = 0;
  for (const { text, values } of statements) {
    const before = performance.now();
    await client.query(text, [...values]);
    slowest = Math.max(slowest, performance.now() - before);
  }
  return slowest;
};
