import type { Role } from '@furrowlight/shared/contract/session';
import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('members')
export class MemberEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ type: 'integer' })
  version!: number;

  @Column({ type: 'text' })
  name!: string;

  /** Lower case. */
  @Column({ type: 'text' })
  email!: string;

  @Column({ type: 'text' })
  role!: Role;

  @Column({ type: 'boolean' })
  active!: boolean;

  /** Null until the person has chosen a password. */
  @Column({ name: 'password_hash', type: 'text', nullable: true })
  passwordHash!: string | null;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'updated_at', type: 'text' })
  updatedAt!: string;
}
