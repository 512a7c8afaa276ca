import { readFileSync } from 'node:fs';
import path from 'node:path';
import { Crop, type ShadeClass } from '@furrowlight/shared/contract/crops';
import { parse } from 'csv-parse/sync';

/** Beside src and dist, so that both find it. */
const FILE = path.resolve(import.meta.dirname, '../../tables/crops.csv');

type Row = Record<string, string>;

function number(row: Row, column: string): number | null {
  const text = row[column].trim();
  if (text === '') return null;
  const value = Number(text);
  if (!Number.isFinite(value)) throw new Error(`crops.csv: ${row.crop_id} ${column} is "${text}".`);
  return value;
}

const blankToNull = (text: string): string | null => (text.trim() === '' ? null : text.trim());

/** The class proper; between two classes the more cautious one counts. */
export function shadeClassOf(text: string): ShadeClass {
  const head = text
    .trim()
    .toLowerCase()
    .split(/[\s;(]/)[0];
  const named = head.split('/');
  for (const cautious of ['unknown', 'susceptible', 'tolerant', 'benefiting'] as const) {
    if (named.includes(cautious)) return cautious;
  }
  throw new Error(`crops.csv: no shade class in "${text}".`);
}

/** What the table says beyond the bare class belongs to the notes. */
function notesOf(row: Row): string {
  const shade = row.shade_class.trim();
  const qualified = shade === shadeClassOf(shade) ? '' : `Shade: ${shade}.`;
  return [qualified, row.notes.trim()].filter(Boolean).join(' ');
}

function toCrop(row: Row): Crop {
  return Crop.parse({
    id: row.crop_id,
    name: row.name,
    latin: row.latin,
    group: row.laub_group,
    shadeClass: shadeClassOf(row.shade_class),
    photosynthesis: row.photosynthesis,
    dliMinMol: number(row, 'dli_min_mol'),
    dliGoodLowMol: number(row, 'dli_good_lo_mol'),
    dliGoodHighMol: number(row, 'dli_good_hi_mol'),
    dliSource: row.dli_source,
    dliCertainty: row.dli_certainty,
    baseTemperatureC: number(row, 't_base_c'),
    lightUseGPerMj: number(row, 'rue_g_per_mj_ipar'),
    extinction: number(row, 'k_ext'),
    leafAreaMax: number(row, 'lai_max'),
    parameterSource: row.param_source,
    parameterCertainty: row.param_certainty,
    cropCoefficientMid: number(row, 'kc_mid_fao'),
    designHeightM: number(row, 'height_design_m'),
    sowFrom: blankToNull(row.sow_from),
    sowTo: blankToNull(row.sow_to),
    harvestFrom: blankToNull(row.harvest_from),
    harvestTo: blankToNull(row.harvest_to),
    seasonSource: row.season_source,
    criticalBbch: row.critical_bbch,
    criticalNote: row.critical_note,
    criticalSource: row.critical_source,
    criticalCertainty: row.critical_certainty,
    trialPoints: row.yield_points_shade_relyield,
    trialSource: row.yield_points_source,
    notes: notesOf(row),
  });
}

/**
 * Read the crop table.
 *
 * @throws Error naming crop and column that cannot be read
 */
export function readCropTable(): Crop[] {
  const rows: Row[] = parse(readFileSync(FILE, 'utf8'), { columns: true, bom: true });
  return rows.map(toCrop).sort((a, b) => a.name.localeCompare(b.name, 'en'));
}
