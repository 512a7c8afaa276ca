import { parentPort, workerData } from 'node:worker_threads';
import type { HourlyYear } from '../src/light/weather-year.js';
import { runScenario } from '../src/run/run-scenario.js';
import { candidate, yearInput } from './inputs.js';

const weather = workerData as HourlyYear;

/** Runs candidates `from` to `to` (left out) and answers with the sum of their energy. */
parentPort?.on('message', ({ from, to }: { from: number; to: number }) => {
  let energy = 0;
  for (let n = from; n < to; n += 1) {
    energy += runScenario(yearInput(candidate(n), weather, 40, 30)).energy.kwhPerKwp;
  }
  parentPort?.postMessage(energy);
});
