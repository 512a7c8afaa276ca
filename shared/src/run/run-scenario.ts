import { Layout } from '../contract/layout.js';
import type { RunResult } from '../contract/result.js';
import type { RunInput } from '../contract/run.js';
import { InputError } from '../errors.js';
import { requireWeatherYear } from '../light/weather-year.js';
import { fillDaySuns } from './instants.js';
import { runResult } from './result.js';
import { prepareRun } from './state.js';
import { countSun } from './step.js';

/** How a caller follows and ends a run. */
export interface RunWatch {
  /** Called now and then with the share done, 0-1. */
  onProgress?(share: number): void;
  /** Asked once a day of the year; true ends the run with RunStopped. */
  shouldStop?(): boolean;
}

/** A run was ended by its caller. */
export class RunStopped extends Error {
  override readonly name = 'RunStopped';
}

function requireLayout(layout: Layout): void {
  const parsed = Layout.safeParse(layout);
  if (parsed.success) return;
  const [issue] = parsed.error.issues;
  throw new InputError(`layout.${issue.path.join('.')}`, issue.message);
}

/**
 * Run one scenario over a whole weather year: light at every strip of ground and canopy height,
 * panel energy, and where the sunlight went.
 *
 * @param input site, layout, crops, options and weather year (contract/run)
 * @returns everything a result page shows; the same input gives the same result to the last bit
 * @throws InputError naming what is out of range; RunStopped when the caller ended it
 */
export function runScenario(input: RunInput, watch: RunWatch = {}): RunResult {
  requireLayout(input.layout);
  requireWeatherYear(input.weather);
  const state = prepareRun(input);
  for (let day = 0; day < state.days; day += 1) {
    if (watch.shouldStop?.()) throw new RunStopped('The run was stopped.');
    fillDaySuns(input.weather, state.ground, day, state.suns);
    for (let i = 0; i < state.suns.count; i += 1) countSun(state, day, i);
    watch.onProgress?.((day + 1) / state.days);
  }
  return runResult(state);
}
