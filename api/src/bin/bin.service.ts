import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { BinItem } from '@furrowlight/shared/contract/bin';
import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';
import { Clock } from '../common/clock.js';
import { FarmsService } from '../farms/farms.service.js';
import { FieldsService } from '../fields/fields.service.js';

const KEPT_MS = 30 * 24 * 3600_000;

/** What was removed in the last 30 days and can still come back. */
@Injectable()
export class BinService {
  constructor(
    private readonly farms: FarmsService,
    private readonly fields: FieldsService,
    private readonly clock: Clock,
  ) {}

  async list(principal: MemberPrincipal): Promise<BinItem[]> {
    const farms = await this.farms.removed(principal);
    const fields = await this.fields.removed(principal);
    const items = [
      ...farms.map((farm) => ({ ...farm, kind: 'farm' as const, farmName: farm.name })),
      ...fields.map((field) => ({ ...field, kind: 'field' as const })),
    ].map((item) => ({
      ...item,
      keptUntil: new Date(Date.parse(item.deletedAt) + KEPT_MS).toISOString(),
    }));
    return items.sort((a, b) => b.deletedAt.localeCompare(a.deletedAt));
  }

  /** Remove for good what has lain in the bin for its time. */
  @Cron(CronExpression.EVERY_DAY_AT_3AM)
  async empty(): Promise<void> {
    const before = new Date(this.clock.now().getTime() - KEPT_MS).toISOString();
    await this.fields.purge(before);
    await this.farms.purge(before);
  }
}
