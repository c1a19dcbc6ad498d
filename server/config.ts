import * as z from 'zod';

/** The environment as the server understands it; anything wrong stops the start with the name of the variable. */
const environment = z.object({
  WAKELEDGER_MODE: z.enum(['production', 'development', 'test']).default('production'),
  HOST: z.string().default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65535).default(4300),
  DATABASE_URL_TENANT: z.string().min(1),
  DATABASE_URL_PLATFORM: z.string().min(1),
  DATABASE_CONNECTIONS: z.coerce.number().int().min(1).max(100).default(10),
  SESSION_SECRET: z.string().min(32),
  /** Comma-separated origins under which the product is reached; the first is the one that links use. */
  PUBLIC_ORIGINS: z.string().optional(),
  /** How many proxies in front add X-Forwarded headers; 0 believes none. */
  TRUSTED_PROXIES: z.coerce.number().int().min(0).max(5).default(0),
  DEMO: z.enum(['0', '1']).default('0'),
  CLIENT_DIRECTORY: z.string().optional(),
  LOG_LEVEL: z.enum(['silent', 'fatal', 'error', 'warn', 'info', 'debug']).default('info'),
});

export interface Config {
  readonly mode: 'production' | 'development' | 'test';
  readonly host: string;
  readonly port: number;
  readonly tenantUrl: string;
  readonly platformUrl: string;
  readonly databaseConnections: number;
  readonly sessionSecret: string;
  readonly publicOrigins: readonly string[];
  /** Whether the first public origin is https: cookies are then Secure. */
  readonly secure: boolean;
  readonly trustedProxies: number;
  readonly demo: boolean;
  readonly clientDirectory: string | undefined;
  readonly logLevel: 'silent' | 'fatal' | 'error' | 'warn' | 'info' | 'debug';
}

/** @throws {Error} naming every variable that is missing or wrong */
export function readConfig(env: Readonly<Record<string, string | undefined>>): Config {
  const parsed = environment.safeParse(env);
  if (!parsed.success) {
    const wrong = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not complete.\n${wrong.join('\n')}`);
  }
  const e = parsed.data;
  const publicOrigins = e.PUBLIC_ORIGINS
    ? e.PUBLIC_ORIGINS.split(',').map((origin) => new URL(origin.trim()).origin)
    : [`http://127.0.0.1:${e.PORT}`, `http://localhost:${e.PORT}`];
  return {
    mode: e.WAKELEDGER_MODE,
    host: e.HOST,
    port: e.PORT,
    tenantUrl: e.DATABASE_URL_TENANT,
    platformUrl: e.DATABASE_URL_PLATFORM,
    databaseConnections: e.DATABASE_CONNECTIONS,
    sessionSecret: e.SESSION_SECRET,
    publicOrigins,
    secure: publicOrigins[0]?.startsWith('https://') ?? false,
    trustedProxies: e.TRUSTED_PROXIES,
    demo: e.DEMO === '1',
    clientDirectory: e.CLIENT_DIRECTORY,
    logLevel: e.LOG_LEVEL,
  };
}
