import { splitGlobal } from '@furrowlight/shared/light/decomposition';
import { testRadiation, type QualityCode } from '@furrowlight/shared/light/quality';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import type { Findings } from './findings.js';
import { fillShortGaps, gapsIn, type HourSeries } from './hours.js';
import { extraterrestrialKwh, lateMinutes, type SunTable } from './sun-table.js';

const HOURS = 8760;
/** Below this mean sine of the sun's altitude a beam cannot be told from global and diffuse. */
const LOWEST_SINE = 0.03;
/** Yearly global over extraterrestrial that any place on land has (about 0.3 to 0.75). */
const CLEARNESS = { low: 0.2, high: 0.85 };
const LATE_MINUTES = 25;

const isGiven = (values: Float64Array) => values.some((value) => !Number.isNaN(value));

/** Work out global, direct and diffuse from what the file gives. */
function completeRadiation(series: HourSeries, sun: SunTable, findings: Findings): void {
  const { ghi, dni, dhi, beamHorizontal } = series;
  const given = {
    ghi: isGiven(ghi),
    dni: isGiven(dni),
    dhi: isGiven(dhi),
    bhi: isGiven(beamHorizontal),
  };
  for (let hour = 0; hour < HOURS; hour += 1) {
    const sine = sun.meanSine[hour];
    if (!given.dhi && given.bhi && given.ghi) dhi[hour] = ghi[hour] - beamHorizontal[hour];
    if (!given.ghi && given.dhi) {
      ghi[hour] = dhi[hour] + (given.bhi ? beamHorizontal[hour] : dni[hour] * sine);
    }
    if (!given.dhi && !given.bhi && given.dni && given.ghi)
      dhi[hour] = ghi[hour] - dni[hour] * sine;
  }
  if (given.ghi && !given.dhi && !given.dni && !given.bhi) {
    findings.add(
      'note',
      'split-by-model',
      'Only global light is given: it was split into direct and diffuse after Erbs 1982.',
    );
    for (let hour = 0; hour < HOURS; hour += 1) {
      if (Number.isNaN(ghi[hour])) continue;
      const parts = splitGlobal(
        Math.max(ghi[hour], 0),
        sun.meanSine[hour],
        sun.extraterrestrial[hour],
      );
      dhi[hour] = parts.dhi;
      dni[hour] = parts.dni;
    }
  }
  if (!given.dni) {
    for (let hour = 0; hour < HOURS; hour += 1) {
      const sine = sun.meanSine[hour];
      if (!Number.isNaN(dni[hour])) continue;
      dni[hour] = sine > LOWEST_SINE ? Math.max(ghi[hour] - dhi[hour], 0) / sine : 0;
    }
  }
}

/** Small negative night values become 0, saying so; larger ones refuse the file. */
function clearNights(series: HourSeries, findings: Findings): void {
  for (const name of ['ghi', 'dni', 'dhi'] as const) {
    const values = series[name];
    for (let hour = 0; hour < HOURS; hour += 1) {
      if (!(values[hour] < 0)) continue;
      if (values[hour] < -20) {
        findings.add('refuse', `negative-${name}`, `${name.toUpperCase()} is far below zero.`, [
          series.line[hour],
        ]);
      } else if (values[hour] < -0.5) {
        findings.add(
          'note',
          `night-${name}`,
          `Small negative ${name.toUpperCase()} values were taken as 0.`,
          [series.line[hour]],
        );
      }
      values[hour] = 0;
    }
  }
}

const QUALITY_WORDS: Record<QualityCode, string> = {
  'ghi-impossible': 'Global light is above what is physically possible (BSRN limit).',
  'dhi-impossible': 'Diffuse light is above what is physically possible (BSRN limit).',
  'dni-impossible': 'Direct light is stronger than above the air.',
  'ghi-rare': 'Global light is in the extremely rare range (BSRN limit).',
  'dhi-rare': 'Diffuse light is in the extremely rare range (BSRN limit).',
  'dni-rare': 'Direct light is in the extremely rare range (BSRN limit).',
  closure: 'Global does not equal diffuse plus direct on the horizontal (8 %, low sun 15 %).',
  'diffuse-above-global': 'Diffuse is above global.',
};

function testHours(series: HourSeries, sun: SunTable, findings: Findings): void {
  for (let hour = 0; hour < HOURS; hour += 1) {
    const codes = testRadiation({
      ghi: series.ghi[hour],
      dni: series.dni[hour],
      dhi: series.dhi[hour],
      cosZenith: sun.meanSine[hour],
      extraterrestrial: sun.extraterrestrial[hour],
    });
    for (const code of codes) {
      findings.add('warn', code, QUALITY_WORDS[code], [series.line[hour]]);
    }
  }
}

/** Yearly sum against what arrives above the air; a wrong unit shows at once. */
function requirePlausibleSum(series: HourSeries, sun: SunTable, findings: Findings): void {
  const kwh = series.ghi.reduce((sum, value) => sum + value, 0) / 1000;
  const above = extraterrestrialKwh(sun);
  const share = kwh / above;
  if (share >= CLEARNESS.low && share <= CLEARNESS.high) return;
  const guesses: [string, number][] = [
    ['kJ/m2', 1 / 3.6],
    ['MJ/m2', 1 / 0.0036],
    ['kWh/m2', 1000],
    ['J/m2', 1 / 3600],
  ];
  const fitting = guesses.find(([, factor]) => share * factor > 0.25 && share * factor < 0.8);
  findings.add(
    'refuse',
    'implausible-sum',
    `Global light sums to ${kwh.toFixed(0)} kWh/m2 a year; above the air there are ${above.toFixed(0)}. ` +
      (fitting
        ? `The column looks like ${fitting[0]}: choose that unit.`
        : 'Check the unit and the column.'),
  );
}

/** Compare the file's clock with the sun. */
function checkClock(
  series: HourSeries,
  place: { latitude: number; longitude: number; utcOffsetHours: number },
  findings: Findings,
): void {
  const late = lateMinutes(
    series.ghi,
    series.year,
    place.latitude,
    place.longitude,
    place.utcOffsetHours,
  );
  if (Math.abs(late) < LATE_MINUTES) return;
  findings.add(
    'warn',
    'clock-shift',
    `Radiation comes about ${Math.abs(late)} minutes ${late > 0 ? 'later' : 'earlier'} than the sun here. ` +
      'Check the UTC offset and whether stamps begin or end the hour.',
  );
}

/**
 * Complete, test and sign off the series of a file as a weather year.
 *
 * @returns the year, or null when a finding refuses it
 */
export function completeYear(
  series: HourSeries,
  place: { latitude: number; longitude: number; utcOffsetHours: number },
  sun: SunTable,
  findings: Findings,
): HourlyYear | null {
  const { ghi, dni, dhi, beamHorizontal, temperature, wind } = series;
  const pairs = [ghi, dni, dhi, beamHorizontal].filter(isGiven).length;
  if (!isGiven(ghi) && (pairs < 2 || !isGiven(dhi))) {
    findings.add(
      'refuse',
      'no-radiation',
      'No column holds global radiation: mark one in the mapping.',
    );
    return null;
  }
  completeRadiation(series, sun, findings);
  fillShortGaps(series, 'ghi', 'Global light', findings);
  fillShortGaps(series, 'dhi', 'Diffuse light', findings);
  fillShortGaps(series, 'dni', 'Direct light', findings);
  clearNights(series, findings);
  fillAir(series, findings, temperature, wind);
  if (findings.refused) return null;
  requirePlausibleSum(series, sun, findings);
  if (findings.refused) return null;
  testHours(series, sun, findings);
  checkClock(series, place, findings);
  return {
    year: series.year,
    utcOffsetHours: place.utcOffsetHours,
    intervalMinutes: 60,
    ghi: Array.from(ghi),
    dni: Array.from(dni),
    dhi: Array.from(dhi, (value, hour) => Math.min(value, ghi[hour])),
    temperatureC: Array.from(temperature),
    windMs: Array.from(wind),
  };
}

/** Stand-ins where a file has no air temperature or wind at all (common practice). */
const AIR = { temperature: 15, wind: 2 };

function fillAir(
  series: HourSeries,
  findings: Findings,
  temperature: Float64Array,
  wind: Float64Array,
): void {
  if (gapsIn(temperature)[0]?.[1] === HOURS) {
    temperature.fill(AIR.temperature);
    findings.add(
      'warn',
      'no-temperature',
      `No air temperature: ${AIR.temperature} °C is assumed. Panel energy and water are rough.`,
    );
  } else fillShortGaps(series, 'temperature', 'Air temperature', findings);
  if (gapsIn(wind)[0]?.[1] === HOURS) {
    wind.fill(AIR.wind);
    findings.add(
      'warn',
      'no-wind',
      `No wind: ${AIR.wind} m/s is assumed. Panel energy and water are rough.`,
    );
  } else fillShortGaps(series, 'wind', 'Wind speed', findings);
}
