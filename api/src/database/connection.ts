import type Sqlite from 'better-sqlite3';
import { DataSource, type MigrationInterface } from 'typeorm';
import { ENTITIES } from './entities.js';

/** A migration as its runner takes it. */
export type MigrationClass = new () => MigrationInterface;

const BUSY_TIMEOUT_MS = 5000;

/** Set on every connection: acknowledged writes survive a crash, references hold. */
function prepare(connection: Sqlite.Database): void {
  connection.pragma(`busy_timeout = ${BUSY_TIMEOUT_MS}`);
  connection.pragma('journal_mode = WAL');
  connection.pragma('synchronous = FULL');
  connection.pragma('foreign_keys = ON');
  connection.pragma('trusted_schema = OFF');
}

/** The connection all writes and the migrations go through. */
export function writerSource(file: string, migrations: readonly MigrationClass[] = []): DataSource {
  return new DataSource({
    type: 'better-sqlite3',
    database: file,
    timeout: BUSY_TIMEOUT_MS,
    entities: ENTITIES,
    migrations: [...migrations],
    migrationsTableName: 'migrations',
    migrationsTransactionMode: 'each',
    prepareDatabase: prepare,
  });
}

/** A second connection for reading: it sees committed rows only, and cannot write. */
export function readerSource(file: string): DataSource {
  return new DataSource({
    type: 'better-sqlite3',
    database: file,
    timeout: BUSY_TIMEOUT_MS,
    entities: ENTITIES,
    prepareDatabase: (connection: Sqlite.Database) => {
      prepare(connection);
      connection.pragma('query_only = ON');
    },
  });
}
