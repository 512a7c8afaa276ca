import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A visitor's cookie, as a hash; it lives no longer than its link. */
@Entity('review_visits')
export class ReviewVisitEntity {
  @PrimaryColumn({ name: 'token_hash', type: 'text' })
  tokenHash!: string;

  @Column({ name: 'review_id', type: 'text' })
  reviewId!: string;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
