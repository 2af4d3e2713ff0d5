import { z } from 'zod';

const flag = z
  .enum(['0', '1', 'off', 'on', 'false', 'true'])
  .transform((word) => word === '1' || word === 'on' || word === 'true');

const schema = z.object({
  DATABASE_URL: z
    .string()
    .regex(/^(file:|libsql:|https?:|wss?:)\S+$/, 'must start with file:, libsql:, https: or wss:')
    .default('file:.data/antiphon.db'),
  DATABASE_AUTH_TOKEN: z.string().optional(),
  PORT: z.coerce.number().int().min(1).max(65535).default(3000),
  ANTIPHON_DEMO: flag.optional(),
  ANTIPHON_NOW: z.iso.datetime({ error: 'must be an instant such as 2027-02-10T14:32:00Z' }).optional(),
  COOKIE_SECURE: flag.default(false),
  TRUST_PROXY: flag.default(false),
  APP_URL: z.url({ error: 'must be an address such as https://plan.example' }).optional(),
  RESEND_API_KEY: z.string().optional(),
  MAIL_URL: z.url({ error: 'must be an address such as http://127.0.0.1:4797' }).optional(),
  MAIL_FROM: z.string().min(3).default('Antiphon <notices@antiphon.example>'),
  LOG_LEVEL: z.enum(['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent']).default('info'),
});

export type Env = {
  databaseUrl: string;
  databaseAuthToken: string | undefined;
  isLocalFile: boolean;
  port: number;
  isDemo: boolean;
  /** the instant the server's clock started from, or null for the real time */
  startInstantMs: number | null;
  isCookieSecure: boolean;
  trustsProxy: boolean;
  logLevel: string;
  /** where people reach the application; without a slash at the end */
  appUrl: string;
  /** the provider's key; null while the local fake stands for it */
  mailKey: string | null;
  /** where the local fake listens; null is none */
  mailUrl: string | null;
  mailFrom: string;
};

class EnvError extends Error {
  override name = 'EnvError';
}

export function readEnv(source: Readonly<Record<string, string | undefined>>): Env {
  const given = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''));
  const parsed = schema.safeParse(given);
  if (!parsed.success) {
    const [issue] = parsed.error.issues;
    const name = String(issue?.path[0] ?? 'The environment');
    throw new EnvError(`${name} is "${source[name] ?? ''}": ${issue?.message ?? 'not understood'}.`);
  }
  const values = parsed.data;
  const isLocalFile = values.DATABASE_URL.startsWith('file:');
  if (values.ANTIPHON_DEMO && !isLocalFile) {
    throw new EnvError(
      'ANTIPHON_DEMO is on and DATABASE_URL is a remote database: the demo, whose passwords are known to all, runs on a local file only.',
    );
  }
  const isDemo = values.ANTIPHON_DEMO ?? isLocalFile;
  if (values.ANTIPHON_NOW !== undefined && !isDemo) {
    throw new EnvError(
      'ANTIPHON_NOW is set without the demo: a real installation runs on the real time. Take it out, or set ANTIPHON_DEMO=1 on a local file.',
    );
  }
  return {
    databaseUrl: values.DATABASE_URL,
    databaseAuthToken: values.DATABASE_AUTH_TOKEN,
    isLocalFile,
    port: values.PORT,
    isDemo,
    startInstantMs: values.ANTIPHON_NOW === undefined ? null : Date.parse(values.ANTIPHON_NOW),
    isCookieSecure: values.COOKIE_SECURE,
    trustsProxy: values.TRUST_PROXY,
    logLevel: values.LOG_LEVEL,
    appUrl: (values.APP_URL ?? `http://localhost:${values.PORT}`).replace(/\/$/, ''),
    mailKey: values.RESEND_API_KEY ?? null,
    mailUrl: values.MAIL_URL ?? null,
    mailFrom: values.MAIL_FROM,
  };
}

let known: Env | undefined;

export const env = (): Env => (known ??= readEnv(process.env));

/** The server's one clock: real time, or ANTIPHON_NOW plus the time since this process started. */
export function nowMs(): number {
  const { startInstantMs } = env();
  return startInstantMs === null ? Date.now() : startInstantMs + Math.round(performance.now());
}
