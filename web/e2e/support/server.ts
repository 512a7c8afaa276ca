import { spawn, spawnSync, type ChildProcess } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { startTileServer } from '../../../demo-data/tile-server.mjs';

const root = path.resolve(import.meta.dirname, '../../..');

/** A running product over its own empty data folder. */
export interface Product {
  url: string;
  dataDir: string;
  /** Kill the server without warning and start it again on the same data and port. */
  crashAndRestart(): Promise<void>;
  stop(): Promise<void>;
}

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

async function untilReady(url: string, server: ChildProcess): Promise<void> {
  const deadline = Date.now() + 60_000;
  while (Date.now() < deadline) {
    if (server.exitCode !== null) throw new Error(`The server stopped with ${server.exitCode}.`);
    try {
      if ((await fetch(`${url}/api/health/readyz`)).ok) return;
    } catch {
      // Not listening yet.
    }
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error('The server was not ready within a minute.');
}

/** Start the built product on a free port, seeded with the demo, with local map tiles. */
export async function startProduct(): Promise<Product> {
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-e2e-'));
  const tiles = await startTileServer();
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    DATA_DIR: dataDir,
    PORT: String(port),
    PUBLIC_URL: url,
    TILE_LAYERS: JSON.stringify([
      { name: 'Drawn ground', url: tiles.url, attribution: 'Drawn for tests', maxZoom: 19 },
    ]),
  };
  const seeded = spawnSync('node', ['demo-data/seed.mjs'], { cwd: root, env, encoding: 'utf8' });
  if (seeded.status !== 0) throw new Error(`Seeding failed: ${seeded.stderr}${seeded.stdout}`);

  const launch = async () => {
    const child = spawn('node', ['api/dist/main.js'], { cwd: root, env, stdio: 'ignore' });
    await untilReady(url, child);
    return child;
  };
  let server = await launch();

  const end = (signal: NodeJS.Signals) =>
    new Promise<void>((resolve) => {
      server.once('exit', () => resolve());
      server.kill(signal);
    });

  return {
    url,
    dataDir,
    async crashAndRestart() {
      await end('SIGKILL');
      server = await launch();
    },
    async stop() {
      await end('SIGTERM');
      await tiles.close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
