import { copyFileSync, existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import type { DataSource } from 'typeorm';
import { writerSource, type MigrationClass } from './connection.js';
import { MIGRATIONS } from './migration-list.js';

const KEPT_SNAPSHOTS = 5;

/** The database and this program do not fit together. */
export class MigrationError extends Error {
  override readonly name = 'MigrationError';
}

async function appliedNames(source: DataSource): Promise<string[]> {
  const table: unknown[] = await source.query(
    `SELECT name FROM sqlite_master WHERE type = 'table' AND name = 'migrations'`,
  );
  if (table.length === 0) return [];
  const rows: { name: string }[] = await source.query('SELECT name FROM migrations ORDER BY id');
  return rows.map((row) => row.name);
}

function refuseNewer(applied: readonly string[], migrations: readonly MigrationClass[]): void {
  const known = new Set(migrations.map((migration) => migration.name));
  const foreign = applied.filter((name) => !known.has(name));
  if (foreign.length > 0) {
    throw new MigrationError(
      `The database was written by a newer Furrowlight (it knows ${foreign.join(', ')}). Start that version, or restore an older backup.`,
    );
  }
}

/** A consistent copy of the database beside it; the newest few are kept. */
async function takeSnapshot(source: DataSource, file: string, now: Date): Promise<string> {
  const folder = path.join(path.dirname(file), 'snapshots');
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const stamp = now.toISOString().replaceAll(/[:.]/g, '-');
  const snapshot = path.join(folder, `before-migration-${stamp}.sqlite`);
  await source.query('VACUUM INTO ?', [snapshot]);
  const old = readdirSync(folder)
    .filter((name) => name.startsWith('before-migration-'))
    .sort();
  for (const name of old.slice(0, -KEPT_SNAPSHOTS)) rmSync(path.join(folder, name));
  return snapshot;
}

function restore(snapshot: string, file: string): void {
  for (const suffix of ['-wal', '-shm']) {
    if (existsSync(file + suffix)) rmSync(file + suffix);
  }
  copyFileSync(snapshot, file);
}

/**
 * Foreign keys are off outside the transactions: rebuilding a parent table would otherwise delete
 * its children by cascade. They are checked afterwards.
 */
async function runPending(source: DataSource): Promise<void> {
  await source.query('PRAGMA foreign_keys = OFF');
  await source.runMigrations({ transaction: 'each' });
  const broken: unknown[] = await source.query('PRAGMA foreign_key_check');
  if (broken.length > 0) {
    throw new MigrationError(
      `Migration broke ${broken.length} references: ${JSON.stringify(broken)}`,
    );
  }
  await source.query('PRAGMA foreign_keys = ON');
}

/**
 * Bring the database file to this program's schema, or leave it exactly as it was.
 *
 * @throws MigrationError when the file is newer than this program or a migration fails
 */
export async function migrate(
  file: string,
  now: Date,
  migrations: readonly MigrationClass[] = MIGRATIONS,
): Promise<void> {
  const source = await writerSource(file, migrations).initialize();
  let snapshot: string | null = null;
  try {
    const applied = await appliedNames(source);
    refuseNewer(applied, migrations);
    if (applied.length === migrations.length) return;
    if (applied.length > 0) snapshot = await takeSnapshot(source, file, now);
    await runPending(source);
  } catch (cause) {
    await source.destroy();
    if (snapshot) restore(snapshot, file);
    if (cause instanceof MigrationError && !snapshot) throw cause;
    const state = snapshot ? `It was put back as it was (snapshot ${snapshot}).` : '';
    throw new MigrationError(`The database could not be brought up to date. ${state}`.trim(), {
      cause,
    });
  } finally {
    if (source.isInitialized) await source.destroy();
  }
}
