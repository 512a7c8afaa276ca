import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A sign-in that has not succeeded; kept for the length of the throttling window. */
@Entity('sign_in_attempts')
export class SignInAttemptEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  /** SHA-256 of the mail address, which may be mistyped or a stranger's. */
  @Column({ type: 'text' })
  account!: string;

  @Column({ type: 'text' })
  address!: string;

  @Column({ type: 'text' })
  at!: string;
}
