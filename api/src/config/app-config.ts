import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { TileLayer } from '@furrowlight/shared/contract/config';
import { z } from 'zod';

const root = path.resolve(import.meta.dirname, '../../..');

const flag = (fallback: boolean) =>
  z
    .enum(['true', 'false'], 'must be true or false')
    .transform((text) => text === 'true')
    .default(fallback);

/** OpenStreetMap's standard tiles, under their usage policy with attribution. */
const DEFAULT_TILES = [
  {
    name: 'OpenStreetMap',
    url: 'https://tile.openstreetmap.org/{z}/{x}/{y}.png',
    attribution: '© OpenStreetMap contributors',
    maxZoom: 19,
  },
];

const tiles = z
  .string()
  .transform((text, context) => {
    try {
      return JSON.parse(text) as unknown;
    } catch {
      context.addIssue({ code: 'custom', message: 'must be a JSON list of tile layers' });
      return z.NEVER;
    }
  })
  .pipe(z.array(TileLayer))
  .default(DEFAULT_TILES);

const Environment = z.object({
  NODE_ENV: z.string().default('production'),
  PORT: z.coerce.number('must be a port number').int().min(0).max(65535).default(4180),
  HOST: z.string().default('0.0.0.0'),
  DATA_DIR: z.string().min(1).default('data'),
  WEB_DIR: z.string().min(1).default('web/dist'),
  PUBLIC_URL: z
    .url({ protocol: /^https?$/, error: 'must be a web address such as https://light.example.org' })
    .optional(),
  COOKIE_SECURE: z.enum(['auto', 'true', 'false'], 'must be auto, true or false').default('auto'),
  JWT_SECRET: z.string().min(32, 'must have at least 32 characters').optional(),
  TILE_LAYERS: tiles,
  TRUST_PROXY: z.coerce.number('must be the number of proxies in front').int().min(0).default(0),
  LOG_LEVEL: z
    .enum(
      ['silent', 'error', 'warn', 'info', 'debug'],
      'must be silent, error, warn, info or debug',
    )
    .default('info'),
  PASSWORD_COST: z.coerce.number('must be 4 to 15').int().min(4).max(15).default(11),
  DEMO: flag(true),
});

/** Settings of the server, checked once at start. */
export class AppConfig {
  constructor(
    readonly port: number,
    readonly host: string,
    /** Folder of database, snapshots and secret. */
    readonly dataDir: string,
    /** Built web pages; may be absent in development. */
    readonly webDir: string,
    /** Address under which people reach the server, without trailing slash. */
    readonly publicUrl: string,
    readonly secureCookies: boolean,
    readonly jwtSecret: string,
    readonly tileLayers: readonly z.infer<typeof TileLayer>[],
    readonly trustedProxies: number,
    readonly logLevel: string,
    /** bcrypt's cost, base-2 logarithm of its rounds. */
    readonly passwordCost: number,
    /** May the demo cooperative show its sign-ins? */
    readonly demo: boolean,
  ) {}

  get databaseFile(): string {
    return path.join(this.dataDir, 'furrowlight.sqlite');
  }
}

/** A setting the server cannot start with. */
export class ConfigError extends Error {
  override readonly name = 'ConfigError';
}

/** The secret that signs sessions: kept beside the database, readable by the server alone. */
function keptSecret(dataDir: string): string {
  const file = path.join(dataDir, 'secret');
  if (!existsSync(file)) {
    writeFileSync(file, randomBytes(48).toString('base64url'), { mode: 0o600, flag: 'wx' });
  }
  const secret = readFileSync(file, 'utf8').trim();
  if (secret.length < 32) {
    throw new ConfigError(`The file ${file} is damaged: remove it and everyone signs in anew.`);
  }
  return secret;
}

/**
 * Read and check the server's settings.
 *
 * @param environment variables as in process.env; empty ones count as unset
 * @throws ConfigError naming each setting that is wrong and what it must be
 */
export function loadConfig(environment: NodeJS.ProcessEnv): AppConfig {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''));
  const parsed = Environment.safeParse(given);
  if (!parsed.success) {
    const lines = parsed.error.issues.map(
      (issue) => `${String(issue.path[0])} ${issue.message} (at ${issue.path.join('.')})`,
    );
    throw new ConfigError(`Furrowlight cannot start with these settings:\n${lines.join('\n')}`);
  }
  const settings = parsed.data;
  const dataDir = path.resolve(root, settings.DATA_DIR);
  mkdirSync(dataDir, { recursive: true, mode: 0o700 });
  const publicUrl = (settings.PUBLIC_URL ?? `http://localhost:${settings.PORT}`).replace(
    /\/+$/,
    '',
  );
  const secure =
    settings.COOKIE_SECURE === 'auto'
      ? publicUrl.startsWith('https:')
      : settings.COOKIE_SECURE === 'true';
  return new AppConfig(
    settings.PORT,
    settings.HOST,
    dataDir,
    path.resolve(root, settings.WEB_DIR),
    publicUrl,
    secure,
    settings.JWT_SECRET ?? keptSecret(dataDir),
    settings.TILE_LAYERS,
    settings.TRUST_PROXY,
    settings.LOG_LEVEL,
    settings.PASSWORD_COST,
    settings.DEMO,
  );
}
