import 'reflect-metadata';
import { createApp } from './app.js';
import { ConfigError, loadConfig } from './config/app-config.js';
import { CooperativesService } from './cooperatives/cooperatives.service.js';
import { MigrationError } from './database/migrate.js';

async function start(): Promise<void> {
  const config = loadConfig(process.env);
  const app = await createApp(config);
  await app.listen(config.port, config.host);
  process.stdout.write(`Furrowlight is at ${config.publicUrl}\n`);
  const accounts = config.demo ? await app.get(CooperativesService).demoAccounts() : [];
  for (const { role, email, password } of accounts) {
    process.stdout.write(`  demo ${role}: ${email}, password ${password}\n`);
  }
}

start().catch((error: unknown) => {
  const expected = error instanceof ConfigError || error instanceof MigrationError;
  const text = expected ? error.message : error instanceof Error ? error.stack : String(error);
  process.stderr.write(`${text}\n`);
  process.exit(1);
});
