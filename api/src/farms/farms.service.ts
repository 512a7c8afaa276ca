import { farmScope, type MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Farm, FarmInput, FarmPatch } from '@furrowlight/shared/contract/farms';
import { Injectable } from '@nestjs/common';
import { IsNull, LessThan, Not, type EntityManager, type FindOptionsWhere } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { DomainError, invalid, notFound, requireVersion } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { MembersService } from '../members/members.service.js';
import { FarmEntity } from './farm.entity.js';
import { FarmTotals, type LandTotal } from './farm-totals.js';

/** What other rooms may know of a farm. */
export interface FarmFacts {
  id: string;
  name: string;
  cooperativeId: string;
}

/** A removed farm. */
export interface RemovedFarm extends FarmFacts {
  deletedAt: string;
}

type Removal = 'standing' | 'removed';

const facts = ({ id, name, cooperativeId }: FarmEntity): FarmFacts => ({ id, name, cooperativeId });
const subject = ({ id, name }: FarmEntity) => ({ kind: 'farm', id, name });

@Injectable()
export class FarmsService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly members: MembersService,
    private readonly totals: FarmTotals,
    private readonly audit: AuditService,
  ) {}

  /** The farms the principal may see, by name. */
  async list(principal: MemberPrincipal): Promise<Farm[]> {
    const where = this.reachable(principal, 'standing');
    if (!where) return [];
    const rows = await this.database.read.find(FarmEntity, { where, order: { name: 'ASC' } });
    const describe = await this.describer(principal.cooperativeId);
    return rows.map(describe);
  }

  /** @throws DomainError not-found for what is missing, removed or not the principal's */
  async get(principal: MemberPrincipal, id: string): Promise<Farm> {
    const row = await this.reach(this.database.read, principal, id);
    return (await this.describer(row.cooperativeId))(row);
  }

  /** Name and cooperative of one farm. @throws DomainError not-found as `get` */
  async facts(principal: MemberPrincipal, id: string): Promise<FarmFacts> {
    return facts(await this.reach(this.database.read, principal, id));
  }

  /** Every farm the principal may see, by id; the measure of what hangs on farms. */
  async reachableFacts(principal: MemberPrincipal): Promise<Map<string, FarmFacts>> {
    const where = this.reachable(principal, 'standing');
    if (!where) return new Map();
    const rows = await this.database.read.findBy(FarmEntity, where);
    return new Map(rows.map((row) => [row.id, facts(row)]));
  }

  /** Is the farm outside the bin? */
  stands(cooperativeId: string, id: string): Promise<boolean> {
    return this.database.read.existsBy(FarmEntity, { id, cooperativeId, deletedAt: IsNull() });
  }

  /** `farmerMemberId` links the holder's own account: that member sees this farm. */
  async create(
    principal: MemberPrincipal,
    input: FarmInput,
    farmerMemberId: string | null = null,
  ): Promise<Farm> {
    return this.database.write(async (manager) => {
      const now = this.clock.instant();
      const row = manager.create(FarmEntity, {
        id: this.ids.next(),
        cooperativeId: principal.cooperativeId,
        version: 1,
        name: input.name,
        holder: input.holder,
        farmNumber: input.farmNumber ?? '',
        place: input.place ?? '',
        advisorId: input.advisorId ?? null,
        farmerMemberId,
        notes: input.notes ?? '',
        createdAt: now,
        updatedAt: now,
        deletedAt: null,
      });
      await this.requireAdvisor(principal, row.advisorId);
      await this.requireFreeName(manager, row);
      await manager.insert(FarmEntity, row);
      await this.audit.record(manager, principal, 'created', subject(row));
      return (await this.describer(row.cooperativeId))(row);
    });
  }

  /** @throws DomainError not-found, stale-version, invalid-input */
  async change(
    principal: MemberPrincipal,
    id: string,
    version: number,
    patch: FarmPatch,
  ): Promise<Farm> {
    return this.database.write(async (manager) => {
      const row = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'farm');
      if (patch.advisorId !== undefined) await this.requireAdvisor(principal, patch.advisorId);
      Object.assign(row, patch, { version: version + 1, updatedAt: this.clock.instant() });
      await this.requireFreeName(manager, row);
      await manager.save(FarmEntity, row);
      await this.audit.record(manager, principal, 'changed', subject(row));
      return (await this.describer(row.cooperativeId))(row);
    });
  }

  /** Into the bin, fields and all; they come back with the farm. */
  async remove(principal: MemberPrincipal, id: string, version: number): Promise<void> {
    await this.database.write(async (manager) => {
      const row = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'farm');
      row.version += 1;
      row.deletedAt = this.clock.instant();
      await manager.save(FarmEntity, row);
      await this.audit.record(manager, principal, 'removed', subject(row));
    });
  }

  /** Out of the bin. */
  async restore(principal: MemberPrincipal, id: string): Promise<Farm> {
    return this.database.write(async (manager) => {
      const row = await this.reach(manager, principal, id, 'removed');
      row.version += 1;
      row.deletedAt = null;
      row.updatedAt = this.clock.instant();
      await this.requireFreeName(manager, row);
      await manager.save(FarmEntity, row);
      await this.audit.record(manager, principal, 'restored', subject(row));
      return (await this.describer(row.cooperativeId))(row);
    });
  }

  /** Remove for good what was put into the bin before an instant. */
  async purge(before: string): Promise<void> {
    await this.database.write((manager) =>
      manager.delete(FarmEntity, { deletedAt: LessThan(before) }),
    );
  }

  async removed(principal: MemberPrincipal): Promise<RemovedFarm[]> {
    const where = this.reachable(principal, 'removed');
    if (!where) return [];
    const rows = await this.database.read.findBy(FarmEntity, where);
    return rows.map((row) => ({ ...facts(row), deletedAt: row.deletedAt ?? '' }));
  }

  /** Rows a principal may reach, as a condition; null when there are none. */
  private reachable(
    principal: MemberPrincipal,
    removal: Removal,
  ): FindOptionsWhere<FarmEntity> | null {
    const deletedAt = removal === 'standing' ? IsNull() : Not(IsNull());
    const scope = farmScope(principal);
    switch (scope.kind) {
      case 'cooperative':
        return { cooperativeId: scope.cooperativeId, deletedAt };
      case 'held-by':
        return { cooperativeId: scope.cooperativeId, farmerMemberId: scope.memberId, deletedAt };
      case 'none':
        return null;
    }
  }

  private async reach(
    manager: EntityManager,
    principal: MemberPrincipal,
    id: string,
    removal: Removal = 'standing',
  ): Promise<FarmEntity> {
    const where = this.reachable(principal, removal);
    const row = where ? await manager.findOneBy(FarmEntity, { ...where, id }) : null;
    if (!row) throw notFound('farm');
    return row;
  }

  private async requireAdvisor(principal: MemberPrincipal, advisorId: string | null) {
    if (advisorId === null) return;
    const members = await this.members.list(principal);
    const advisor = members.find((member) => member.id === advisorId);
    if (!advisor?.active || !['admin', 'advisor'].includes(advisor.role)) {
      throw invalid({ path: 'advisorId', message: 'Choose an advisor of your cooperative.' });
    }
  }

  private async requireFreeName(manager: EntityManager, row: FarmEntity): Promise<void> {
    const { id, cooperativeId, name, holder } = row;
    const where = { id: Not(id), cooperativeId, name, holder, deletedAt: IsNull() };
    if (await manager.existsBy(FarmEntity, where)) {
      throw new DomainError('conflict', `There is already a farm ${name} of ${holder}.`, [
        { path: 'name', message: 'This farm is already in the list.' },
      ]);
    }
  }

  private async describer(cooperativeId: string): Promise<(row: FarmEntity) => Farm> {
    const names = await this.members.names(cooperativeId);
    const totals = await this.totals.ask(cooperativeId);
    const none: LandTotal = { fieldCount: 0, areaM2: 0 };
    return (row) => ({
      id: row.id,
      version: row.version,
      name: row.name,
      holder: row.holder,
      farmNumber: row.farmNumber,
      place: row.place,
      advisorId: row.advisorId,
      advisorName: row.advisorId === null ? null : (names.get(row.advisorId) ?? null),
      notes: row.notes,
      ...(totals.get(row.id) ?? none),
      updatedAt: row.updatedAt,
    });
  }
}
