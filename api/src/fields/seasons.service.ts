import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { FieldSeason, SeasonInput, SeasonPatch } from '@furrowlight/shared/contract/fields';
import { Injectable } from '@nestjs/common';
import { DateTime } from 'luxon';
import type { EntityManager } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { invalid, notFound, requireVersion } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { CropsService } from '../crops/crops.service.js';
import { Database } from '../database/database.js';
import { FieldsService } from './fields.service.js';
import { SeasonEntity } from './season.entity.js';

/** Longer than any crop between sowing and harvest; more is a slip in the year. */
const LONGEST_MONTHS = 18;

@Injectable()
export class SeasonsService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly fields: FieldsService,
    private readonly crops: CropsService,
    private readonly audit: AuditService,
  ) {}

  /** Crops of one field, latest sowing first. @throws DomainError not-found for the field */
  async list(principal: MemberPrincipal, fieldId: string): Promise<FieldSeason[]> {
    const field = await this.fields.get(principal, fieldId);
    const rows = await this.database.read.find(SeasonEntity, {
      where: { fieldId: field.id },
      order: { sowing: 'DESC' },
    });
    return rows.map((row) => this.describe(row));
  }

  /** Seasons of the whole cooperative that are sown between two dates, for the desk. */
  async sownBetween(principal: MemberPrincipal, from: string, to: string): Promise<FieldSeason[]> {
    const rows = await this.database.read
      .createQueryBuilder(SeasonEntity, 'season')
      .where({ cooperativeId: principal.cooperativeId })
      .andWhere('season.sowing BETWEEN :from AND :to', { from, to })
      .orderBy('season.sowing')
      .getMany();
    return rows.map((row) => this.describe(row));
  }

  /** @throws DomainError not-found, invalid-input */
  async create(
    principal: MemberPrincipal,
    fieldId: string,
    input: SeasonInput,
  ): Promise<FieldSeason> {
    return this.database.write(async (manager) => {
      const field = await this.fields.get(principal, fieldId);
      const now = this.clock.instant();
      const row = manager.create(SeasonEntity, {
        id: this.ids.next(),
        cooperativeId: principal.cooperativeId,
        fieldId: field.id,
        version: 1,
        ...input,
        createdAt: now,
        updatedAt: now,
      });
      await this.requireSound(manager, row);
      await manager.insert(SeasonEntity, row);
      await this.audit.record(manager, principal, 'created', this.subject(row));
      return this.describe(row);
    });
  }

  /** @throws DomainError not-found, stale-version, invalid-input */
  async change(
    principal: MemberPrincipal,
    id: string,
    version: number,
    patch: SeasonPatch,
  ): Promise<FieldSeason> {
    return this.database.write(async (manager) => {
      const row = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'season');
      Object.assign(row, patch, { version: version + 1, updatedAt: this.clock.instant() });
      await this.requireSound(manager, row);
      await manager.save(SeasonEntity, row);
      await this.audit.record(manager, principal, 'changed', this.subject(row));
      return this.describe(row);
    });
  }

  async remove(principal: MemberPrincipal, id: string, version: number): Promise<void> {
    await this.database.write(async (manager) => {
      const row = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'season');
      await manager.delete(SeasonEntity, { id });
      await this.audit.record(manager, principal, 'removed', this.subject(row));
    });
  }

  private async reach(
    manager: EntityManager,
    principal: MemberPrincipal,
    id: string,
  ): Promise<SeasonEntity> {
    const { cooperativeId } = principal;
    const row = await manager.findOneBy(SeasonEntity, { id, cooperativeId });
    if (!row || !(await this.fields.isReachable(principal, row.fieldId))) throw notFound('season');
    return row;
  }

  private async requireSound(manager: EntityManager, row: SeasonEntity): Promise<void> {
    if (!this.crops.find(row.cropId)) {
      throw invalid({ path: 'cropId', message: 'This crop is not in the crop table.' });
    }
    const sowing = DateTime.fromISO(row.sowing, { zone: 'utc' });
    const harvest = DateTime.fromISO(row.harvest, { zone: 'utc' });
    if (harvest <= sowing) {
      throw invalid({ path: 'harvest', message: 'Harvest must come after sowing.' });
    }
    if (harvest > sowing.plus({ months: LONGEST_MONTHS })) {
      throw invalid({
        path: 'harvest',
        message: `A season has at most ${LONGEST_MONTHS} months: check the years.`,
      });
    }
    await this.requireFreeGround(manager, row);
  }

  /** Two crops may meet on one day, but not stand on one ground together. */
  private async requireFreeGround(manager: EntityManager, row: SeasonEntity): Promise<void> {
    const others = await manager.findBy(SeasonEntity, { fieldId: row.fieldId });
    const clash = others.find(
      (other) => other.id !== row.id && row.sowing < other.harvest && other.sowing < row.harvest,
    );
    if (!clash) return;
    const crop = this.crops.nameOf(clash.cropId);
    throw invalid({
      path: row.sowing < clash.sowing ? 'harvest' : 'sowing',
      message: `${crop} stands on this field from ${clash.sowing} to ${clash.harvest}.`,
    });
  }

  private subject(row: SeasonEntity) {
    const name = `${this.crops.nameOf(row.cropId)} ${row.sowing} to ${row.harvest}`;
    return { kind: 'season', id: row.id, name };
  }

  private describe(row: SeasonEntity): FieldSeason {
    return {
      id: row.id,
      version: row.version,
      fieldId: row.fieldId,
      cropId: row.cropId,
      cropName: this.crops.nameOf(row.cropId),
      sowing: row.sowing,
      harvest: row.harvest,
      canopyHeightM: row.canopyHeightM,
    };
  }
}
