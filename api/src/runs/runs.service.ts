import { gunzipSync } from 'node:zlib';
import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { RunResult, ScenarioResult } from '@furrowlight/shared/contract/result';
import type { FrozenInput, Run } from '@furrowlight/shared/contract/run';
import { MODEL_VERSION } from '@furrowlight/shared/run/model-version';
import { Injectable } from '@nestjs/common';
import { In, MoreThan, type EntityManager } from 'typeorm';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { DomainError, notFound } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { inputHash } from './input-hash.js';
import { ResultEntity } from './result.entity.js';
import { RunEntity, type FrozenRun } from './run.entity.js';
import { RunQueue } from './run-queue.js';

/** The scenario a run belongs to, as its own room vouches for it. */
export interface RunSubject {
  scenarioId: string;
  name: string;
}

/** A finished run with what it rests on. */
export interface FinishedRun {
  run: Run;
  frozen: FrozenInput;
}

/** How the newest run of a scenario ended. */
export interface EndedRun {
  scenarioId: string;
  status: 'done' | 'failed';
  finishedAt: string;
  problem: string | null;
}

/**
 * Runs of scenarios. Callers have checked that the principal may reach the scenario; the scenario
 * id is the key to everything here.
 */
@Injectable()
export class RunsService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly queue: RunQueue,
    private readonly audit: AuditService,
  ) {}

  /**
   * Put a frozen input in the queue. A result made from the very same input is taken at once.
   *
   * @throws DomainError conflict while another run of the scenario waits or works
   */
  async start(principal: MemberPrincipal, subject: RunSubject, frozen: FrozenRun): Promise<Run> {
    const hash = inputHash(frozen.input, MODEL_VERSION);
    const { cooperativeId } = principal;
    return this.database.write(async (manager) => {
      const busy = await manager.findOneBy(RunEntity, {
        scenarioId: subject.scenarioId,
        status: In(['queued', 'running']),
      });
      if (busy) throw new DomainError('conflict', 'A run of this scenario is under way already.');
      const known = await manager.existsBy(ResultEntity, { cooperativeId, inputHash: hash });
      const now = this.clock.instant();
      const row = manager.create(RunEntity, {
        id: this.ids.next(),
        cooperativeId,
        scenarioId: subject.scenarioId,
        status: known ? 'done' : 'queued',
        progress: known ? 1 : 0,
        problem: null,
        modelVersion: MODEL_VERSION,
        inputHash: hash,
        frozen,
        attempts: 0,
        durationMs: known ? 0 : null,
        createdAt: now,
        startedAt: known ? now : null,
        finishedAt: known ? now : null,
      });
      await manager.insert(RunEntity, row);
      await this.audit.record(manager, principal, 'ran', {
        kind: 'scenario',
        id: subject.scenarioId,
        name: subject.name,
      });
      this.database.afterCommit(() => this.queue.wake());
      return this.toContract(row);
    });
  }

  /** Newest run of each scenario. */
  async latest(scenarioIds: readonly string[]): Promise<Map<string, FinishedRun>> {
    if (scenarioIds.length === 0) return new Map();
    const rows = await this.database.read.find(RunEntity, {
      where: { scenarioId: In([...scenarioIds]) },
      order: { createdAt: 'ASC' },
    });
    return new Map(
      rows.map((row) => [row.scenarioId, { run: this.toContract(row), frozen: row.frozen.input }]),
    );
  }

  /** Newest end of each scenario's runs after an instant; cancelled ones are nobody's news. */
  async endedSince(cooperativeId: string, since: string): Promise<EndedRun[]> {
    const rows = await this.database.read.find(RunEntity, {
      select: { id: true, scenarioId: true, status: true, finishedAt: true, problem: true },
      where: {
        cooperativeId,
        status: In(['done', 'failed']),
        finishedAt: MoreThan(since),
      },
      order: { createdAt: 'ASC' },
    });
    const newest = new Map(
      rows.map(({ scenarioId, status, finishedAt, problem }): [string, EndedRun] => [
        scenarioId,
        {
          scenarioId,
          status: status === 'done' ? 'done' : 'failed',
          finishedAt: finishedAt ?? since,
          problem,
        },
      ]),
    );
    return [...newest.values()];
  }

  /** Has any run of the scenario finished well? Its layout is closed then. */
  async isFrozen(manager: EntityManager, scenarioId: string): Promise<boolean> {
    return manager.existsBy(RunEntity, { scenarioId, status: In(['done', 'queued', 'running']) });
  }

  /** The scenario a run belongs to. @throws DomainError not-found outside the cooperative */
  async scenarioOf({ cooperativeId }: MemberPrincipal, runId: string): Promise<string> {
    const row = await this.database.read.findOneBy(RunEntity, { id: runId, cooperativeId });
    if (!row) throw notFound('run');
    return row.scenarioId;
  }

  async get({ cooperativeId }: MemberPrincipal, runId: string): Promise<Run> {
    const row = await this.database.read.findOneBy(RunEntity, { id: runId, cooperativeId });
    if (!row) throw notFound('run');
    return this.toContract(row);
  }

  /** Stop a waiting or working run; ended runs stay as they are. */
  async cancel(principal: MemberPrincipal, runId: string): Promise<Run> {
    const { cooperativeId } = principal;
    await this.database.write((manager) =>
      manager.update(
        RunEntity,
        { id: runId, cooperativeId, status: 'queued' },
        { status: 'cancelled', finishedAt: this.clock.instant() },
      ),
    );
    this.queue.stop(runId);
    return this.get(principal, runId);
  }

  /**
   * Newest finished result of a scenario.
   *
   * @throws DomainError not-found while there is none
   */
  async result(scenarioId: string): Promise<ScenarioResult> {
    const row = await this.database.read.findOne(RunEntity, {
      where: { scenarioId, status: 'done' },
      order: { createdAt: 'DESC' },
    });
    if (!row) throw new DomainError('not-found', 'This scenario has no finished run yet.');
    return {
      scenarioId,
      runId: row.id,
      inputHash: row.inputHash,
      finishedAt: row.finishedAt ?? row.createdAt,
      durationMs: row.durationMs ?? 0,
      result: await this.stored(row.cooperativeId, row.inputHash),
    };
  }

  /** A stored result by its hash. */
  async stored(cooperativeId: string, hash: string): Promise<RunResult> {
    const row = await this.database.read.findOneBy(ResultEntity, {
      cooperativeId,
      inputHash: hash,
    });
    if (!row) throw notFound('result');
    return JSON.parse(gunzipSync(row.result).toString('utf8')) as RunResult;
  }

  private toContract(row: RunEntity): Run {
    const live = row.status === 'running' ? this.queue.progressOf(row.id) : null;
    return {
      id: row.id,
      scenarioId: row.scenarioId,
      status: row.status,
      progress: live ?? row.progress,
      problem: row.problem,
      modelVersion: row.modelVersion,
      inputHash: row.inputHash,
      createdAt: row.createdAt,
      startedAt: row.startedAt,
      finishedAt: row.finishedAt,
    };
  }
}
