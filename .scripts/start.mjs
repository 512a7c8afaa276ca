// One command from a clean clone to the running product.
import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import path from 'node:path';
import { startTileServer } from '../demo-data/tile-server.mjs';
import { installPackages, must, requireTools, root } from './machine.mjs';

/** The server's own default (api/src/config), kept first beside the demo's ground. */
const ONLINE_TILES = {
  name: 'OpenStreetMap',
  url: 'https://tile.openstreetmap.org/{z}/{x}/{y}.png',
  attribution: '© OpenStreetMap contributors',
  maxZoom: 19,
};

requireTools();
installPackages();
must('Building', 'npm', ['run', 'build', '--silent']);

const dataDir = path.resolve(root, process.env.DATA_DIR ?? 'data');
const env = { ...process.env, DATA_DIR: dataDir, NODE_ENV: process.env.NODE_ENV ?? 'production' };
// A data folder that exists belongs to someone: the demo is laid only into an empty one.
if (!existsSync(path.join(dataDir, 'furrowlight.sqlite')) && env.DEMO !== 'false') {
  must('Seeding the demo', 'node', ['demo-data/seed.mjs'], { env });
}
// Without settings of its own the demo map can be switched to ground drawn on this machine, which
// needs no network.
if (!env.TILE_LAYERS && env.DEMO !== 'false') {
  const tiles = await startTileServer(Number(env.PORT ?? 4180) + 1).catch(() => null);
  if (tiles) {
    env.TILE_LAYERS = JSON.stringify([
      ONLINE_TILES,
      { name: 'Drawn ground', url: tiles.url, attribution: 'Drawn for the demo', maxZoom: 19 },
    ]);
  }
}

const server = spawn('node', ['api/dist/main.js'], { cwd: root, stdio: 'inherit', env });
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => server.kill(signal));
server.on('exit', (code) => process.exit(code ?? 1));
