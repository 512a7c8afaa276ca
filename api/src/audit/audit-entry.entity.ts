import { Column, Entity, PrimaryGeneratedColumn } from 'typeorm';

/** Who did what to which, when; each row's hash covers the row before it. */
@Entity('audit_log')
export class AuditEntryEntity {
  @PrimaryGeneratedColumn({ type: 'integer' })
  seq!: number;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ type: 'text' })
  at!: string;

  @Column({ name: 'actor_kind', type: 'text' })
  actorKind!: string;

  @Column({ name: 'actor_id', type: 'text' })
  actorId!: string;

  @Column({ name: 'actor_name', type: 'text' })
  actorName!: string;

  @Column({ type: 'text' })
  action!: string;

  @Column({ name: 'subject_kind', type: 'text' })
  subjectKind!: string;

  @Column({ name: 'subject_id', type: 'text' })
  subjectId!: string;

  @Column({ name: 'subject_name', type: 'text' })
  subjectName!: string;

  @Column({ name: 'previous_hash', type: 'text' })
  previousHash!: string;

  @Column({ type: 'text' })
  hash!: string;
}
