import { Global, Module } from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { AppConfig } from '../config/app-config.js';
import { readerSource, writerSource } from './connection.js';
import { Database } from './database.js';
import { migrate } from './migrate.js';

@Global()
@Module({
  providers: [
    {
      provide: Database,
      inject: [AppConfig, Clock],
      useFactory: async (config: AppConfig, clock: Clock) => {
        await migrate(config.databaseFile, clock.now());
        const writer = await writerSource(config.databaseFile).initialize();
        const reader = await readerSource(config.databaseFile).initialize();
        return new Database(writer, reader);
      },
    },
  ],
  exports: [Database],
})
export class DatabaseModule {}
