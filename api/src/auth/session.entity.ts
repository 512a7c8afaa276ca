import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('sessions')
export class SessionEntity {
  /** The id of the signed token (its jti). */
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'member_id', type: 'text' })
  memberId!: string;

  /** Which rotation of the token is the current one. */
  @Column({ type: 'integer' })
  generation!: number;

  /** Has the current token come back from the client yet? */
  @Column({ type: 'boolean' })
  confirmed!: boolean;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'rotated_at', type: 'text' })
  rotatedAt!: string;

  @Column({ name: 'expires_at', type: 'text' })
  expiresAt!: string;

  @Column({ name: 'revoked_at', type: 'text', nullable: true })
  revokedAt!: string | null;
}
