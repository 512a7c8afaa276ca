import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import Sqlite from 'better-sqlite3';
import type { MigrationInterface, QueryRunner } from 'typeorm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readerSource, writerSource, type MigrationClass } from '../src/database/connection.js';
import { Database } from '../src/database/database.js';
import { migrate } from '../src/database/migrate.js';
import { MIGRATIONS } from '../src/database/migration-list.js';
import { CooperativeEntity } from '../src/cooperatives/cooperative.entity.js';

let folder: string;
let file: string;
const NOW = new Date('2026-12-01T08:00:00Z');

beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-database-'));
  file = path.join(folder, 'furrowlight.sqlite');
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const plain = <T>(work: (db: Sqlite.Database) => T): T => {
  const db = new Sqlite(file);
  try {
    return work(db);
  } finally {
    db.close();
  }
};
const schema = () =>
  plain((db) => db.prepare('SELECT name, sql FROM sqlite_master ORDER BY name').all());
const count = (table: string) =>
  plain((db) => (db.prepare(`SELECT COUNT(*) AS n FROM ${table}`).get() as { n: number }).n);

/** A cooperative with a farm, two fields and three seasons, as the first release left them. */
function populate(): void {
  plain((db) => {
    db.pragma('foreign_keys = ON');
    db.exec(`
      INSERT INTO cooperatives VALUES ('coop-one', 'C', 'Europe/Berlin', 0, '[]', 't');
      INSERT INTO farms VALUES ('farm-one', 'coop-one', 1, 'F', 'H', '', '', NULL, NULL, '', 't', 't', NULL);
      INSERT INTO fields VALUES ('field-a', 'coop-one', 'farm-one', 1, 'A', 12, 48, NULL, NULL, NULL, NULL, NULL, 'Europe/Berlin', 0, 0, 0, 0.2, '[]', '', 't', 't', NULL);
      INSERT INTO fields VALUES ('field-b', 'coop-one', 'farm-one', 1, 'B', 12, 48, NULL, NULL, NULL, NULL, NULL, 'Europe/Berlin', 0, 0, 0, 0.2, '[]', '', 't', 't', NULL);
      INSERT INTO field_seasons VALUES ('season-1', 'coop-one', 'field-a', 1, 'maize', '2026-05-01', '2026-09-01', 2.2, 't', 't');
      INSERT INTO field_seasons VALUES ('season-2', 'coop-one', 'field-a', 1, 'maize', '2027-05-01', '2027-09-01', 2.2, 't', 't');
      INSERT INTO field_seasons VALUES ('season-3', 'coop-one', 'field-b', 1, 'maize', '2026-05-01', '2026-09-01', 2.2, 't', 't');
    `);
  });
}

function migration(name: string, ...statements: string[]): MigrationClass {
  return class implements MigrationInterface {
    readonly name = name;
    async up(runner: QueryRunner): Promise<void> {
      for (const statement of statements) await runner.query(statement);
    }
    async down(): Promise<void> {}
  };
}

describe('every connection', () => {
  it.each([
    ['writer', (name: string) => writerSource(name)],
    ['reader', readerSource],
  ])('is durable, strict and patient: %s', async (_, open) => {
    await migrate(file, NOW);
    const source = await open(file).initialize();
    const pragma = async (name: string) => {
      const [row] = (await source.query(`PRAGMA ${name}`)) as Record<string, unknown>[];
      return Object.values(row)[0];
    };
    expect(await pragma('journal_mode')).toBe('wal');
    expect(await pragma('synchronous')).toBe(2);
    expect(await pragma('foreign_keys')).toBe(1);
    expect(await pragma('busy_timeout')).toBe(5000);
    await source.destroy();
  });

  it('for reading cannot write', async () => {
    await migrate(file, NOW);
    const source = await readerSource(file).initialize();
    await expect(source.query('DELETE FROM cooperatives')).rejects.toThrow(/readonly/);
    await source.destroy();
  });
});

describe('migrations', () => {
  it('have one name each, and none runs outside a transaction', () => {
    const made = MIGRATIONS.map((Migration) => new Migration() as MigrationInterface);
    const names = made.map((item) => item.name ?? '');
    expect(new Set(names).size).toBe(names.length);
    expect(names).toEqual(MIGRATIONS.map((Migration) => Migration.name));
    expect(names.map((name) => name.slice(-13))).toEqual(
      names.map((name) => name.slice(-13)).sort(),
    );
    for (const item of made) expect(item.transaction).toBeUndefined();
  });

  it('make a fresh database, once, without a snapshot of nothing', async () => {
    await migrate(file, NOW);
    const first = schema();
    await migrate(file, NOW);
    expect(schema()).toEqual(first);
    expect(count('migrations')).toBe(MIGRATIONS.length);
    expect(existsSync(path.join(folder, 'snapshots'))).toBe(false);
  });

  it('bring the first release’s data along, row by row', async () => {
    await migrate(file, NOW, MIGRATIONS.slice(0, 1));
    populate();
    const before = plain((db) => db.prepare('SELECT * FROM field_seasons ORDER BY id').all());
    await migrate(file, NOW);
    expect(plain((db) => db.prepare('SELECT * FROM field_seasons ORDER BY id').all())).toEqual(
      before,
    );
    expect([count('cooperatives'), count('farms'), count('fields')]).toEqual([1, 1, 2]);
    expect(plain((db) => db.pragma('foreign_key_check'))).toEqual([]);
    expect(readdirSync(path.join(folder, 'snapshots'))).toHaveLength(1);
  });

  it('may rebuild a parent table without losing its children', async () => {
    await migrate(file, NOW);
    populate();
    const rebuild = migration(
      'Rebuild1900000000000',
      'CREATE TABLE farms_new AS SELECT * FROM farms',
      'DROP TABLE farms',
      `CREATE TABLE farms (id TEXT PRIMARY KEY NOT NULL, cooperative_id TEXT NOT NULL
        REFERENCES cooperatives (id), colour TEXT, UNIQUE (id, cooperative_id))`,
      'INSERT INTO farms (id, cooperative_id) SELECT id, cooperative_id FROM farms_new',
      'DROP TABLE farms_new',
    );
    await migrate(file, NOW, [...MIGRATIONS, rebuild]);
    expect([count('farms'), count('fields'), count('field_seasons')]).toEqual([1, 2, 3]);
  });

  it('leave everything as it was when one fails', async () => {
    await migrate(file, NOW);
    populate();
    const before = schema();
    const fine = migration('Fine1900000000000', 'ALTER TABLE farms ADD COLUMN colour TEXT');
    const bad = migration(
      'Bad1900000000001',
      'DELETE FROM field_seasons',
      'SELECT nonsense FROM nowhere',
    );
    await expect(migrate(file, NOW, [...MIGRATIONS, fine, bad])).rejects.toThrow(
      /put back as it was/,
    );
    expect(schema()).toEqual(before);
    expect(count('field_seasons')).toBe(3);
    await migrate(file, NOW);
  });

  it('are undone when they break a reference', async () => {
    await migrate(file, NOW);
    populate();
    const orphan = migration('Orphan1900000000000', `DELETE FROM fields WHERE id = 'field-a'`);
    await expect(migrate(file, NOW, [...MIGRATIONS, orphan])).rejects.toThrow(
      /could not be brought/,
    );
    expect(count('fields')).toBe(2);
  });

  it('refuse a database of a newer program and touch nothing', async () => {
    const newer = migration('Newer1900000000000', 'CREATE TABLE later (id TEXT)');
    await migrate(file, NOW, [...MIGRATIONS, newer]);
    const before = schema();
    await expect(migrate(file, NOW)).rejects.toThrow(/newer Furrowlight.*Newer1900000000000/);
    expect(schema()).toEqual(before);
  });
});

describe('the schema', () => {
  it('refuses a row that points into another cooperative', async () => {
    await migrate(file, NOW);
    populate();
    plain((db) => {
      db.pragma('foreign_keys = ON');
      db.exec(`INSERT INTO cooperatives VALUES ('coop-two', 'D', 'Europe/Berlin', 0, '[]', 't')`);
      const move = db.prepare(`UPDATE fields SET cooperative_id = 'coop-two' WHERE id = 'field-b'`);
      expect(() => move.run()).toThrow(/FOREIGN KEY/);
    });
  });

  it('keeps the audit log append-only', async () => {
    await migrate(file, NOW);
    plain((db) => {
      db.exec(
        `INSERT INTO audit_log VALUES (1, 'c', 't', 'member', 'm', 'M', 'created', 'farm', 'f', 'F', 'p', 'h')`,
      );
      expect(() => db.exec(`UPDATE audit_log SET action = 'x'`)).toThrow(/append-only/);
      expect(() => db.exec('DELETE FROM audit_log')).toThrow(/append-only/);
    });
  });
});

describe('the database', () => {
  async function open(): Promise<Database> {
    await migrate(file, NOW);
    return new Database(
      await writerSource(file).initialize(),
      await readerSource(file).initialize(),
    );
  }
  const row = (id: string) => ({
    id,
    name: id,
    timeZone: 'UTC',
    demo: false,
    demoAccounts: [],
    createdAt: 't',
  });
  const pause = () => new Promise((resolve) => setTimeout(resolve, 1));

  it('keeps transactions apart: a failing one takes nobody else’s rows with it', async () => {
    const database = await open();
    const writes = Array.from({ length: 40 }, (_, i) =>
      database.write(async (manager) => {
        await manager.insert(CooperativeEntity, row(`c-${i}`));
        await pause();
        if (i % 2 === 1) throw new Error('no');
      }),
    );
    const settled = await Promise.allSettled(writes);
    expect(settled.filter(({ status }) => status === 'rejected')).toHaveLength(20);
    const kept = await database.read.find(CooperativeEntity);
    expect(kept.map(({ id }) => Number(id.slice(2)) % 2)).toEqual(Array<number>(20).fill(0));
    await database.onApplicationShutdown();
  });

  it('shows readers committed rows only, and the writer its own', async () => {
    const database = await open();
    let seenInside = -1;
    const outside = () => database.read.count(CooperativeEntity);
    await database.write(async (manager) => {
      await manager.insert(CooperativeEntity, row('c-1'));
      seenInside = await database.read.count(CooperativeEntity);
      await pause();
    });
    const writing = database.write(async (manager) => {
      await manager.insert(CooperativeEntity, row('c-2'));
      await pause();
      await pause();
    });
    await pause();
    const seenOutside = await outside();
    await writing;
    expect([seenInside, seenOutside, await outside()]).toEqual([1, 1, 2]);
    await database.onApplicationShutdown();
  });

  it('joins a nested write, and tells of the commit only after it', async () => {
    const database = await open();
    const told: string[] = [];
    const failing = database.write(async (manager) => {
      await manager.insert(CooperativeEntity, row('c-1'));
      await database.write((inner) => inner.insert(CooperativeEntity, row('c-2')));
      database.afterCommit(() => told.push('failed'));
      throw new Error('no');
    });
    await expect(failing).rejects.toThrow('no');
    expect(await database.read.count(CooperativeEntity)).toBe(0);
    await database.write(async () => {
      database.afterCommit(() => told.push('committed'));
      expect(told).toEqual([]);
    });
    expect(told).toEqual(['committed']);
    await database.onApplicationShutdown();
  });
});
