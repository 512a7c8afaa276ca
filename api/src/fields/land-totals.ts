import { Injectable, type OnModuleInit } from '@nestjs/common';
import { Database } from '../database/database.js';
import { FarmTotals, type LandTotal } from '../farms/farm-totals.js';
import { FieldEntity } from './field.entity.js';

/** Answers the farms' question how much land they have. */
@Injectable()
export class LandTotals implements OnModuleInit {
  constructor(
    private readonly database: Database,
    private readonly totals: FarmTotals,
  ) {}

  onModuleInit(): void {
    this.totals.supply((cooperativeId) => this.byFarm(cooperativeId));
  }

  private async byFarm(cooperativeId: string): Promise<ReadonlyMap<string, LandTotal>> {
    const rows = await this.database.read
      .createQueryBuilder(FieldEntity, 'field')
      .select('field.farmId', 'farmId')
      .addSelect('COUNT(*)', 'fieldCount')
      .addSelect('COALESCE(SUM(field.areaM2), 0)', 'areaM2')
      .where('field.cooperativeId = :cooperativeId AND field.deletedAt IS NULL', { cooperativeId })
      .groupBy('field.farmId')
      .getRawMany<LandTotal & { farmId: string }>();
    return new Map(rows.map(({ farmId, fieldCount, areaM2 }) => [farmId, { fieldCount, areaM2 }]));
  }
}
