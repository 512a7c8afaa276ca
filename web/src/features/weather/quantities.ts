import type { WeatherQuantity } from '@furrowlight/shared/contract/weather';

const RADIATION = ['W/m2', 'Wh/m2', 'kWh/m2', 'J/m2', 'kJ/m2', 'MJ/m2'];

/** What a column may hold and the units it may come in, the usual one first. */
export const QUANTITIES: { quantity: WeatherQuantity; label: string; units: string[] }[] = [
  { quantity: 'ignore', label: 'not used', units: [] },
  { quantity: 'time', label: 'date and time, or time', units: [] },
  { quantity: 'date', label: 'date', units: [] },
  { quantity: 'ghi', label: 'global light', units: RADIATION },
  { quantity: 'dhi', label: 'diffuse light', units: RADIATION },
  { quantity: 'dni', label: 'direct light, normal', units: RADIATION },
  { quantity: 'beamHorizontal', label: 'direct light, horizontal', units: RADIATION },
  { quantity: 'temperature', label: 'air temperature', units: ['°C', '°F', 'K'] },
  { quantity: 'wind', label: 'wind speed', units: ['m/s', 'km/h', 'mph', 'kn'] },
  { quantity: 'humidity', label: 'relative humidity', units: ['%'] },
  { quantity: 'pressure', label: 'air pressure', units: ['hPa', 'Pa', 'mbar', 'kPa'] },
];
