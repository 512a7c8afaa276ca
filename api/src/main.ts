import 'reflect-metadata';
import { createApp } from './app.js';
import { ConfigError, loadConfig } from './config/app-config.js';
import { MigrationError } from './database/migrate.js';

async function start(): Promise<void> {
  const config = loadConfig(process.env);
  const app = await createApp(config);
  await app.listen(config.port, config.host);
  process.stdout.write(`Furrowlight is at ${config.publicUrl}\n`);
}

start().catch((error: unknown) => {
  const expected = error instanceof ConfigError || error instanceof MigrationError;
  const text = expected ? error.message : error instanceof Error ? error.stack : String(error);
  process.stderr.write(`${text}\n`);
  process.exit(1);
});
