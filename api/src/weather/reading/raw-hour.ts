/** One data row of a weather file, in the product's units; NaN where the file has no value. */
export interface RawHour {
  /** Line in the file, from 1. */
  line: number;
  year: number;
  month: number;
  day: number;
  /** Hour of the stamp, 0-24, and its minute. */
  hour: number;
  minute: number;
  ghi: number;
  dni: number;
  dhi: number;
  beamHorizontal: number;
  temperature: number;
  wind: number;
}

/** Where a file says it is from; null where it does not say. */
export interface FilePlace {
  latitude: number | null;
  longitude: number | null;
  elevationM: number | null;
  utcOffsetHours: number | null;
}

export const NO_PLACE: FilePlace = {
  latitude: null,
  longitude: null,
  elevationM: null,
  utcOffsetHours: null,
};

/** A number, or NaN for anything else; accepts a decimal comma when told to. */
export function numberOf(text: string | undefined, decimal: '.' | ',' = '.'): number {
  const trimmed = (text ?? '').trim();
  if (trimmed === '') return NaN;
  const plain = decimal === ',' ? trimmed.replaceAll('.', '').replace(',', '.') : trimmed;
  return /^[-+]?(\d+\.?\d*|\.\d+)([eE][-+]?\d+)?$/.test(plain) ? Number(plain) : NaN;
}
