import { createServer, type RequestListener, type Server } from 'node:http';

export interface Patience {
  /** A connection on which nothing moves for this long is cut; live streams send a heartbeat every 20 s. */
  readonly idleMs: number;
  /** The headers of a request are whole by then, however steadily they trickle. */
  readonly headersMs: number;
  /** How often the latter is looked after. */
  readonly lookEveryMs: number;
}

const PATIENCE: Patience = { idleMs: 60_000, headersMs: 20_000, lookEveryMs: 5000 };

/**
 * The server under the interface. A whole request may take as long as it moves, for a clip goes up for an hour over
 * a poor line; without a limit of its own the headers would have none either. For other bodies see `bodyWithin`.
 */
export const makeHttpServer = (
  app: RequestListener,
  { idleMs, headersMs, lookEveryMs }: Patience = PATIENCE,
): Server => {
  const server = createServer(
    { requestTimeout: 0, headersTimeout: headersMs, connectionsCheckingInterval: lookEveryMs },
    app,
  );
  server.setTimeout(idleMs);
  return server;
};
