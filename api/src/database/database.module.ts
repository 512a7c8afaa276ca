import { Global, Module } from '@nestjs/common';
import { getDataSourceToken, TypeOrmModule } from '@nestjs/typeorm';
import type { DataSource } from 'typeorm';
import { readerSource, writerSource } from './connection.js';
import { Database } from './database.js';
import { MigratedFile, MigrationModule } from './migration.module.js';

const WRITER = 'writer';
const READER = 'reader';

/** Two connections to the migrated file: one that writes, one that can only read (decision 0003). */
@Global()
@Module({
  imports: [
    TypeOrmModule.forRootAsync({
      name: WRITER,
      imports: [MigrationModule],
      inject: [MigratedFile],
      useFactory: ({ path }: MigratedFile) => writerSource(path).options,
    }),
    TypeOrmModule.forRootAsync({
      name: READER,
      imports: [MigrationModule],
      inject: [MigratedFile],
      useFactory: ({ path }: MigratedFile) => readerSource(path).options,
    }),
  ],
  providers: [
    {
      provide: Database,
      inject: [getDataSourceToken(WRITER), getDataSourceToken(READER)],
      useFactory: (writer: DataSource, reader: DataSource) => new Database(writer, reader),
    },
  ],
  exports: [Database],
})
export class DatabaseModule {}
