import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Field, FieldInput, FieldPatch, LonLat } from '@furrowlight/shared/contract/fields';
import { Injectable } from '@nestjs/common';
import { In, IsNull, LessThan, Not, type EntityManager } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { notFound, requireVersion } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { FarmsService, type FarmFacts } from '../farms/farms.service.js';
import { FieldEntity } from './field.entity.js';
import { toField } from './field-mapper.js';
import { groundOf } from './ground.js';
import { ScenarioCounts } from './scenario-counts.js';
import { SeasonEntity } from './season.entity.js';

/** A removed field of a standing farm. */
export interface RemovedField {
  id: string;
  name: string;
  farmName: string;
  deletedAt: string;
}

const subject = ({ id, name }: FieldEntity) => ({ kind: 'field', id, name });

@Injectable()
export class FieldsService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly farms: FarmsService,
    private readonly scenarioCounts: ScenarioCounts,
    private readonly audit: AuditService,
  ) {}

  /** The fields the principal may see, by name; those of one farm where it is given. */
  async list(principal: MemberPrincipal, farmId: string | null): Promise<Field[]> {
    const farms = await this.farmsInView(principal, farmId);
    if (farms.size === 0) return [];
    const whole = farmId === null && principal.role !== 'farmer';
    const rows = await this.database.read.find(FieldEntity, {
      where: whole
        ? { cooperativeId: principal.cooperativeId, deletedAt: IsNull() }
        : { farmId: In([...farms.keys()]), deletedAt: IsNull() },
      order: { name: 'ASC' },
    });
    const seasons = await this.seasonCounts(this.database.read, principal.cooperativeId);
    const scenarios = await this.scenarioCounts.ask(principal.cooperativeId);
    return rows.flatMap((row) => {
      const farm = farms.get(row.farmId);
      if (!farm) return [];
      const around = {
        farmName: farm.name,
        seasonCount: seasons.get(row.id) ?? 0,
        scenarioCount: scenarios.get(row.id) ?? 0,
      };
      return [toField(row, around)];
    });
  }

  /** @throws DomainError not-found for what is missing, removed or not the principal's */
  async get(principal: MemberPrincipal, id: string): Promise<Field> {
    const { row, farm } = await this.reach(this.database.read, principal, id);
    return this.describe(this.database.read, row, farm.name);
  }

  /** May the principal see this field, and does it stand? */
  async isReachable(principal: MemberPrincipal, id: string): Promise<boolean> {
    return (await this.find(this.database.read, principal, id, false)) !== null;
  }

  /** Is the field, with its farm, outside the bin? For links, whose visitors are no members. */
  async stands(cooperativeId: string, id: string): Promise<boolean> {
    const where = { id, cooperativeId, deletedAt: IsNull() };
    const row = await this.database.read.findOneBy(FieldEntity, where);
    return row !== null && (await this.farms.stands(cooperativeId, row.farmId));
  }

  /** @throws DomainError not-found for the farm, invalid-input for the ground */
  async create(principal: MemberPrincipal, input: FieldInput): Promise<Field> {
    return this.database.write(async (manager) => {
      const farm = await this.farms.facts(principal, input.farmId);
      const home = await this.homeOf(manager, farm, null);
      const now = this.clock.instant();
      const row = manager.create(FieldEntity, {
        id: this.ids.next(),
        cooperativeId: farm.cooperativeId,
        farmId: farm.id,
        version: 1,
        name: input.name,
        elevationM: input.elevationM ?? 0,
        slopePercent: input.slopePercent ?? 0,
        aspectDeg: input.aspectDeg ?? 180,
        albedo: input.albedo ?? 0.2,
        occluders: input.occluders ?? [],
        notes: input.notes ?? '',
        createdAt: now,
        updatedAt: now,
        deletedAt: null,
        ...groundOf(input.pin, input.boundary ?? null, home),
      });
      await manager.insert(FieldEntity, row);
      await this.audit.record(manager, principal, 'created', subject(row));
      return this.describe(manager, row, farm.name);
    });
  }

  /** @throws DomainError not-found, stale-version, invalid-input */
  async change(
    principal: MemberPrincipal,
    id: string,
    version: number,
    patch: FieldPatch,
  ): Promise<Field> {
    return this.database.write(async (manager) => {
      const { row, farm } = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'field');
      const { pin, boundary, ...rest } = patch;
      Object.assign(row, rest, { version: version + 1, updatedAt: this.clock.instant() });
      if (pin !== undefined || boundary !== undefined) {
        const home = await this.homeOf(manager, farm, row.id);
        const nextPin: LonLat = pin ?? [row.longitude, row.latitude];
        const nextBoundary = boundary === undefined ? row.boundary : boundary;
        Object.assign(row, groundOf(nextPin, nextBoundary, home));
      }
      await manager.save(FieldEntity, row);
      await this.audit.record(manager, principal, 'changed', subject(row));
      return this.describe(manager, row, farm.name);
    });
  }

  /** Into the bin with everything that hangs on it. */
  async remove(principal: MemberPrincipal, id: string, version: number): Promise<void> {
    await this.database.write(async (manager) => {
      const { row } = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'field');
      row.version += 1;
      row.deletedAt = this.clock.instant();
      await manager.save(FieldEntity, row);
      await this.audit.record(manager, principal, 'removed', subject(row));
    });
  }

  /** Out of the bin; its farm must stand. */
  async restore(principal: MemberPrincipal, id: string): Promise<Field> {
    return this.database.write(async (manager) => {
      const { row, farm } = await this.reach(manager, principal, id, true);
      row.version += 1;
      row.deletedAt = null;
      row.updatedAt = this.clock.instant();
      await manager.save(FieldEntity, row);
      await this.audit.record(manager, principal, 'restored', subject(row));
      return this.describe(manager, row, farm.name);
    });
  }

  /** Remove for good what was put into the bin before an instant. */
  async purge(before: string): Promise<void> {
    await this.database.write((manager) =>
      manager.delete(FieldEntity, { deletedAt: LessThan(before) }),
    );
  }

  async removed(principal: MemberPrincipal): Promise<RemovedField[]> {
    const farms = await this.farms.reachableFacts(principal);
    const { cooperativeId } = principal;
    const where = { cooperativeId, deletedAt: Not(IsNull()) };
    const rows = await this.database.read.findBy(FieldEntity, where);
    return rows.flatMap(({ id, name, farmId, deletedAt }) => {
      const farm = farms.get(farmId);
      return farm && deletedAt !== null ? [{ id, name, farmName: farm.name, deletedAt }] : [];
    });
  }

  private async farmsInView(principal: MemberPrincipal, farmId: string | null) {
    if (farmId === null) return this.farms.reachableFacts(principal);
    const farm = await this.farms.facts(principal, farmId);
    return new Map<string, FarmFacts>([[farm.id, farm]]);
  }

  private async find(
    manager: EntityManager,
    principal: MemberPrincipal,
    id: string,
    removed: boolean,
  ): Promise<{ row: FieldEntity; farm: FarmFacts } | null> {
    const row = await manager.findOneBy(FieldEntity, {
      id,
      cooperativeId: principal.cooperativeId,
      deletedAt: removed ? Not(IsNull()) : IsNull(),
    });
    const farm = row && (await this.farms.reachableFacts(principal)).get(row.farmId);
    return row && farm ? { row, farm } : null;
  }

  private async reach(
    manager: EntityManager,
    principal: MemberPrincipal,
    id: string,
    removed = false,
  ): Promise<{ row: FieldEntity; farm: FarmFacts }> {
    const found = await this.find(manager, principal, id, removed);
    if (!found) throw notFound('field');
    return found;
  }

  /** Middle of the farm's other fields, else of the cooperative's; null where there are none. */
  private async homeOf(
    manager: EntityManager,
    farm: FarmFacts,
    except: string | null,
  ): Promise<LonLat | null> {
    const { cooperativeId } = farm;
    const others = { cooperativeId, deletedAt: IsNull(), ...(except ? { id: Not(except) } : {}) };
    const ofFarm = { ...others, farmId: farm.id };
    for (const where of [ofFarm, others]) {
      const longitude = await manager.average(FieldEntity, 'longitude', where);
      const latitude = await manager.average(FieldEntity, 'latitude', where);
      if (longitude !== null && latitude !== null) return [longitude, latitude];
    }
    return null;
  }

  private async seasonCounts(
    manager: EntityManager,
    cooperativeId: string,
  ): Promise<Map<string, number>> {
    const rows = await manager
      .createQueryBuilder(SeasonEntity, 'season')
      .select('season.fieldId', 'fieldId')
      .addSelect('COUNT(*)', 'count')
      .where({ cooperativeId })
      .groupBy('season.fieldId')
      .getRawMany<{ fieldId: string; count: number }>();
    return new Map(rows.map((row) => [row.fieldId, Number(row.count)]));
  }

  private async describe(
    manager: EntityManager,
    row: FieldEntity,
    farmName: string,
  ): Promise<Field> {
    const scenarios = await this.scenarioCounts.ask(row.cooperativeId);
    return toField(row, {
      farmName,
      seasonCount: await manager.countBy(SeasonEntity, { fieldId: row.id }),
      scenarioCount: scenarios.get(row.id) ?? 0,
    });
  }
}
