import type { ClientConfig } from '@furrowlight/shared/contract/config';
import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('cooperatives')
export class CooperativeEntity {
  @PrimaryColumn({ type: 'text' })
  id!: string;

  @Column({ type: 'text' })
  name!: string;

  @Column({ name: 'time_zone', type: 'text' })
  timeZone!: string;

  @Column({ type: 'boolean' })
  demo!: boolean;

  /** Shown on the sign-in page of a demo server; empty everywhere else. */
  @Column({ name: 'demo_accounts', type: 'simple-json' })
  demoAccounts!: ClientConfig['demoAccounts'];

  @Column({ name: 'created_at', type: 'text' })
  createdAt!: string;
}
