import { loggedError } from '../http/logging.ts';
import { ConfigError } from './config.ts';

const codeOf = (error: unknown): string | undefined =>
  error instanceof Error && 'code' in error && typeof error.code === 'string'
    ? error.code
    : undefined;

/** What a person at the terminal reads when the server does not start: what is wrong and what to do. */
export const explainStartError = (error: unknown): string => {
  if (error instanceof ConfigError) return error.message;
  switch (codeOf(error)) {
    case 'EADDRINUSE':
      return 'Another program already listens on that port. Stop it, or choose another PORT.';
    case 'EADDRNOTAVAIL':
      return 'This machine has no such address. Set HOST to one of its own, such as 127.0.0.1.';
    case 'ECONNREFUSED':
      return 'The database cannot be reached. Is PostgreSQL running at the address in DATABASE_URL?';
    case '28P01':
      return 'The database refuses the password in DATABASE_URL, DATABASE_OWNER_URL or DATABASE_JOBS_URL.';
    case '3D000':
      return 'The database named in DATABASE_URL does not exist.';
    case 'EACCES':
      return 'A folder of REDSHANK_DATA cannot be written, or the port is one that only root may open.';
    case 'ENOSPC':
      return 'The disk is full. Make room below REDSHANK_DATA, then start again.';
    default:
      return `Redshank could not start.\n${JSON.stringify(loggedError(error), null, 2)}`;
  }
};
