import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The page as it was when the link was made; results are kept by their hash. */
export type ShownPage = Omit<ReviewPage, 'scenarios'> & {
  scenarios: Omit<ReviewPage['scenarios'][number], 'result'>[];
};

@Entity('reviews')
export class ReviewEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ name: 'field_id', type: 'text' })
  fieldId!: string;

  @Column({ type: 'text' })
  message!: string;

  /** SHA-256 of the token; the token itself is kept nowhere. */
  @Column({ name: 'token_hash', type: 'text' })
  tokenHash!: string;

  @Column({ type: 'simple-json' })
  shown!: ShownPage;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'created_by_id', type: 'text' })
  createdById!: string;

  @Column({ name: 'created_by_name', type: 'text' })
  createdByName!: string;

  @Column({ name: 'expires_at', type: 'text' })
  expiresAt!: string;

  @Column({ name: 'revoked_at', type: 'text', nullable: true })
  revokedAt!: string | null;

  @Column({ name: 'last_opened_at', type: 'text', nullable: true })
  lastOpenedAt!: string | null;

  @Column({ type: 'integer' })
  views!: number;
}
