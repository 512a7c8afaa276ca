import type { Boundary, Occluder } from '@furrowlight/shared/contract/fields';
import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('fields')
export class FieldEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ name: 'farm_id', type: 'text' })
  farmId!: string;

  @Column({ type: 'integer' })
  version!: number;

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'real' })
  longitude!: number;

  @Column({ type: 'real' })
  latitude!: number;

  @Column({ type: 'simple-json', nullable: true })
  boundary!: Boundary | null;

  @Column({ name: 'area_m2', type: 'real', nullable: true })
  areaM2!: number | null;

  @Column({ name: 'perimeter_m', type: 'real', nullable: true })
  perimeterM!: number | null;

  @Column({ name: 'longest_side_bearing_deg', type: 'real', nullable: true })
  longestSideBearingDeg!: number | null;

  @Column({ name: 'longest_side_m', type: 'real', nullable: true })
  longestSideM!: number | null;

  @Column({ name: 'time_zone', type: 'text' })
  timeZone!: string;

  @Column({ name: 'elevation_m', type: 'real' })
  elevationM!: number;

  @Column({ name: 'slope_percent', type: 'real' })
  slopePercent!: number;

  @Column({ name: 'aspect_deg', type: 'real' })
  aspectDeg!: number;

  @Column({ type: 'real' })
  albedo!: number;

  @Column({ type: 'simple-json' })
  occluders!: Occluder[];

  @Column({ type: 'text' })
  notes!: string;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;

  @Column({ name: 'updated_at', type: 'text' })
  updatedAt!: string;

  @Column({ name: 'deleted_at', type: 'text', nullable: true })
  deletedAt!: string | null;
}
