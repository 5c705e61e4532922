import * as z from 'zod';

/**
 * All configuration is environment variables, read and checked once at start. Development has usable defaults for what
 * is harmless; in production every secret and address must be given.
 */
const port = z.coerce.number().int().min(1).max(65535);

const schema = z.object({
  BOOKMATCH_MODE: z.enum(['development', 'test', 'production']).default('production'),
  BOOKMATCH_HOST: z.string().default('127.0.0.1'),
  BOOKMATCH_PORT: port.default(4310),
  BOOKMATCH_ORIGIN: z.url(),
  BOOKMATCH_TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  BOOKMATCH_WEB_ROOT: z.string().default(''),
  BOOKMATCH_SECRET: z.string().min(32, 'needs at least 32 characters'),
  BOOKMATCH_LOG_LEVEL: z.enum(['silent', 'fatal', 'error', 'warn', 'info', 'debug']).default('info'),
  BOOKMATCH_DB_HOST: z.string().default('127.0.0.1'),
  BOOKMATCH_DB_PORT: port.default(3306),
  BOOKMATCH_DB_NAME: z.string().regex(/^\w+$/),
  BOOKMATCH_DB_USER: z.string(),
  BOOKMATCH_DB_PASSWORD: z.string(),
  BOOKMATCH_DB_POOL: z.coerce.number().int().min(2).max(200).default(16),
  BOOKMATCH_FILES_DIR: z.string(),
  BOOKMATCH_MAIL_HOST: z.string(),
  BOOKMATCH_MAIL_PORT: port,
  BOOKMATCH_MAIL_USER: z.string().default(''),
  BOOKMATCH_MAIL_PASSWORD: z.string().default(''),
  BOOKMATCH_MAIL_TLS: z.enum(['required', 'off']).default('required'),
  BOOKMATCH_MAIL_FROM: z.string(),
  BOOKMATCH_PAYMENTS_KEY: z.string(),
  BOOKMATCH_PAYMENTS_WEBHOOK_SECRET: z.string().min(8),
  BOOKMATCH_PAYMENTS_PRICE: z.string(),
  /** Where the payments fake listens, as http://host:port. Empty in production: the SDK's own address. */
  BOOKMATCH_PAYMENTS_API: z.union([z.literal(''), z.url()]).default(''),
});

export type Config = {
  mode: 'development' | 'test' | 'production';
  host: string;
  port: number;
  origin: string;
  trustedProxies: number;
  webRoot: string;
  secret: string;
  logLevel: string;
  database: DatabaseConfig;
  filesDir: string;
  mail: { host: string; port: number; user: string; password: string; tls: boolean; from: string };
  payments: { key: string; webhookSecret: string; price: string; api: string };
};
export type DatabaseConfig = {
  host: string;
  port: number;
  name: string;
  user: string;
  password: string;
  pool: number;
};

/** Reads the environment. Throws with one line a variable that is missing or wrong, never with its value. */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const parsed = schema.safeParse(env);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The configuration is not complete:\n${lines.join('\n')}`);
  }
  const value = parsed.data;
  if (value.BOOKMATCH_MODE === 'production') refuseTestSettings(value);
  return {
    mode: value.BOOKMATCH_MODE,
    host: value.BOOKMATCH_HOST,
    port: value.BOOKMATCH_PORT,
    origin: new URL(value.BOOKMATCH_ORIGIN).origin,
    trustedProxies: value.BOOKMATCH_TRUSTED_PROXIES,
    webRoot: value.BOOKMATCH_WEB_ROOT,
    secret: value.BOOKMATCH_SECRET,
    logLevel: value.BOOKMATCH_LOG_LEVEL,
    database: databaseConfig(value),
    filesDir: value.BOOKMATCH_FILES_DIR,
    mail: {
      host: value.BOOKMATCH_MAIL_HOST,
      port: value.BOOKMATCH_MAIL_PORT,
      user: value.BOOKMATCH_MAIL_USER,
      password: value.BOOKMATCH_MAIL_PASSWORD,
      tls: value.BOOKMATCH_MAIL_TLS === 'required',
      from: value.BOOKMATCH_MAIL_FROM,
    },
    payments: {
      key: value.BOOKMATCH_PAYMENTS_KEY,
      webhookSecret: value.BOOKMATCH_PAYMENTS_WEBHOOK_SECRET,
      price: value.BOOKMATCH_PAYMENTS_PRICE,
      api: value.BOOKMATCH_PAYMENTS_API,
    },
  };
}

function databaseConfig(value: z.infer<typeof schema>): DatabaseConfig {
  return {
    host: value.BOOKMATCH_DB_HOST,
    port: value.BOOKMATCH_DB_PORT,
    name: value.BOOKMATCH_DB_NAME,
    user: value.BOOKMATCH_DB_USER,
    password: value.BOOKMATCH_DB_PASSWORD,
    pool: value.BOOKMATCH_DB_POOL,
  };
}

function refuseTestSettings(value: z.infer<typeof schema>): void {
  const faults: string[] = [];
  if (!value.BOOKMATCH_ORIGIN.startsWith('https://')) faults.push('BOOKMATCH_ORIGIN must be https');
  if (value.BOOKMATCH_PAYMENTS_API !== '') faults.push('BOOKMATCH_PAYMENTS_API is for tests only');
  if (value.BOOKMATCH_MAIL_TLS === 'off') faults.push('BOOKMATCH_MAIL_TLS must be required');
  if (faults.length > 0)
    throw new Error(`The configuration is not fit for production:\n  ${faults.join('\n  ')}`);
}
