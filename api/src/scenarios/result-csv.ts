import type { PeriodBudget, RunResult, SunSplit } from '@furrowlight/shared/contract/result';
import { z } from 'zod';

export const ResultTable = z.enum([
  'weeks',
  'months',
  'seasons',
  'weave',
  'energy',
  'sunsplit',
  'crops',
]);
export type ResultTable = z.infer<typeof ResultTable>;

type Cell = string | number | null;

/** Text that a spreadsheet would take for a formula is quoted with an apostrophe; numbers stay numbers. */
function written(cell: Cell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(Number(cell.toFixed(6))) : '';
  const safe = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** Rows as RFC 4180 text. */
export const toCsv = (rows: readonly (readonly Cell[])[]): string =>
  rows.map((row) => `${row.map(written).join(',')}\r\n`).join('');

const BUDGET_HEAD = [
  'days',
  'open field DLI (mol m-2 d-1)',
  'mean DLI (mol m-2 d-1)',
  'darkest tenth DLI (mol m-2 d-1)',
  'brightest tenth DLI (mol m-2 d-1)',
  'mean share of open field',
  'darkest tenth share of open field',
  'brightest tenth share of open field',
  'evenness (darkest over mean)',
  'red : far-red under rows',
  'red : far-red open field',
];

const budgetCells = (budget: PeriodBudget): Cell[] => [
  budget.days,
  budget.openDli,
  budget.meanDli,
  budget.darkestDli,
  budget.brightestDli,
  budget.meanShare,
  budget.darkestShare,
  budget.brightestShare,
  budget.evenness,
  budget.redFarRed,
  budget.redFarRedOpen,
];

function budgets(result: RunResult, pick: 'weeks' | 'months' | 'seasons'): Cell[][] {
  const head = ['canopy height (m)', 'period', ...BUDGET_HEAD];
  const rows = result.planes.flatMap((plane) =>
    plane[pick].map((budget): Cell[] => [plane.heightM, budget.label, ...budgetCells(budget)]),
  );
  return [head, ...rows];
}

function weave(result: RunResult): Cell[][] {
  const head = [
    'canopy height (m)',
    'week',
    'open field DLI (mol m-2 d-1)',
    ...result.positionsM.map((u) => `DLI at ${u.toFixed(3)} m from the row (mol m-2 d-1)`),
  ];
  const rows = result.planes.flatMap((plane) =>
    plane.weekly.map((week, i): Cell[] => [plane.heightM, i + 1, result.openWeekly[i], ...week]),
  );
  return [head, ...rows];
}

const SPLIT_HEAD = [
  'period',
  'sunlight on the land (MJ m-2)',
  'electricity (%)',
  'panel heat (%)',
  'reflected (%)',
  'crop PAR (%)',
  'other light on the crop (%)',
];

const splitCells = (split: SunSplit): Cell[] => [
  split.label,
  split.incomingMjM2,
  split.electricity,
  split.panelHeat,
  split.reflected,
  split.cropPar,
  split.otherOnCrop,
];

function crops(result: RunResult): Cell[][] {
  const head = [
    'crop',
    'window',
    'critical',
    ...BUDGET_HEAD,
    'yield low (of open field)',
    'yield high (of open field)',
    'ET0 open (mm)',
    'ET0 under rows (mm)',
  ];
  const rows = result.crops.flatMap((crop) => [
    [
      crop.cropName,
      'whole season',
      '',
      ...budgetCells(crop.season),
      crop.yield.low,
      crop.yield.high,
      crop.et0OpenMm,
      crop.et0ShadedMm,
    ],
    ...crop.stages.map((stage): Cell[] => [
      crop.cropName,
      stage.budget.label,
      stage.critical ? 'yes' : '',
      ...budgetCells(stage.budget),
    ]),
  ]);
  return [head, ...rows];
}

/** One table of a result, units in its header; every value modelled. */
export function resultCsv(result: RunResult, table: ResultTable): string {
  switch (table) {
    case 'weeks':
    case 'months':
    case 'seasons':
      return toCsv(budgets(result, table));
    case 'weave':
      return toCsv(weave(result));
    case 'energy':
      return toCsv([
        ['month', 'AC energy (kWh per kWp)'],
        ...result.energy.monthly.map(({ month, kwhPerKwp }) => [month, kwhPerKwp]),
      ]);
    case 'sunsplit':
      return toCsv([
        SPLIT_HEAD,
        ...[...result.sunSplit.months, result.sunSplit.year].map(splitCells),
      ]);
    case 'crops':
      return toCsv(crops(result));
  }
}
