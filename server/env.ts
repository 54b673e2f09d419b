import * as z from 'zod';

const flag = z.enum(['0', '1']).transform((value) => value === '1');
const optionalUrl = z.preprocess((value) => (value === '' ? undefined : value), z.url().optional());

const schema = z.object({
  NODE_ENV: z.string().default('production'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4200),
  HOST: z.string().default('127.0.0.1'),
  DATABASE_URL: z.url({ error: 'DATABASE_URL is not set: give the URL of the application role' }),
  DATABASE_OWNER_URL: optionalUrl,
  SILLSTONE_DEMO: flag.default(false),
  SILLSTONE_DEMO_FORCE: flag.default(false),
  SILLSTONE_CLIENT_DIR: z.string().default('dist/client'),
  SESSION_SECRET: z.string().min(32, 'SESSION_SECRET must have at least 32 characters'),
  DOI_RESOLVER_URL: optionalUrl,
  PUBLIC_URL: optionalUrl,
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

export interface Environment {
  development: boolean;
  port: number;
  host: string;
  databaseUrl: string;
  databaseOwnerUrl: string | undefined;
  demonstration: boolean;
  clientDir: string;
  sessionSecret: string;
  doiResolverUrl: string | undefined;
  publicUrl: string | undefined;
  logLevel: string;
}

const loopback = new Set(['127.0.0.1', '::1', 'localhost']);

/**
 * Reads and checks the environment: the only place that does.
 * @throws Error that lists every fault at once, in words for whoever starts the server.
 */
export function readEnvironment(source: NodeJS.ProcessEnv = process.env): Environment {
  const parsed = schema.safeParse(source);
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not right:\n${faults.join('\n')}`);
  }
  const env = parsed.data;
  if (env.SILLSTONE_DEMO && !env.SILLSTONE_DEMO_FORCE && !loopback.has(env.HOST)) {
    throw new Error('Demonstration mode has known passwords and answers on loopback only. Set SILLSTONE_DEMO=0 for a real deployment, or HOST=127.0.0.1.');
  }
  if (!env.SILLSTONE_DEMO && new Set(env.SESSION_SECRET).size < 8) throw new Error('SESSION_SECRET looks like a placeholder: give a long random text.');
  if (env.DATABASE_OWNER_URL && new URL(env.DATABASE_OWNER_URL).username === new URL(env.DATABASE_URL).username) {
    throw new Error('DATABASE_URL and DATABASE_OWNER_URL name the same role: the application must not run as the owner of the tables.');
  }
  return {
    development: env.NODE_ENV === 'development',
    port: env.PORT,
    host: env.HOST,
    databaseUrl: env.DATABASE_URL,
    databaseOwnerUrl: env.DATABASE_OWNER_URL,
    demonstration: env.SILLSTONE_DEMO,
    clientDir: env.SILLSTONE_CLIENT_DIR,
    sessionSecret: env.SESSION_SECRET,
    doiResolverUrl: env.DOI_RESOLVER_URL,
    publicUrl: env.PUBLIC_URL,
    logLevel: env.LOG_LEVEL,
  };
}

/** The environment for a program's own start: what is wrong with it is printed, without a trace of calls, and the program ends. */
export function environmentOrExit(): Environment {
  try {
    return readEnvironment();
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  }
}
