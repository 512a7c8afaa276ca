import { spawn, type ChildProcess } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import Sqlite from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer } from './support/server.js';
import { foundCooperative, PASSWORD } from './support/world.js';

const MAIN = path.resolve(import.meta.dirname, '../dist/main.js');
/** More by hand: KILLS=200 npx vitest run test/durability.test.ts */
const KILLS = Number(process.env.KILLS ?? 6);
/** Acknowledged writes to wait for before a kill, so that each falls among writes. */
const WARM = 10;
const WRITERS = 4;
const SECRET = 'a secret for tests that is long enough to sign with';

let dataDir: string;
let port: number;
let cookie: string;

async function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() =>
        address && typeof address === 'object' ? resolve(address.port) : reject(),
      );
    });
  });
}

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));
const url = (address: string) => `http://127.0.0.1:${port}${address}`;

async function launch(): Promise<ChildProcess> {
  const settings = {
    DATA_DIR: dataDir,
    PORT: String(port),
    HOST: '127.0.0.1',
    PUBLIC_URL: url(''),
  };
  const env = { ...process.env, ...settings, JWT_SECRET: SECRET, LOG_LEVEL: 'silent' };
  const child = spawn(process.execPath, [MAIN], { env, stdio: 'ignore' });
  const deadline = Date.now() + 60_000;
  for (;;) {
    const ready = await fetch(url('/api/health/readyz')).then(
      (response) => response.ok,
      () => false,
    );
    if (ready) return child;
    if (child.exitCode !== null || Date.now() > deadline)
      throw new Error('The server did not start.');
    await pause(50);
  }
}

async function kill(child: ChildProcess): Promise<void> {
  const gone = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGKILL');
  await gone;
}

function post(address: string, body: unknown): Promise<Response> {
  return fetch(url(address), {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', Origin: url(''), Cookie: cookie },
    body: JSON.stringify(body),
  });
}

/** Add farms until the server is gone; what was acknowledged is told to `acknowledge`. */
async function write(name: string, acknowledge: (id: string) => void): Promise<void> {
  for (let i = 0; ; i += 1) {
    try {
      const response = await post('/api/farms', { name: `${name}-${i}`, holder: 'H' });
      if (response.status !== 201) throw new Error(`Refused with ${response.status}.`);
      acknowledge(((await response.json()) as { id: string }).id);
    } catch (error) {
      if (error instanceof TypeError || error instanceof SyntaxError) return;
      throw error;
    }
  }
}

describe.skipIf(!existsSync(MAIN))('kill -9 under writes (needs the built server)', () => {
  beforeAll(async () => {
    dataDir = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-kill-'));
    const server = await startServer({ DATA_DIR: dataDir });
    await foundCooperative(server, 'North');
    await server.app.close();
    port = await freePort();
    const child = await launch();
    const response = await post('/api/session', {
      email: 'admin@north.example',
      password: PASSWORD,
    });
    cookie = (response.headers.get('set-cookie') ?? '').split(';')[0];
    await kill(child);
  });
  afterAll(() => rmSync(dataDir, { recursive: true, force: true }));

  it(`loses no acknowledged write in ${KILLS} kills of the whole server`, async () => {
    const acknowledged: string[] = [];
    for (let round = 0; round < KILLS; round += 1) {
      const child = await launch();
      const writers = Array.from({ length: WRITERS }, (_, i) =>
        write(`r${round}-w${i}`, (id) => acknowledged.push(id)),
      );
      const before = acknowledged.length;
      while (acknowledged.length < before + WARM) await pause(5);
      await pause((round * 37) % 100);
      await kill(child);
      await Promise.all(writers);
    }
    const db = new Sqlite(path.join(dataDir, 'furrowlight.sqlite'));
    const stored = new Set(db.prepare('SELECT id FROM farms').pluck().all());
    expect(acknowledged.length).toBeGreaterThanOrEqual(KILLS * WARM);
    expect(acknowledged.filter((id) => !stored.has(id))).toEqual([]);
    // Every farm has its entry in the log, and no entry is without its farm.
    const logged = db
      .prepare(`SELECT COUNT(*) FROM audit_log WHERE subject_kind = 'farm' AND action = 'created'`)
      .pluck()
      .get();
    expect(logged).toBe(stored.size);
    expect(db.pragma('integrity_check', { simple: true })).toBe('ok');
    expect(db.pragma('foreign_key_check')).toEqual([]);
    db.close();
  }, 600_000);
});
