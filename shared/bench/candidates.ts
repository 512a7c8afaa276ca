import { Worker } from 'node:worker_threads';
import type { HourlyYear } from '../src/light/weather-year.js';

/** Two threads that run candidates of a layout search. */
export interface CandidatePool {
  run(from: number, to: number): Promise<void>;
  close(): Promise<void>;
}

export function startCandidates(weather: HourlyYear): CandidatePool {
  const file = new URL('./candidates-worker.js', import.meta.url);
  const workers = [0, 1].map(() => new Worker(file, { workerData: weather }));
  const half = (worker: Worker, from: number, to: number) =>
    new Promise<void>((done, fail) => {
      worker.once('message', () => done());
      worker.once('error', fail);
      worker.postMessage({ from, to });
    });
  return {
    async run(from, to) {
      const middle = Math.floor((from + to) / 2);
      await Promise.all([half(workers[0], from, middle), half(workers[1], middle, to)]);
    },
    async close() {
      await Promise.all(workers.map((worker) => worker.terminate()));
    },
  };
}
