import type { FrozenInput, RunStatus } from '@furrowlight/shared/contract/run';
import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A run is a row before it is work: a restart finds what was waiting or cut off. */
@Entity('runs')
export class RunEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ name: 'scenario_id', type: 'text' })
  scenarioId!: string;

  @Column({ type: 'text' })
  status!: RunStatus;

  @Column({ type: 'real' })
  progress!: number;

  @Column({ type: 'text', nullable: true })
  problem!: string | null;

  @Column({ name: 'model_version', type: 'text' })
  modelVersion!: string;

  @Column({ name: 'input_hash', type: 'text' })
  inputHash!: string;

  @Column({ type: 'simple-json' })
  frozen!: FrozenRun;

  /** Times a worker has begun it. */
  @Column({ type: 'integer' })
  attempts!: number;

  @Column({ name: 'duration_ms', type: 'real', nullable: true })
  durationMs!: number | null;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'started_at', type: 'text', nullable: true })
  startedAt!: string | null;

  @Column({ name: 'finished_at', type: 'text', nullable: true })
  finishedAt!: string | null;
}

/** Frozen input with the weather year it was frozen from. */
export interface FrozenRun {
  input: FrozenInput;
  weatherId: string;
}
