import type { MigrationInterface } from 'typeorm';
import { InitialSchema1796083200000 } from './migrations/1796083200000-initial-schema.js';

/** Every migration ever released, oldest first. Append only; never edit a released one. */
export const MIGRATIONS: (new () => MigrationInterface)[] = [InitialSchema1796083200000];
