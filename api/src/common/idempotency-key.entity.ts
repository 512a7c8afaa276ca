import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The answer a creating request got, so that its repetition gets the same one. */
@Entity('idempotency_keys')
export class IdempotencyKeyEntity {
  @PrimaryColumn({ name: 'member_id', type: 'text' })
  memberId!: string;

  /** SHA-256 of the key the client made up. */
  @PrimaryColumn({ type: 'text' })
  key!: string;

  @Column({ name: 'request_hash', type: 'text' })
  requestHash!: string;

  /** Readable only with the client's key: an answer may hold a link's token. */
  @Column({ type: 'text' })
  answer!: string;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
