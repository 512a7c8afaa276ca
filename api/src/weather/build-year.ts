import type { WeatherFinding, WeatherInput } from '@furrowlight/shared/contract/weather';
import { clearSkyYear, climateYear } from '@furrowlight/shared/light/climate';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import { invalid } from '../common/domain-error.js';
import { readWeather } from './reading/read-weather.js';

/** A year ready to be stored. */
export interface BuiltYear {
  year: HourlyYear;
  findings: WeatherFinding[];
  source: string;
  fileName: string | null;
}

/** Any year does: typical years have none. 2025 begins no leap year. */
const NOMINAL_YEAR = 2025;

const ASSUMED: Record<'climate' | 'clear-sky', WeatherFinding> = {
  climate: {
    severity: 'note',
    code: 'from-monthly-means',
    message:
      'Built from monthly means: every day of a month has the same clearness, so dull and bright days are not told apart.',
    rows: [],
    count: 1,
  },
  'clear-sky': {
    severity: 'warn',
    code: 'cloudless',
    message: 'A sky without clouds all year: an upper bound of light, not what the crop will get.',
    rows: [],
    count: 1,
  },
};

/**
 * The weather year a person asked for.
 *
 * @throws DomainError invalid-input with the findings that refuse a file
 */
export function buildYear(input: WeatherInput): BuiltYear {
  const place = {
    latitude: input.latitude,
    longitude: input.longitude,
    elevationM: input.elevationM,
  };
  if (input.kind === 'file') {
    const { year, preview } = readWeather(input.content, input.mapping ?? null, place);
    if (!year) {
      const refusals = preview.findings.filter(({ severity }) => severity === 'refuse');
      throw invalid(
        ...refusals.map(({ message, rows }) => ({
          path: 'content',
          message: rows.length > 0 ? `${message} Lines ${rows.join(', ')}.` : message,
        })),
      );
    }
    const source = `File ${input.fileName} (${preview.format})`;
    return { year, findings: preview.findings, source, fileName: input.fileName };
  }
  const frame = { ...place, year: NOMINAL_YEAR, utcOffsetHours: input.utcOffsetHours };
  if (input.kind === 'clear-sky') {
    const source = 'Clear sky after Bird & Riordan 1986';
    return { year: clearSkyYear(frame), findings: [ASSUMED['clear-sky']], source, fileName: null };
  }
  const { monthlyMjM2, monthlyMinC, monthlyMaxC } = input;
  monthlyMinC.forEach((low, month) => {
    if (low > monthlyMaxC[month]) {
      throw invalid({
        path: `monthlyMinC.${month}`,
        message: 'The mean minimum is above the mean maximum of this month.',
      });
    }
  });
  const year = climateYear({ ...frame, monthlyMjM2, monthlyMinC, monthlyMaxC });
  return { year, findings: [ASSUMED.climate], source: input.source, fileName: null };
}
