import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { z } from 'zod';

const environment = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('production'),
  PORT: z.coerce.number().int().min(0).max(65535).default(8080),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATA_DIR: z.string().min(1).default('uploads'),
  WEB_DIR: z.string().min(1).default('dist'),
  SESSION_SECRET: z.string().min(32).optional(),
  SHEET_SECRET: z.string().min(32).optional(),
  SESSION_HOURS: z.coerce.number().positive().max(168).default(12),
  PUBLIC_ORIGIN: z.url().optional(),
  COOKIE_SECURE: z.enum(['true', 'false']).default('false'),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('warn'),
  DEMO: z.enum(['true', 'false']).default('true'),
  DEV_WEB_ORIGIN: z.url().optional(),
  STORAGE: z.enum(['local', 's3']).default('local'),
  S3_ENDPOINT: z.url().optional(),
  S3_REGION: z.string().min(1).default('us-east-1'),
  S3_BUCKET: z.string().min(3).optional(),
  S3_ACCESS_KEY_ID: z.string().min(1).optional(),
  S3_SECRET_ACCESS_KEY: z.string().min(1).optional(),
  S3_PATH_STYLE: z.enum(['true', 'false']).default('true'),
  KEEP_FREE_MB: z.coerce.number().int().min(0).default(500),
  SIGN_IN_TRIES: z.coerce.number().int().min(1).default(5),
});

type Environment = z.infer<typeof environment>;

/** A bucket for scans; null where they lie in the data folder. */
export interface BucketConfig {
  readonly endpoint: string | null;
  readonly region: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
  readonly usesPathStyle: boolean;
}

function bucketOf(env: Environment): BucketConfig | null {
  if (env.STORAGE === 'local') return null;
  const { S3_BUCKET: bucket, S3_ACCESS_KEY_ID: accessKeyId, S3_SECRET_ACCESS_KEY: secretAccessKey } = env;
  if (!bucket || !accessKeyId || !secretAccessKey) throw new Error('The environment is not usable:\n  STORAGE: s3 needs S3_BUCKET, S3_ACCESS_KEY_ID and S3_SECRET_ACCESS_KEY.\nEvery variable is described in .env.example.');
  return { endpoint: env.S3_ENDPOINT ?? null, region: env.S3_REGION, bucket, accessKeyId, secretAccessKey, usesPathStyle: env.S3_PATH_STYLE === 'true' };
}

export interface Config {
  readonly mode: 'development' | 'production' | 'test';
  readonly port: number;
  readonly host: string;
  readonly dataDir: string;
  readonly webDir: string;
  readonly sessionSecret: string;
  /** Keys the check of printed codes: sheets printed under one are not known under another. */
  readonly sheetSecret: string;
  readonly sessionMs: number;
  readonly publicOrigin: string | null;
  readonly cookieSecure: boolean;
  readonly logLevel: string;
  readonly demo: boolean;
  /** While developing: where Metro serves the web app, which this server passes on. */
  readonly devWebOrigin: string | null;
  readonly bucket: BucketConfig | null;
  /** What uploads leave free on the disk of the data folder. */
  readonly keepFreeBytes: number;
  /** Refused sign-ins a quarter of an hour before the next waits. */
  readonly signInTries: number;
}

/** A secret of this installation, made in the data folder on first start. */
function installationSecret(dataDir: string, name: string): string {
  const file = join(dataDir, name);
  if (!existsSync(file)) writeFileSync(file, randomBytes(48).toString('base64url'), { mode: 0o600 });
  return readFileSync(file, 'utf8');
}

/** Checks the environment, the only reader of it. Throws one sentence for each variable that is wrong. */
export function readConfig(variables: NodeJS.ProcessEnv = process.env): Config {
  const filled = Object.fromEntries(Object.entries(variables).filter(([, value]) => value !== ''));
  const parsed = environment.safeParse(filled);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not usable:\n${lines.join('\n')}\nEvery variable is described in .env.example.`);
  }
  const env = parsed.data;
  const dataDir = resolve(env.DATA_DIR);
  mkdirSync(dataDir, { recursive: true });
  return {
    mode: env.NODE_ENV,
    port: env.PORT,
    host: env.HOST,
    dataDir,
    webDir: resolve(env.WEB_DIR),
    sessionSecret: env.SESSION_SECRET ?? installationSecret(dataDir, 'session-secret'),
    sheetSecret: env.SHEET_SECRET ?? installationSecret(dataDir, 'sheet-secret'),
    sessionMs: env.SESSION_HOURS * 3_600_000,
    publicOrigin: env.PUBLIC_ORIGIN ?? null,
    cookieSecure: env.COOKIE_SECURE === 'true',
    logLevel: env.LOG_LEVEL,
    demo: env.DEMO === 'true',
    devWebOrigin: env.NODE_ENV === 'development' ? (env.DEV_WEB_ORIGIN ?? null) : null,
    bucket: bucketOf(env),
    keepFreeBytes: env.KEEP_FREE_MB * 1024 * 1024,
    signInTries: env.SIGN_IN_TRIES,
  };
}
