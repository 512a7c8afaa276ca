import 'reflect-metadata';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { createApp } from '../app.js';
import { openApiDocument } from '../common/openapi.js';
import { loadConfig } from '../config/app-config.js';

/** Prints the OpenAPI document; nothing of the real data is touched. */
const dataDir = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-openapi-'));
try {
  const config = loadConfig({ DATA_DIR: dataDir, LOG_LEVEL: 'silent', PASSWORD_COST: '4' });
  const app = await createApp(config);
  await app.init();
  process.stdout.write(`${JSON.stringify(openApiDocument(app), null, 2)}\n`);
  await app.close();
} finally {
  rmSync(dataDir, { recursive: true, force: true });
}
