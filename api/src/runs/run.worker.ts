import type { MessagePort } from 'node:worker_threads';
import type { RunResult } from '@furrowlight/shared/contract/result';
import type { RunInput } from '@furrowlight/shared/contract/run';
import { runScenario } from '@furrowlight/shared/run/run-scenario';

/** What a worker thread is handed. */
export interface WorkerTask {
  input: RunInput;
  /** One shared byte; 1 asks the run to stop. */
  stop: SharedArrayBuffer;
  /** Progress 0-1 is posted here. */
  progress: MessagePort;
}

const PROGRESS_EVERY_MS = 250;

/** Run one scenario in a worker thread. */
export default function runInWorker({ input, stop, progress }: WorkerTask): RunResult {
  const flag = new Uint8Array(stop);
  let told = 0;
  return runScenario(input, {
    shouldStop: () => Atomics.load(flag, 0) === 1,
    onProgress: (share) => {
      const now = Date.now();
      if (now - told < PROGRESS_EVERY_MS) return;
      told = now;
      progress.postMessage(share);
    },
  });
}
