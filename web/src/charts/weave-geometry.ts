/** What a light weave is drawn from: rows are weeks, columns are positions across one pitch. */
export interface WeaveData {
  /** DLI by week and position, mol m-2 d-1. */
  weekly: readonly (readonly number[])[];
  openWeekly: readonly number[];
  positionsM: readonly number[];
  pitchM: number;
}

export type WeaveMode = 'share' | 'dli';

/** One cell of the weave, as it is read out. */
export interface WeaveCell {
  week: number;
  position: number;
  dli: number;
  openDli: number;
  share: number;
  /** Distance from the row's centre line, m; positive on the front side. */
  metres: number;
}

/** Brightest open-field week, the top of the colour scale in DLI. */
export const brightestWeek = (data: WeaveData): number => Math.max(...data.openWeekly, 1e-9);

/** The cell at a place of the cloth given as shares of its width and height, 0-1. */
export function cellAt(data: WeaveData, x: number, y: number): WeaveCell {
  const clampIndex = (share: number, count: number) =>
    Math.min(Math.max(Math.floor(share * count), 0), count - 1);
  return cell(data, clampIndex(x, data.weekly.length), clampIndex(1 - y, data.positionsM.length));
}

/** The cell of a week and a position index. */
export function cell(data: WeaveData, week: number, position: number): WeaveCell {
  const dli = data.weekly[week][position];
  const openDli = data.openWeekly[week];
  return {
    week,
    position,
    dli,
    openDli,
    share: openDli > 0 ? dli / openDli : 0,
    metres: data.positionsM[position],
  };
}

/** Share 0-1 on the light ramp. */
export function rampShare(data: WeaveData, at: WeaveCell, mode: WeaveMode): number {
  return mode === 'share' ? at.share : at.dli / brightestWeek(data);
}

const DAY_MS = 86_400_000;

/** First day of a 0-based week counted from 1 January, such as `11 Mar`. */
export function weekStart(week: number): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    timeZone: 'UTC',
  }).format(new Date(Date.UTC(2025, 0, 1) + week * 7 * DAY_MS));
}

/** Month names with the week each begins in, as shares of the cloth's width. */
export function monthTicks(weeks: number): { label: string; at: number }[] {
  return Array.from({ length: 12 }, (_, month) => {
    const day = (Date.UTC(2025, month, 1) - Date.UTC(2025, 0, 1)) / DAY_MS;
    const label = new Intl.DateTimeFormat('en-GB', { month: 'short', timeZone: 'UTC' }).format(
      new Date(Date.UTC(2025, month, 1)),
    );
    return { label, at: day / 7 / weeks };
  });
}
