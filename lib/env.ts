/**
 * The settings, read once from the environment and checked at start. A wrong one is named together with what
 * would be right. Only what starts or builds the program reads `process.env` besides.
 */
import { BlockList, isIP } from 'node:net';
import path from 'node:path';
import { z } from 'zod';

const LOG_LEVELS = ['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'] as const;

const flag = z
  .enum(['', '0', '1'], { error: 'must be 1 (on) or 0 (off)' })
  .transform((value) => value === '1');

const settings = z
  .object({
    PORT: z
      .string()
      .regex(/^\d{1,5}$/, 'must be a port number from 0 to 65535, for example 3000')
      .transform(Number)
      .refine((port) => port <= 65535, 'must be a port number from 0 to 65535, for example 3000')
      .default(3000),
    HOST: z
      .string()
      .regex(/^[A-Za-z0-9.:_-]+$/, 'must be a host name or an address to listen on, for example 127.0.0.1')
      .default('127.0.0.1'),
    CURVEKEEP_DATA_DIR: z.string().min(1, 'must be a folder, for example ./data').default('./data'),
    DATABASE_URL: z
      .string()
      .regex(/^(file:.|libsql:\/\/.|https?:\/\/.|wss?:\/\/.)/, 'must start with file:, libsql:// or https://')
      .optional(),
    DATABASE_AUTH_TOKEN: z.string().min(1, 'must not be empty where it is set').optional(),
    APP_URL: z
      .string()
      .refine(
        isOrigin,
        'must be an http or https address without a path, for example https://curves.example.org',
      )
      .optional(),
    LOG_LEVEL: z.enum(LOG_LEVELS, { error: `must be one of ${LOG_LEVELS.join(', ')}` }).default('info'),
    TRUSTED_PROXIES: z
      .string()
      .default('')
      .transform((value) =>
        value
          .split(',')
          .map((part) => part.trim())
          .filter((part) => part !== ''),
      )
      .refine(
        (parts) => parts.every((part) => addressRange(part) !== null),
        'must list addresses or ranges with commas between, for example 10.0.0.1, 192.168.0.0/16',
      ),
    CURVEKEEP_DEMO: flag.default(false),
    S3_ENDPOINT: z
      .string()
      .regex(/^https?:\/\/[^/]/, 'must be the address of an S3 service, for example https://s3.example.org')
      .optional(),
    S3_BUCKET: z
      .string()
      .regex(
        /^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/,
        'must be 3 to 63 lower-case letters, digits, dots or hyphens',
      )
      .default('curvekeep'),
    S3_REGION: z.string().min(1, 'must be a region, for example us-east-1').default('us-east-1'),
    S3_ACCESS_KEY_ID: z.string().default(''),
    S3_SECRET_ACCESS_KEY: z.string().default(''),
    npm_lifecycle_event: z.string().optional(),
  })
  .refine((data) => data.S3_ENDPOINT === undefined || (data.S3_ACCESS_KEY_ID && data.S3_SECRET_ACCESS_KEY), {
    path: ['S3_ENDPOINT'],
    error: 'needs S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY beside it',
  });

export interface Env {
  port: number;
  host: string;
  /** absolute path of the folder in which everything is written */
  dataDir: string;
  databaseUrl: string;
  databaseAuthToken: string | undefined;
  /** origin under which people reach the site, without a trailing slash */
  appUrl: string;
  logLevel: (typeof LOG_LEVELS)[number];
  trustedProxies: BlockList;
  /** the demonstration: limits ten times higher */
  demo: boolean;
  s3: S3Settings;
  /** `npm run …` started this process */
  startedByNpm: boolean;
}

export interface S3Settings {
  /** address of the service; undefined: a local store in the data folder, started with the application */
  endpoint: string | undefined;
  bucket: string;
  region: string;
  accessKeyId: string;
  secretAccessKey: string;
}

export type EnvResult = { ok: true; env: Env } | { ok: false; problems: string[] };

/** Settings from a set of variables; where some are wrong, one sentence for each. */
export function readEnv(variables: Record<string, string | undefined>): EnvResult {
  const parsed = settings.safeParse(variables);
  if (!parsed.success) {
    const problems = parsed.error.issues.map((issue) => `${issue.path.join('.')} ${issue.message}.`);
    return { ok: false, problems: [...new Set(problems)] };
  }
  const { data } = parsed;
  const dataDir = path.resolve(/* turbopackIgnore: true */ data.CURVEKEEP_DATA_DIR);
  return {
    ok: true,
    env: {
      port: data.PORT,
      host: data.HOST,
      dataDir,
      databaseUrl: data.DATABASE_URL ?? `file:${path.join(dataDir, 'curvekeep.db')}`,
      databaseAuthToken: data.DATABASE_AUTH_TOKEN,
      appUrl: new URL(data.APP_URL ?? `http://localhost:${data.PORT}`).origin,
      logLevel: data.LOG_LEVEL,
      trustedProxies: blockListOf(data.TRUSTED_PROXIES),
      demo: data.CURVEKEEP_DEMO,
      s3: s3Settings(data),
      startedByNpm: data.npm_lifecycle_event !== undefined,
    },
  };
}

let cached: Env | undefined;

/**
 * The settings of this process.
 *
 * @throws {Error} with one sentence per wrong setting
 */
export function env(): Env {
  if (cached) return cached;
  const result = readEnv(process.env);
  if (!result.ok) throw new Error(result.problems.join('\n'));
  cached = result.env;
  return cached;
}

/** The settings of this process; where one is wrong, says which and what would be right, and ends with code 1. */
export function checkEnvOrExit(): Env {
  const result = readEnv(process.env);
  if (result.ok) return env();
  process.stderr.write(`${result.problems.join('\n')}\n`);
  process.exit(1);
}

function s3Settings(data: z.infer<typeof settings>): S3Settings {
  return {
    endpoint: data.S3_ENDPOINT,
    bucket: data.S3_BUCKET,
    region: data.S3_REGION,
    accessKeyId: data.S3_ACCESS_KEY_ID,
    secretAccessKey: data.S3_SECRET_ACCESS_KEY,
  };
}

function isOrigin(value: string): boolean {
  const url = URL.canParse(value) ? new URL(value) : null;
  if (url === null || !['http:', 'https:'].includes(url.protocol)) return false;
  return url.pathname === '/' && url.search === '' && url.hash === '' && url.username === '';
}

function addressRange(text: string): { address: string; bits: number; family: 'ipv4' | 'ipv6' } | null {
  const [address = '', bitsText] = text.split('/');
  const version = isIP(address);
  if (version === 0) return null;
  const most = version === 4 ? 32 : 128;
  const bits = bitsText === undefined ? most : Number(bitsText);
  if (!Number.isInteger(bits) || bits < 0 || bits > most || bitsText === '') return null;
  return { address, bits, family: version === 4 ? 'ipv4' : 'ipv6' };
}

function blockListOf(ranges: string[]): BlockList {
  const list = new BlockList();
  for (const range of ranges.map(addressRange)) {
    if (range) list.addSubnet(range.address, range.bits, range.family);
  }
  return list;
}
