import type { WeatherFinding, WeatherSummary } from '@furrowlight/shared/contract/weather';
import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('weather_years')
export class WeatherYearEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ name: 'cooperative_id', type: 'text' })
  cooperativeId!: string;

  @Column({ type: 'text' })
  kind!: 'file' | 'climate' | 'clear-sky';

  @Column({ type: 'text' })
  name!: string;

  @Column({ type: 'real' })
  latitude!: number;

  @Column({ type: 'real' })
  longitude!: number;

  @Column({ name: 'elevation_m', type: 'real' })
  elevationM!: number;

  @Column({ name: 'utc_offset_hours', type: 'real' })
  utcOffsetHours!: number;

  @Column({ type: 'text' })
  source!: string;

  @Column({ name: 'file_name', type: 'text', nullable: true })
  fileName!: string | null;

  @Column({ type: 'simple-json' })
  findings!: WeatherFinding[];

  @Column({ type: 'simple-json' })
  summary!: WeatherSummary;

  /** SHA-256 of place and hours: the same upload is stored once. */
  @Column({ name: 'content_hash', type: 'text' })
  contentHash!: string;

  /** The hourly year as gzip of JSON; left out of lists. */
  @Column({ type: 'blob', select: false })
  hours!: Buffer;

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
