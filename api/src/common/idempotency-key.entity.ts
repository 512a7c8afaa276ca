import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The answer a creating request got, so that its repetition gets the same one. */
@Entity('idempotency_keys')
export class IdempotencyKeyEntity {
  @PrimaryColumn({ name: 'member_id', type: 'text' })
  memberId!: string;

  @PrimaryColumn({ type: 'text' })
  key!: string;

  @Column({ name: 'request_hash', type: 'text' })
  requestHash!: string;

  @Column({ type: 'text' })
  answer!: string;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
