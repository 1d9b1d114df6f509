import { z } from 'zod';

/** Token under which the parsed environment is injected. */
export const ENVIRONMENT = Symbol('environment');

const port = z.coerce.number().int().min(0).max(65_535);
const list = z
  .string()
  .default('')
  .transform((text) =>
    text
      .split(',')
      .map((entry) => entry.trim())
      .filter((entry) => entry !== ''),
  );

const variables = z
  .object({
    /** `production` unless said; the three differ in how loud the log is and in nothing that a person notices. */
    NODE_ENV: z.enum(['production', 'development', 'test']).default('production'),
    /** PostgreSQL, as the unprivileged role `quarterpoise_app`. */
    DATABASE_URL: z.url({
      protocol: /^postgres(ql)?$/,
      error: 'must be an address such as postgresql://user@host/name',
    }),
    /** Connections of this process to PostgreSQL at most. */
    DATABASE_POOL_SIZE: z.coerce.number().int().min(1).max(200).default(10),
    /** Redis: sign-ins and their limits. */
    REDIS_URL: z.url({ protocol: /^rediss?$/, error: 'must be an address such as redis://host:6379' }),
    /** The address under which people reach the service; https makes cookies and headers strict. */
    PUBLIC_URL: z.url({ protocol: /^https?$/, error: 'must be an address such as https://statements.example.com' }),
    /** Address to listen on: loopback unless said. */
    HOST: z.string().min(1).default('127.0.0.1'),
    /** Port of the API and the web pages. */
    PORT: port.default(3000),
    /** Port of the Prometheus metrics, apart so that it need not be reachable from outside. */
    METRICS_PORT: port.default(9464),
    /** Signs the cookie of a sign-in. */
    SESSION_SECRET: z.string().min(32, 'must have at least 32 characters'),
    /** Addresses or networks, comma-separated, of proxies whose X-Forwarded headers are believed; nobody unless said. */
    TRUSTED_PROXIES: list,
    /** Folder of the built web pages; left out, the API serves no pages. */
    WEB_FOLDER: z.string().min(1).optional(),
    /** `1` lists the demo sign-ins on the sign-in page. Never where real people are. */
    DEMO: z.enum(['0', '1']).default('0'),
    /** JSON file that holds the demo sign-ins; needed when DEMO is 1. */
    DEMO_ACCOUNTS_FILE: z.string().min(1).optional(),
    /** Smallest level that is logged. */
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
  })
  .check(({ value, issues }) => {
    const fault = (name: string, message: string) =>
      issues.push({ code: 'custom', path: [name], message, input: value });
    if (value.DEMO === '1' && !value.DEMO_ACCOUNTS_FILE) {
      fault('DEMO_ACCOUNTS_FILE', 'must name the file of the demo sign-ins when DEMO is 1');
    }
    if (value.PUBLIC_URL.startsWith('https:') && value.TRUSTED_PROXIES.length === 0) {
      fault('TRUSTED_PROXIES', 'must name the proxy that speaks https when PUBLIC_URL is https');
    }
  });

export type Environment = ReturnType<typeof parseEnvironment>;

/**
 * Reads and checks the variables of this process; nothing else reads `process.env`.
 * @throws Error that lists every fault at once, by name and without the value.
 */
export function parseEnvironment(source: Readonly<Record<string, string | undefined>>) {
  const filled = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''));
  const parsed = variables.safeParse(filled);
  if (!parsed.success) {
    const lines = parsed.error.issues.map(({ path, message }) => {
      const name = String(path[0]);
      return `  ${name} ${filled[name] === undefined && !message.startsWith('must') ? 'is missing' : message}`;
    });
    throw new Error(`The environment of the API is not complete:\n${[...new Set(lines)].join('\n')}`);
  }
  const value = parsed.data;
  return {
    mode: value.NODE_ENV,
    database: { url: value.DATABASE_URL, poolSize: value.DATABASE_POOL_SIZE },
    redis: { url: value.REDIS_URL },
    http: {
      host: value.HOST,
      port: value.PORT,
      metricsPort: value.METRICS_PORT,
      publicOrigin: new URL(value.PUBLIC_URL).origin,
      isSecure: value.PUBLIC_URL.startsWith('https:'),
      trustedProxies: value.TRUSTED_PROXIES,
      webFolder: value.WEB_FOLDER ?? null,
    },
    session: { secret: value.SESSION_SECRET },
    demo: { accountsFile: value.DEMO === '1' ? (value.DEMO_ACCOUNTS_FILE ?? null) : null },
    log: { level: value.LOG_LEVEL },
  } as const;
}
