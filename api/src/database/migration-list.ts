import type { MigrationClass } from './connection.js';
import { InitialSchema1796083200000 } from './migrations/1796083200000-initial-schema.js';
import { Scenarios1796083300000 } from './migrations/1796083300000-scenarios.js';

/** Every migration ever released, oldest first. Append only; never edit a released one. */
export const MIGRATIONS: readonly MigrationClass[] = [
  InitialSchema1796083200000,
  Scenarios1796083300000,
];
