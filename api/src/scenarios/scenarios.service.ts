import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Field } from '@furrowlight/shared/contract/fields';
import type { ScenarioResult } from '@furrowlight/shared/contract/result';
import type { Run } from '@furrowlight/shared/contract/run';
import type {
  LaidFigures,
  Scenario,
  ScenarioInput,
  ScenarioPatch,
} from '@furrowlight/shared/contract/scenarios';
import { layRows } from '@furrowlight/shared/layout/rows-over-field';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { DomainError, invalid, notFound, requireVersion } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { CropsService } from '../crops/crops.service.js';
import { Database } from '../database/database.js';
import { FieldsService } from '../fields/fields.service.js';
import { ScenarioCounts } from '../fields/scenario-counts.js';
import { SeasonsService } from '../fields/seasons.service.js';
import { RunsService, type FinishedRun } from '../runs/runs.service.js';
import { WeatherService } from '../weather/weather.service.js';
import { freeze } from './freeze.js';
import { ScenarioEntity } from './scenario.entity.js';

const subject = ({ id, name }: ScenarioEntity) => ({ kind: 'scenario', id, name });

/** Rows over the field's boundary; null without one. */
function figuresOf(field: Field, row: ScenarioEntity): LaidFigures | null {
  return field.boundary ? layRows(row.layout, field.boundary.coordinates).figures : null;
}

/** Scenarios of fields. Who reaches the field reaches its scenarios. */
@Injectable()
export class ScenariosService implements OnModuleInit {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly audit: AuditService,
    private readonly fields: FieldsService,
    private readonly seasons: SeasonsService,
    private readonly crops: CropsService,
    private readonly weather: WeatherService,
    private readonly runs: RunsService,
    private readonly counts: ScenarioCounts,
  ) {}

  onModuleInit(): void {
    this.counts.supply(async (cooperativeId) => {
      const rows = await this.database.read
        .createQueryBuilder(ScenarioEntity, 'scenario')
        .select('scenario.fieldId', 'fieldId')
        .addSelect('COUNT(*)', 'count')
        .where({ cooperativeId, archived: false })
        .groupBy('scenario.fieldId')
        .getRawMany<{ fieldId: string; count: number }>();
      return new Map(rows.map((row) => [row.fieldId, Number(row.count)]));
    });
  }

  /** Scenarios of a field, oldest first. @throws DomainError not-found for the field */
  async list(principal: MemberPrincipal, fieldId: string, archived: boolean): Promise<Scenario[]> {
    const field = await this.fields.get(principal, fieldId);
    const rows = await this.database.read.find(ScenarioEntity, {
      where: { fieldId: field.id, archived },
      order: { createdAt: 'ASC' },
    });
    const finished = await this.runs.latest(rows.map((row) => row.id));
    const names = new Map((await this.weather.list(principal)).map(({ id, name }) => [id, name]));
    return rows.map((row) => this.describe(row, field, finished.get(row.id), names));
  }

  async get(principal: MemberPrincipal, id: string): Promise<Scenario> {
    const { row, field } = await this.reach(this.database.read, principal, id);
    return this.describeOne(principal, row, field);
  }

  /** @throws DomainError not-found for the field, invalid-input for the weather */
  async create(principal: MemberPrincipal, input: ScenarioInput): Promise<Scenario> {
    const field = await this.fields.get(principal, input.fieldId);
    await this.requireWeather(principal, input.weatherId ?? null);
    return this.database.write(async (manager) => {
      const now = this.clock.instant();
      const row = manager.create(ScenarioEntity, {
        id: this.ids.next(),
        cooperativeId: principal.cooperativeId,
        fieldId: field.id,
        version: 1,
        name: input.name,
        notes: input.notes ?? '',
        weatherId: input.weatherId ?? null,
        layout: input.layout,
        archived: false,
        createdAt: now,
        updatedAt: now,
      });
      await manager.insert(ScenarioEntity, row);
      await this.audit.record(manager, principal, 'created', subject(row));
      return this.describeOne(principal, row, field);
    });
  }

  /**
   * Change a scenario. What a run has frozen stays: layout and weather are closed once a run waits,
   * works or is done.
   *
   * @throws DomainError not-found, stale-version, conflict, invalid-input
   */
  async change(
    principal: MemberPrincipal,
    id: string,
    version: number,
    patch: ScenarioPatch,
  ): Promise<Scenario> {
    if (patch.weatherId !== undefined) await this.requireWeather(principal, patch.weatherId);
    return this.database.write(async (manager) => {
      const { row, field } = await this.reach(manager, principal, id);
      requireVersion(row.version, version, 'scenario');
      const closing = patch.layout !== undefined || patch.weatherId !== undefined;
      if (closing && (await this.runs.isFrozen(manager, id))) {
        throw new DomainError(
          'conflict',
          'This scenario has been run: its layout and weather are frozen. Copy it and change the copy.',
        );
      }
      Object.assign(row, patch, { version: version + 1, updatedAt: this.clock.instant() });
      await manager.save(ScenarioEntity, row);
      await this.audit.record(manager, principal, 'changed', subject(row));
      return this.describeOne(principal, row, field);
    });
  }

  /** A new scenario with the same layout and weather, not yet run. */
  async copy(principal: MemberPrincipal, id: string, name: string): Promise<Scenario> {
    const { row } = await this.reach(this.database.read, principal, id);
    const { fieldId, layout, weatherId, notes } = row;
    return this.create(principal, { fieldId, layout, weatherId, notes, name });
  }

  /** Freeze the scenario as it stands and put it in the queue. */
  async run(principal: MemberPrincipal, id: string): Promise<Run> {
    const { row, field } = await this.reach(this.database.read, principal, id);
    if (row.weatherId === null) {
      throw invalid({ path: 'weatherId', message: 'Choose a weather year first.' });
    }
    const { hash } = await this.weather.year(principal, row.weatherId);
    const seasons = await this.seasons.list(principal, field.id);
    const input = freeze(field, seasons, (cropId) => this.crops.find(cropId), row.layout, hash);
    return this.runs.start(
      principal,
      { scenarioId: id, name: row.name },
      { input, weatherId: row.weatherId },
    );
  }

  /** A run, for whoever reaches its scenario. */
  async getRun(principal: MemberPrincipal, runId: string): Promise<Run> {
    await this.requireRun(principal, runId);
    return this.runs.get(principal, runId);
  }

  async cancelRun(principal: MemberPrincipal, runId: string): Promise<Run> {
    await this.requireRun(principal, runId);
    return this.runs.cancel(principal, runId);
  }

  /** @throws DomainError not-found while no run is done */
  async result(
    principal: MemberPrincipal,
    id: string,
  ): Promise<{ scenario: Scenario; result: ScenarioResult }> {
    const scenario = await this.get(principal, id);
    return { scenario, result: await this.runs.result(id) };
  }

  /** A run whose scenario is out of reach is missing like any other. */
  private async requireRun(principal: MemberPrincipal, runId: string): Promise<void> {
    const { cooperativeId } = principal;
    const id = await this.runs.scenarioOf(principal, runId);
    const row = await this.database.read.findOneBy(ScenarioEntity, { id, cooperativeId });
    if (!row || !(await this.fields.isReachable(principal, row.fieldId))) throw notFound('run');
  }

  private async reach(manager: EntityManager, principal: MemberPrincipal, id: string) {
    const { cooperativeId } = principal;
    const row = await manager.findOneBy(ScenarioEntity, { id, cooperativeId });
    if (!row || !(await this.fields.isReachable(principal, row.fieldId))) {
      throw notFound('scenario');
    }
    return { row, field: await this.fields.get(principal, row.fieldId) };
  }

  private async requireWeather(principal: MemberPrincipal, id: string | null): Promise<void> {
    if (id === null) return;
    try {
      await this.weather.get(principal, id);
    } catch {
      throw invalid({ path: 'weatherId', message: 'This weather year does not exist (any more).' });
    }
  }

  private async describeOne(
    principal: MemberPrincipal,
    row: ScenarioEntity,
    field: Field,
  ): Promise<Scenario> {
    const finished = (await this.runs.latest([row.id])).get(row.id);
    const names = new Map<string, string>();
    if (row.weatherId !== null) {
      names.set(row.weatherId, (await this.weather.get(principal, row.weatherId)).name);
    }
    return this.describe(row, field, finished, names);
  }

  private describe(
    row: ScenarioEntity,
    field: Field,
    finished: FinishedRun | undefined,
    weatherNames: ReadonlyMap<string, string>,
  ): Scenario {
    return {
      id: row.id,
      version: row.version,
      fieldId: row.fieldId,
      name: row.name,
      notes: row.notes,
      weatherId: row.weatherId,
      weatherName: row.weatherId === null ? null : (weatherNames.get(row.weatherId) ?? null),
      layout: row.layout,
      archived: row.archived,
      figures: figuresOf(field, row),
      frozen: finished?.frozen ?? null,
      inputHash: finished?.run.inputHash ?? null,
      modelVersion: finished?.run.modelVersion ?? null,
      latestRun: finished?.run ?? null,
      createdAt: row.createdAt,
      updatedAt: row.updatedAt,
    };
  }
}
