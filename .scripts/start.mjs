// One command from a clean clone to the running product.
import { existsSync } from 'node:fs';
import path from 'node:path';
import { installPackages, must, requireTools, root, run } from './machine.mjs';

requireTools();
installPackages();
must('Building', 'npm', ['run', 'build', '--silent']);

const dataDir = path.resolve(root, process.env.DATA_DIR ?? 'data');
const env = { ...process.env, DATA_DIR: dataDir, NODE_ENV: process.env.NODE_ENV ?? 'production' };
// A data folder that exists belongs to someone: the demo is laid only into an empty one.
if (!existsSync(path.join(dataDir, 'furrowlight.sqlite')) && env.DEMO !== 'false') {
  must('Seeding the demo', 'node', ['demo-data/seed.mjs'], { env });
}
process.exit(run('node', ['api/dist/main.js'], { env }));
