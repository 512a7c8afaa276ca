import { gzipSync } from 'node:zlib';
import type { RunResult } from '@furrowlight/shared/contract/result';
import {
  Injectable,
  type OnApplicationBootstrap,
  type OnApplicationShutdown,
} from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { Log } from '../common/log.js';
import { Database } from '../database/database.js';
import { WeatherService } from '../weather/weather.service.js';
import { ResultEntity } from './result.entity.js';
import { RunEntity } from './run.entity.js';
import { RunPool, type PoolJob } from './run-pool.js';

/** Begun this often without an end, a run is given up: it takes the server down with it. */
const MOST_ATTEMPTS = 3;
const PROGRESS_WRITE_MS = 1000;

/**
 * Takes waiting runs from the database one by one.
 *
 * The table is the queue. At start, rows left `running` by a crash wait again; each beginning is
 * counted in the row first, so that a run that kills the server is not begun for ever.
 */
@Injectable()
export class RunQueue implements OnApplicationBootstrap, OnApplicationShutdown {
  private working: Promise<void> | null = null;
  private current: { runId: string; job: PoolJob } | null = null;
  /** The run being taken up, and whether it was told to stop before its thread had it. */
  private taking: { runId: string; stop: boolean } | null = null;
  private progress = new Map<string, number>();
  private closing = false;

  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly weather: WeatherService,
    private readonly pool: RunPool,
    private readonly log: Log,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    await this.database.write((manager) =>
      manager.update(RunEntity, { status: 'running' }, { status: 'queued' }),
    );
    this.wake();
  }

  async onApplicationShutdown(): Promise<void> {
    this.closing = true;
    this.current?.job.stop();
    await this.working;
  }

  /** Look for waiting runs, unless that is under way already. */
  wake(): void {
    if (this.closing || this.working) return;
    this.working = this.drain()
      .catch((error: unknown) => this.log.error(error instanceof Error ? error : String(error)))
      .finally(() => {
        this.working = null;
      });
  }

  /** Latest share done of a run in work, 0-1; fresher than the row. */
  progressOf(runId: string): number | null {
    return this.progress.get(runId) ?? null;
  }

  /** Stop a run in work; a waiting one only needs its row changed. */
  stop(runId: string): void {
    if (this.current?.runId === runId) this.current.job.stop();
    else if (this.taking?.runId === runId) this.taking.stop = true;
  }

  private async drain(): Promise<void> {
    while (!this.closing) {
      const next = await this.database.read.findOne(RunEntity, {
        where: { status: 'queued' },
        order: { createdAt: 'ASC' },
      });
      if (!next) return;
      await this.take(next);
    }
  }

  private async take(run: RunEntity): Promise<void> {
    if (run.attempts >= MOST_ATTEMPTS) {
      await this.finish(
        run,
        'failed',
        'The run was cut off several times. Copy the scenario and run it again; if that fails too, tell your admin.',
      );
      return;
    }
    const taking = { runId: run.id, stop: false };
    this.taking = taking;
    const began = await this.database.write((manager) =>
      manager.update(
        RunEntity,
        { id: run.id, status: 'queued' },
        { status: 'running', attempts: run.attempts + 1, startedAt: this.clock.instant() },
      ),
    );
    if (!began.affected) return;
    const start = performance.now();
    try {
      const { year } = await this.weather.year(run, run.frozen.weatherId);
      const { site, layout, crops, options } = run.frozen.input;
      let written = 0;
      const job = this.pool.begin({ site, layout, crops, options, weather: year }, (share) => {
        this.progress.set(run.id, share);
        const now = performance.now();
        if (now - written < PROGRESS_WRITE_MS) return;
        written = now;
        void this.database
          .write((manager) =>
            manager.update(RunEntity, { id: run.id, status: 'running' }, { progress: share }),
          )
          .catch(() => undefined);
      });
      this.current = { runId: run.id, job };
      if (taking.stop) job.stop();
      const result = await job.done;
      await this.keep(run, result, performance.now() - start);
    } catch (error) {
      await this.fail(run, error);
    } finally {
      this.current = null;
      this.taking = null;
      this.progress.delete(run.id);
    }
  }

  private async keep(run: RunEntity, result: RunResult, durationMs: number): Promise<void> {
    const now = this.clock.instant();
    await this.database.write(async (manager) => {
      await manager.upsert(
        ResultEntity,
        {
          cooperativeId: run.cooperativeId,
          inputHash: run.inputHash,
          result: gzipSync(JSON.stringify(result)),
          createdAt: now,
        },
        ['cooperativeId', 'inputHash'],
      );
      await manager.update(
        RunEntity,
        { id: run.id, status: 'running' },
        { status: 'done', progress: 1, finishedAt: now, durationMs },
      );
    });
  }

  private async fail(run: RunEntity, error: unknown): Promise<void> {
    // A stop at shutdown is no failure: the row waits for the next start.
    if (this.closing) return;
    if (this.current?.job.stopAsked()) {
      await this.finish(run, 'cancelled', null);
      return;
    }
    this.log.error(error instanceof Error ? error : String(error));
    const message = error instanceof Error ? error.message : 'The engine stopped.';
    await this.finish(run, 'failed', `${message} Change the layout or the weather and run again.`);
  }

  private async finish(
    run: RunEntity,
    status: 'failed' | 'cancelled',
    problem: string | null,
  ): Promise<void> {
    await this.database.write((manager) =>
      manager.update(
        RunEntity,
        { id: run.id },
        { status, problem, finishedAt: this.clock.instant() },
      ),
    );
  }
}
