import { preparePreview, previewLayout } from '../src/run/preview.js';
import { runScenario } from '../src/run/run-scenario.js';
import { startCandidates } from './candidates.js';
import { fieldSeason } from './field.js';
import { benchWeather, OVERHEAD, SITE, TRACKER, yearInput } from './inputs.js';
import { prepareKernel } from './kernel.js';

/** Measured rounds of each task; the middle one counts. */
const ROUNDS = 5;

/** Candidates of the search task, run in as many equal batches as there are rounds. */
const CANDIDATES = 1000;

/** One line of the table. Seconds. */
interface Line {
  task: string;
  seconds: number;
  /** Against the calibration kernel of this machine. */
  ratio: number;
  aimSeconds: number | null;
}

interface Task {
  name: string;
  aimSeconds: number | null;
  /** Called once before measuring, to warm up. */
  warm?(): void | Promise<void>;
  run(round: number): void | Promise<void>;
  /** How many times the measured part makes the whole task. */
  times?: number;
}

async function secondsOf(task: Task): Promise<number> {
  await (task.warm ?? (() => task.run(0)))();
  const times: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    const start = performance.now();
    await task.run(round);
    times.push((performance.now() - start) / 1000);
  }
  times.sort((a, b) => a - b);
  return times[Math.floor(ROUNDS / 2)] * (task.times ?? 1);
}

function tasks(): { list: Task[]; close(): Promise<void> } {
  const weather = benchWeather();
  const place = preparePreview(SITE, weather);
  const season = { firstDay: 60, days: 150 };
  const pool = startCandidates(weather);
  const kernel = prepareKernel();
  const batch = CANDIDATES / ROUNDS;
  const year = (name: string, layout: typeof OVERHEAD, aimSeconds: number): Task => ({
    name,
    aimSeconds,
    run: () => void runScenario(yearInput(layout, weather, 100, 10)),
  });
  const preview = (name: string, layout: typeof OVERHEAD): Task => ({
    name,
    aimSeconds: 0.016,
    warm: () => {
      for (let i = 0; i < 20; i += 1) previewLayout(place, layout, 1, season);
    },
    run: (round) =>
      void previewLayout(place, { ...layout, pitchM: layout.pitchM + round / 10 }, 1, season),
  });
  return {
    list: [
      { name: 'calibration kernel', aimSeconds: null, run: () => void kernel() },
      year('year, endless rows, 10-minute suns, 100 positions', OVERHEAD, 0.25),
      year('the same with tracker', TRACKER, 1),
      {
        name: 'field map, 10,000 receivers, finite rows, a season by week',
        aimSeconds: 3,
        run: () => void fieldSeason(weather),
      },
      preview('live preview, one season, 40 positions', OVERHEAD),
      preview('live preview with tracker', TRACKER),
      {
        name: '1,000 candidate layouts, a year each at half-hour suns and 40 positions, 2 threads',
        aimSeconds: 60,
        warm: () => pool.run(0, 4),
        run: (round) => pool.run(round * batch, (round + 1) * batch),
        times: ROUNDS,
      },
    ],
    close: () => pool.close(),
  };
}

async function measure(): Promise<Line[]> {
  const { list, close } = tasks();
  const lines: Line[] = [];
  for (const task of list) {
    const seconds = await secondsOf(task);
    const unit = lines.length > 0 ? lines[0].seconds : seconds;
    lines.push({ task: task.name, seconds, ratio: seconds / unit, aimSeconds: task.aimSeconds });
  }
  await close();
  return lines;
}

const asText = ({ task, seconds, ratio, aimSeconds }: Line): string =>
  [
    `${seconds.toFixed(4).padStart(9)} s`,
    `${ratio.toFixed(2).padStart(8)} x kernel`,
    aimSeconds === null ? ' '.repeat(12) : `aim ${aimSeconds} s`.padEnd(12),
    task,
  ].join('  ');

const lines = await measure();
console.log(
  process.argv.includes('--json') ? JSON.stringify(lines, null, 2) : lines.map(asText).join('\n'),
);
