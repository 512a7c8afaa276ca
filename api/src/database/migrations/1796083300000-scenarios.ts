import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Weather years, scenarios with their runs and results, and review links. */
const STATEMENTS = [
  `CREATE TABLE weather_years (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL REFERENCES cooperatives (id) ON DELETE CASCADE,
    kind TEXT NOT NULL CHECK (kind IN ('file', 'climate', 'clear-sky')),
    name TEXT NOT NULL,
    latitude REAL NOT NULL,
    longitude REAL NOT NULL,
    elevation_m REAL NOT NULL,
    utc_offset_hours REAL NOT NULL,
    source TEXT NOT NULL,
    file_name TEXT,
    findings TEXT NOT NULL,
    summary TEXT NOT NULL,
    content_hash TEXT NOT NULL,
    hours BLOB NOT NULL,
    created_at TEXT NOT NULL,
    UNIQUE (id, cooperative_id),
    UNIQUE (cooperative_id, content_hash)
  ) STRICT`,
  `CREATE TABLE scenarios (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL,
    field_id TEXT NOT NULL,
    version INTEGER NOT NULL,
    name TEXT NOT NULL,
    notes TEXT NOT NULL,
    weather_id TEXT,
    layout TEXT NOT NULL,
    archived INTEGER NOT NULL CHECK (archived IN (0, 1)),
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    UNIQUE (id, cooperative_id),
    FOREIGN KEY (field_id, cooperative_id) REFERENCES fields (id, cooperative_id) ON DELETE CASCADE,
    FOREIGN KEY (weather_id, cooperative_id) REFERENCES weather_years (id, cooperative_id)
  ) STRICT`,
  `CREATE INDEX scenarios_of_field ON scenarios (field_id, created_at)`,
  `CREATE TABLE runs (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL,
    scenario_id TEXT NOT NULL,
    status TEXT NOT NULL CHECK (status IN ('queued', 'running', 'done', 'failed', 'cancelled')),
    progress REAL NOT NULL,
    problem TEXT,
    model_version TEXT NOT NULL,
    input_hash TEXT NOT NULL,
    frozen TEXT NOT NULL,
    attempts INTEGER NOT NULL,
    duration_ms REAL,
    created_at TEXT NOT NULL,
    started_at TEXT,
    finished_at TEXT,
    FOREIGN KEY (scenario_id, cooperative_id) REFERENCES scenarios (id, cooperative_id) ON DELETE CASCADE
  ) STRICT`,
  `CREATE INDEX runs_of_scenario ON runs (scenario_id, created_at)`,
  `CREATE INDEX runs_waiting ON runs (status, created_at)`,
  `CREATE TABLE results (
    cooperative_id TEXT NOT NULL REFERENCES cooperatives (id) ON DELETE CASCADE,
    input_hash TEXT NOT NULL,
    result BLOB NOT NULL,
    created_at TEXT NOT NULL,
    PRIMARY KEY (cooperative_id, input_hash)
  ) STRICT`,
  `CREATE TABLE reviews (
    id TEXT PRIMARY KEY NOT NULL,
    cooperative_id TEXT NOT NULL,
    field_id TEXT NOT NULL,
    message TEXT NOT NULL,
    token_hash TEXT NOT NULL UNIQUE,
    shown TEXT NOT NULL,
    created_at TEXT NOT NULL,
    created_by_id TEXT NOT NULL,
    created_by_name TEXT NOT NULL,
    expires_at TEXT NOT NULL,
    revoked_at TEXT,
    last_opened_at TEXT,
    views INTEGER NOT NULL,
    FOREIGN KEY (field_id, cooperative_id) REFERENCES fields (id, cooperative_id) ON DELETE CASCADE
  ) STRICT`,
  `CREATE INDEX reviews_of_field ON reviews (field_id, created_at)`,
  `CREATE TABLE review_visits (
    token_hash TEXT PRIMARY KEY NOT NULL,
    review_id TEXT NOT NULL REFERENCES reviews (id) ON DELETE CASCADE,
    created_at TEXT NOT NULL
  ) STRICT`,
];

export class Scenarios1796083300000 implements MigrationInterface {
  readonly name = 'Scenarios1796083300000';

  async up(runner: QueryRunner): Promise<void> {
    for (const statement of STATEMENTS) await runner.query(statement);
  }

  /** Going back is restoring the snapshot. */
  async down(): Promise<void> {
    throw new Error('Restore the snapshot taken before this migration instead.');
  }
}
