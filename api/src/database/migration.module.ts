import { Module } from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { AppConfig } from '../config/app-config.js';
import { migrate } from './migrate.js';

/** The database file once it has this program's schema; connections wait for it. */
export class MigratedFile {
  constructor(readonly path: string) {}
}

@Module({
  providers: [
    {
      provide: MigratedFile,
      inject: [AppConfig, Clock],
      useFactory: async (config: AppConfig, clock: Clock) => {
        await migrate(config.databaseFile, clock.now());
        return new MigratedFile(config.databaseFile);
      },
    },
  ],
  exports: [MigratedFile],
})
export class MigrationModule {}
