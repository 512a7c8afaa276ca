import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('field_seasons')
export class SeasonEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ name: 'field_id', type: 'text' })
  fieldId!: string;

  @Column({ type: 'integer' })
  version!: number;

  @Column({ name: 'crop_id', type: 'text' })
  cropId!: string;

  @Column({ type: 'text' })
  sowing!: string;

  @Column({ type: 'text' })
  harvest!: string;

  @Column({ name: 'canopy_height_m', type: 'real' })
  canopyHeightM!: number;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'updated_at', type: 'text' })
  updatedAt!: string;
}
