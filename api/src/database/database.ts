import { AsyncLocalStorage } from 'node:async_hooks';
import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { DataSource, EntityManager } from 'typeorm';

/** One transaction under way. */
interface Unit {
  manager: EntityManager;
  effects: (() => void)[];
  open: boolean;
}

/**
 * The way to the rows.
 *
 * TypeORM shares one connection among all requests on SQLite: a transaction of one request would
 * swallow the statements of another. Writes are therefore queued and run one at a time on the
 * writer; reads go to a second connection and see committed rows only. Inside `write`, `read` is
 * the transaction's own manager, and a nested `write` joins the transaction.
 */
@Injectable()
export class Database implements OnApplicationShutdown {
  private tail: Promise<unknown> = Promise.resolve();
  private readonly units = new AsyncLocalStorage<Unit>();

  constructor(
    private readonly writer: DataSource,
    private readonly reader: DataSource,
  ) {}

  /** For queries; never save through it. */
  get read(): EntityManager {
    return this.unit()?.manager ?? this.reader.manager;
  }

  /** Run `work` in one transaction; it is durable on disk when the promise resolves. */
  async write<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    const joined = this.unit();
    if (joined) return work(joined.manager);
    const turn = this.tail.then(() => this.transact(work));
    this.tail = turn.catch(() => undefined);
    return turn;
  }

  /** Run `effect` once the transaction under way is committed; at once where there is none. */
  afterCommit(effect: () => void): void {
    const unit = this.unit();
    if (unit) unit.effects.push(effect);
    else effect();
  }

  async onApplicationShutdown(): Promise<void> {
    await this.tail;
    if (this.reader.isInitialized) await this.reader.destroy();
    if (this.writer.isInitialized) await this.writer.destroy();
  }

  private unit(): Unit | undefined {
    const unit = this.units.getStore();
    return unit?.open ? unit : undefined;
  }

  private async transact<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    const effects: (() => void)[] = [];
    const result = await this.writer.transaction(async (manager) => {
      const unit: Unit = { manager, effects, open: true };
      try {
        return await this.units.run(unit, () => work(manager));
      } finally {
        unit.open = false;
      }
    });
    this.units.exit(() => effects.forEach((effect) => effect()));
    return result;
  }
}
