import { join, resolve } from 'node:path';
import * as z from 'zod';

const port = z.coerce
  .number({ error: 'must be a number' })
  .int('must be a whole number')
  .min(0, 'must be 0 to 65535')
  .max(65_535, 'must be 0 to 65535');
const address = z.url({
  protocol: /^https?$/,
  error: 'must be an address such as http://127.0.0.1:4600',
});
const database = z.url({ protocol: /^postgres(ql)?$/, error: 'must be a postgres:// address' });
const flag = z
  .enum(['0', '1', 'true', 'false', ''], { error: 'must be 1 or 0' })
  .transform((value) => value === '1' || value === 'true');
const text = z.string().min(1);

const schema = z.object({
  NODE_ENV: z
    .enum(['production', 'development', 'test'], {
      error: 'must be production, development or test',
    })
    .optional(),
  PORT: port.default(4600),
  HOST: text.default('127.0.0.1'),
  PUBLIC_URL: address.optional(),
  TRUST_PROXY: z.coerce
    .number({ error: 'must say how many proxies stand in front' })
    .int()
    .min(0)
    .max(10)
    .default(0),
  DATABASE_URL: database,
  DATABASE_OWNER_URL: database,
  DATABASE_JOBS_URL: database,
  REDSHANK_DATA: text.default('redshank-data'),
  REDSHANK_SECRETS_DIR: text.optional(),
  REDSHANK_UPLOADS: text.optional(),
  REDSHANK_DEMO: flag.optional(),
  REDSHANK_DEMO_PASSWORD: z.string().min(8, 'must have at least 8 characters').max(72).optional(),
  REDSHANK_LOG: z.enum(['trace', 'debug', 'info', 'warn', 'error', 'silent']).optional(),
  REDSHANK_S3_BUCKET: text.optional(),
  REDSHANK_S3_ENDPOINT: address.optional(),
  REDSHANK_S3_REGION: text.default('us-east-1'),
  REDSHANK_SMTP_URL: z
    .url({ protocol: /^smtps?$/, error: 'must be an smtp:// address' })
    .optional(),
  REDSHANK_MAIL_FROM: text.default('Redshank <redshank@localhost>'),
});

export interface Config {
  readonly environment: 'production' | 'development' | 'test' | 'local';
  readonly port: number;
  readonly host: string;
  /** Without a slash at its end. */
  readonly publicUrl: string;
  readonly trustProxy: number;
  readonly database: { readonly app: string; readonly owner: string; readonly jobs: string };
  readonly data: string;
  readonly secrets: string;
  /** Where clips lie unless they lie in a bucket. */
  readonly uploads: string;
  /** Fill an empty database with the demo. */
  readonly demo: boolean;
  readonly demoPassword: string | undefined;
  readonly logLevel: string;
  readonly bucket:
    | { readonly name: string; readonly endpoint: string | undefined; readonly region: string }
    | undefined;
  readonly mail: { readonly smtpUrl: string | undefined; readonly from: string };
}

/** A setting that cannot be used. Its message names every such setting and what each must be. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';
}

/**
 * Reads the environment once. Unset and empty are the same.
 * @throws ConfigError
 */
export const readConfig = (env: NodeJS.ProcessEnv): Config => {
  const given = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ''));
  const result = schema.safeParse(given);
  if (!result.success) {
    const lines = result.error.issues.map((issue) => {
      const name = issue.path.join('.');
      return given[name] === undefined ? `${name} is not set` : `${name} ${issue.message}`;
    });
    throw new ConfigError(
      `Settings that cannot be used:\n${lines.map((line) => `  ${line}`).join('\n')}`,
    );
  }
  const read = result.data;
  const data = resolve(read.REDSHANK_DATA);
  const publicUrl = read.PUBLIC_URL ?? `http://${read.HOST}:${read.PORT}`;
  return {
    environment: read.NODE_ENV ?? 'local',
    port: read.PORT,
    host: read.HOST,
    publicUrl: publicUrl.replace(/\/+$/, ''),
    trustProxy: read.TRUST_PROXY,
    database: {
      app: read.DATABASE_URL,
      owner: read.DATABASE_OWNER_URL,
      jobs: read.DATABASE_JOBS_URL,
    },
    data,
    secrets: resolve(read.REDSHANK_SECRETS_DIR ?? join(data, 'secrets')),
    uploads: resolve(read.REDSHANK_UPLOADS ?? join(data, 'uploads')),
    demo: read.REDSHANK_DEMO ?? read.NODE_ENV !== 'production',
    demoPassword: read.REDSHANK_DEMO_PASSWORD,
    logLevel: read.REDSHANK_LOG ?? (read.NODE_ENV === 'production' ? 'info' : 'warn'),
    bucket: read.REDSHANK_S3_BUCKET
      ? {
          name: read.REDSHANK_S3_BUCKET,
          endpoint: read.REDSHANK_S3_ENDPOINT,
          region: read.REDSHANK_S3_REGION,
        }
      : undefined,
    mail: { smtpUrl: read.REDSHANK_SMTP_URL, from: read.REDSHANK_MAIL_FROM },
  };
};
