import type { FieldSeason } from '@furrowlight/shared/contract/fields';
import { calendarDate } from '../../../lib/format';
import { daysBetween } from './season-dates';
import classes from './season-ribbon.module.css';

interface Props {
  seasons: readonly FieldSeason[];
  /** Today's date at the field. */
  today: string;
}

/** The rotation as a ribbon of time: one band a season, years ticked, today marked. */
export function SeasonRibbon({ seasons, today }: Props) {
  if (seasons.length === 0) return null;
  const firstYear = Number(
    seasons
      .map(({ sowing }) => sowing)
      .sort()[0]
      .slice(0, 4),
  );
  const lastYear = Number(
    seasons
      .map(({ harvest }) => harvest)
      .sort()
      .at(-1)
      ?.slice(0, 4),
  );
  const start = `${firstYear}-01-01`;
  const days = daysBetween(start, `${lastYear + 1}-01-01`);
  const at = (date: string) => `${(daysBetween(start, date) / days) * 100}%`;
  const years = Array.from({ length: lastYear - firstYear + 1 }, (_, i) => firstYear + i);
  const inside = today >= start && today <= `${lastYear}-12-31`;
  return (
    <div className={classes.ribbon} aria-hidden>
      {years.map((year) => (
        <span key={year} className={classes.year} style={{ left: at(`${year}-01-01`) }}>
          {year}
        </span>
      ))}
      {seasons.map((season) => (
        <span
          key={season.id}
          className={classes.band}
          title={`${season.cropName}: ${calendarDate(season.sowing)} to ${calendarDate(season.harvest)}`}
          style={{
            left: at(season.sowing),
            width: `${(daysBetween(season.sowing, season.harvest) / days) * 100}%`,
          }}
        >
          {season.cropName}
        </span>
      ))}
      {inside && <span className={classes.today} style={{ left: at(today) }} title="Today" />}
    </div>
  );
}
