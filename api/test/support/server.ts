import 'reflect-metadata';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Server } from 'node:http';
import type { NestExpressApplication } from '@nestjs/platform-express';
import { createApp } from '../../src/app.js';
import { Clock } from '../../src/common/clock.js';
import { loadConfig } from '../../src/config/app-config.js';
import { Visitor } from './visitor.js';

export const PUBLIC_URL = 'https://light.example.org';

/** A whole server over its own empty database in a temporary folder. */
export interface TestServer {
  app: NestExpressApplication;
  dataDir: string;
  http: Server;
  /** Someone nobody knows yet. */
  visitor(): Visitor;
  /** Stop the clock at an instant, or move it on from there. */
  setNow(now: Date): void;
  close(): Promise<void>;
}

/** Pages as a build leaves them, small enough to read. */
function writePages(folder: string): void {
  mkdirSync(path.join(folder, 'assets'), { recursive: true });
  writeFileSync(path.join(folder, 'index.html'), '<title>app</title>');
  writeFileSync(path.join(folder, 'assets', 'app-1a2b.js'), 'export {};');
}

export async function startServer(settings: Record<string, string> = {}): Promise<TestServer> {
  const dataDir = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-api-'));
  const webDir = path.join(dataDir, 'web');
  writePages(webDir);
  const config = loadConfig({
    DATA_DIR: dataDir,
    WEB_DIR: webDir,
    PUBLIC_URL,
    LOG_LEVEL: 'silent',
    PASSWORD_COST: '4',
    JWT_SECRET: 'a secret for tests that is long enough to sign with',
    ...settings,
  });
  const app = await createApp(config);
  await app.init();
  const http: Server = app.getHttpServer();
  await new Promise<void>((resolve) => http.listen(0, '127.0.0.1', resolve));
  const clock = app.get(Clock);
  return {
    app,
    dataDir,
    http,
    visitor: () => new Visitor(http, config.publicUrl),
    setNow: (now) => {
      clock.now = () => new Date(now);
    },
    close: async () => {
      await app.close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
}
