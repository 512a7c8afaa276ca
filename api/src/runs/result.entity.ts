import { Column, Entity, PrimaryColumn } from 'typeorm';

/** What a run found; runs with the same input hash share one row. */
@Entity('results')
export class ResultEntity {
  @PrimaryColumn({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @PrimaryColumn({ name: 'input_hash', type: 'text' })
  inputHash!: string;

  /** gzip of JSON (contract/result RunResult). */
  @Column({ type: 'blob' })
  result!: Buffer;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
