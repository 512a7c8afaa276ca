import type { WeatherQuantity } from '@furrowlight/shared/contract/weather';

type Convert = (value: number) => number;
const times =
  (factor: number): Convert =>
  (value) =>
    value * factor;

/** Hourly radiation to mean W m-2. */
const RADIATION: Record<string, Convert> = {
  'W/m2': times(1),
  'Wh/m2': times(1),
  'kWh/m2': times(1000),
  'J/m2': times(1 / 3600),
  'kJ/m2': times(1 / 3.6),
  'MJ/m2': times(1 / 0.0036),
};

const UNITS: Record<WeatherQuantity, Record<string, Convert>> = {
  time: {},
  date: {},
  ignore: {},
  ghi: RADIATION,
  dni: RADIATION,
  dhi: RADIATION,
  beamHorizontal: RADIATION,
  temperature: {
    '°C': times(1),
    '°F': (value) => ((value - 32) * 5) / 9,
    K: (value) => value - 273.15,
  },
  wind: { 'm/s': times(1), 'km/h': times(1 / 3.6), mph: times(0.44704), kn: times(0.514444) },
  humidity: { '%': times(1) },
  pressure: { hPa: times(1), Pa: times(0.01), mbar: times(1), kPa: times(10) },
};

/** Units a quantity may come in, the usual one first. */
export const unitsOf = (quantity: WeatherQuantity): string[] => Object.keys(UNITS[quantity]);

/** Turn a value into the product's own unit: W m-2, deg C, m s-1, %, hPa; NaN for an unknown unit. */
export function toOwnUnit(quantity: WeatherQuantity, unit: string, value: number): number {
  const convert = UNITS[quantity][unit];
  return convert ? convert(value) : NaN;
}

/** The unit named in a column header, or the usual one. */
export function unitInHeader(quantity: WeatherQuantity, header: string): string {
  const plain = header.toLowerCase().replaceAll('²', '2').replaceAll('^', '').replaceAll(' ', '');
  const spellings: [string, RegExp][] = [
    ['kWh/m2', /kwh\/?m-?2/],
    ['MJ/m2', /mj\/?m-?2/],
    ['kJ/m2', /kj\/?m-?2/],
    ['Wh/m2', /wh\/?m-?2/],
    ['W/m2', /w\/?m-?2/],
    ['J/m2', /j\/?m-?2/],
    ['km/h', /km\/h/],
    ['mph', /mph/],
    ['m/s', /m\/?s/],
    ['°F', /°f|degf|\(f\)/],
    ['kPa', /kpa/],
    ['hPa', /hpa/],
    ['mbar', /mbar/],
  ];
  const allowed = unitsOf(quantity);
  const found = spellings.find(([unit, pattern]) => allowed.includes(unit) && pattern.test(plain));
  return found?.[0] ?? allowed[0] ?? '';
}
