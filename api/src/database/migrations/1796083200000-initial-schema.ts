import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * People, access and land. Every row of a cooperative names it, and references between rows carry
 * it too, so that the database itself refuses a row that points into another cooperative.
 */
const STATEMENTS = [
  `CREATE TABLE cooperatives (
    id TEXT PRIMARY KEY NOT NULL,
    name TEXT NOT NULL,
    time_zone TEXT NOT NULL,
    demo INTEGER NOT NULL CHECK (demo IN (0, 1)),
    demo_accounts TEXT NOT NULL,
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE TABLE members (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL REFERENCES cooperatives (id) ON DELETE CASCADE,
    version INTEGER NOT NULL,
    name TEXT NOT NULL,
    email TEXT NOT NULL UNIQUE CHECK (email = lower(email)),
    role TEXT NOT NULL CHECK (role IN ('admin', 'advisor', 'farmer', 'reader')),
    active INTEGER NOT NULL CHECK (active IN (0, 1)),
    password_hash TEXT,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    UNIQUE (id, cooperative_id)
  ) STRICT`,
  `CREATE INDEX members_of_cooperative ON members (cooperative_id, name)`,
  `CREATE TABLE sessions (
    id TEXT PRIMARY KEY NOT NULL,
    member_id TEXT NOT NULL REFERENCES members (id) ON DELETE CASCADE,
    generation INTEGER NOT NULL,
    confirmed INTEGER NOT NULL CHECK (confirmed IN (0, 1)),
    created_at TEXT NOT NULL,
    rotated_at TEXT NOT NULL,
    expires_at TEXT NOT NULL,
    revoked_at TEXT
  ) STRICT`,
  `CREATE INDEX sessions_of_member ON sessions (member_id)`,
  `CREATE TABLE sign_in_attempts (
    id TEXT PRIMARY KEY NOT NULL,
    account TEXT NOT NULL,
    address TEXT NOT NULL,
    at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX sign_in_attempts_by_address ON sign_in_attempts (address, at)`,
  `CREATE TABLE idempotency_keys (
    member_id TEXT NOT NULL,
    key TEXT NOT NULL,
    request_hash TEXT NOT NULL,
    answer TEXT NOT NULL,
    created_at TEXT NOT NULL,
    PRIMARY KEY (member_id, key)
  ) STRICT`,
  `CREATE INDEX idempotency_keys_by_age ON idempotency_keys (created_at)`,
  `CREATE TABLE farms (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL REFERENCES cooperatives (id) ON DELETE CASCADE,
    version INTEGER NOT NULL,
    name TEXT NOT NULL,
    holder TEXT NOT NULL,
    farm_number TEXT NOT NULL,
    place TEXT NOT NULL,
    advisor_id TEXT,
    farmer_member_id TEXT,
    notes TEXT NOT NULL,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    deleted_at TEXT,
    UNIQUE (id, cooperative_id),
    FOREIGN KEY (advisor_id, cooperative_id) REFERENCES members (id, cooperative_id),
    FOREIGN KEY (farmer_member_id, cooperative_id) REFERENCES members (id, cooperative_id)
  ) STRICT`,
  `CREATE INDEX farms_of_cooperative ON farms (cooperative_id, name)`,
  `CREATE TABLE fields (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL,
    farm_id TEXT NOT NULL,
    version INTEGER NOT NULL,
    name TEXT NOT NULL,
    longitude REAL NOT NULL,
    latitude REAL NOT NULL,
    boundary TEXT,
    area_m2 REAL,
    perimeter_m REAL,
    longest_side_bearing_deg REAL,
    longest_side_m REAL,
    time_zone TEXT NOT NULL,
    elevation_m REAL NOT NULL,
    slope_percent REAL NOT NULL,
    aspect_deg REAL NOT NULL,
    albedo REAL NOT NULL,
    occluders TEXT NOT NULL,
    notes TEXT NOT NULL,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    deleted_at TEXT,
    UNIQUE (id, cooperative_id),
    FOREIGN KEY (farm_id, cooperative_id) REFERENCES farms (id, cooperative_id) ON DELETE CASCADE
  ) STRICT`,
  `CREATE INDEX fields_of_farm ON fields (farm_id)`,
  `CREATE INDEX fields_of_cooperative ON fields (cooperative_id, name)`,
  `CREATE TABLE field_seasons (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL,
    field_id TEXT NOT NULL,
    version INTEGER NOT NULL,
    crop_id TEXT NOT NULL,
    sowing TEXT NOT NULL,
    harvest TEXT NOT NULL CHECK (harvest > sowing),
    canopy_height_m REAL NOT NULL,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    FOREIGN KEY (field_id, cooperative_id) REFERENCES fields (id, cooperative_id) ON DELETE CASCADE
  ) STRICT`,
  `CREATE INDEX field_seasons_of_field ON field_seasons (field_id, sowing)`,
  // The log outlives what it tells of, so it refers to nothing.
  `CREATE TABLE audit_log (
    seq INTEGER PRIMARY KEY AUTOINCREMENT,
    cooperative_id TEXT NOT NULL,
    at TEXT NOT NULL,
    actor_kind TEXT NOT NULL,
    actor_id TEXT NOT NULL,
    actor_name TEXT NOT NULL,
    action TEXT NOT NULL,
    subject_kind TEXT NOT NULL,
    subject_id TEXT NOT NULL,
    subject_name TEXT NOT NULL,
    previous_hash TEXT NOT NULL,
    hash TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX audit_log_of_cooperative ON audit_log (cooperative_id, seq)`,
  `CREATE TRIGGER audit_log_stands BEFORE UPDATE ON audit_log
    BEGIN SELECT RAISE(ABORT, 'The audit log is append-only.'); END`,
  `CREATE TRIGGER audit_log_stays BEFORE DELETE ON audit_log
    BEGIN SELECT RAISE(ABORT, 'The audit log is append-only.'); END`,
];

export class InitialSchema1796083200000 implements MigrationInterface {
  readonly name = 'InitialSchema1796083200000';

  async up(runner: QueryRunner): Promise<void> {
    for (const statement of STATEMENTS) await runner.query(statement);
  }

  /** Going back is restoring the snapshot. */
  async down(): Promise<void> {
    throw new Error('The first schema has nothing before it.');
  }
}
