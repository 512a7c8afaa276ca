import { existsSync } from 'node:fs';
import path from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import type { RunResult } from '@furrowlight/shared/contract/result';
import type { RunInput } from '@furrowlight/shared/contract/run';
import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import { Piscina } from 'piscina';
import type { WorkerTask } from './run.worker.js';

/** One worker: the second core belongs to the people at the screen. */
const THREADS = 1;

/** Work under way in a thread. */
export interface PoolJob {
  done: Promise<RunResult>;
  stop(): void;
  /** Has someone asked it to stop? The error a thread throws loses its name on the way here. */
  stopAsked(): boolean;
}

/** Beside this file when built; in the build folder when tests run from source. */
function workerFile(): string {
  const beside = path.join(import.meta.dirname, 'run.worker.js');
  return existsSync(beside)
    ? beside
    : path.join(import.meta.dirname, '../../dist/runs/run.worker.js');
}

/** Threads that run the light engine, so that requests never wait for it. */
@Injectable()
export class RunPool implements OnApplicationShutdown {
  private pool: Piscina | null = null;
  private readonly flags = new Set<Uint8Array>();

  begin(input: RunInput, onProgress: (share: number) => void): PoolJob {
    this.pool ??= new Piscina({ filename: workerFile(), minThreads: 0, maxThreads: THREADS });
    const stop = new SharedArrayBuffer(1);
    const flag = new Uint8Array(stop);
    const { port1, port2 } = new MessageChannel();
    port1.on('message', onProgress);
    const task: WorkerTask = { input, stop, progress: port2 };
    this.flags.add(flag);
    const done = (this.pool.run(task, { transferList: [port2] }) as Promise<RunResult>).finally(
      () => {
        port1.close();
        this.flags.delete(flag);
      },
    );
    return {
      done,
      stop: () => void Atomics.store(flag, 0, 1),
      stopAsked: () => Atomics.load(flag, 0) === 1,
    };
  }

  /** Ask every run to stop; their rows stay `running` and are taken up at the next start. */
  async onApplicationShutdown(): Promise<void> {
    for (const flag of this.flags) Atomics.store(flag, 0, 1);
    await this.pool?.close({ force: true });
  }
}
