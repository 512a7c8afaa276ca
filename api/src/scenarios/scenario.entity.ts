import type { Layout } from '@furrowlight/shared/contract/layout';
import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('scenarios')
export class ScenarioEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ name: 'field_id', type: 'text' })
  fieldId!: string;

  @Column({ type: 'integer' })
  version!: number;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'text' })
  notes!: string;

  @Column({ name: 'weather_id', type: 'text', nullable: true })
  weatherId!: string | null;

  @Column({ type: 'simple-json' })
  layout!: Layout;

  @Column({ type: 'boolean' })
  archived!: boolean;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'updated_at', type: 'text' })
  updatedAt!: string;
}
