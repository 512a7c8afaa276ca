import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('farms')
export class FarmEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ type: 'integer' })
  version!: number;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text' })
  holder!: string;

  @Column({ name: 'farm_number', type: 'text' })
  farmNumber!: string;

  @Column({ type: 'text' })
  place!: string;

  @Column({ name: 'advisor_id', type: 'text', nullable: true })
  advisorId!: string | null;

  /** The holder's own account, where there is one: decides what a farmer sees. */
  @Column({ name: 'farmer_member_id', type: 'text', nullable: true })
  farmerMemberId!: string | null;

  @Column({ type: 'text' })
  notes!: string;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'updated_at', type: 'text' })
  updatedAt!: string;

  @Column({ name: 'deleted_at', type: 'text', nullable: true })
  deletedAt!: string | null;
}
