import { formatNumber } from '../../lib/format';
import classes from './weather.module.css';

const MONTHS = ['J', 'F', 'M', 'A', 'M', 'J', 'J', 'A', 'S', 'O', 'N', 'D'];
/** Brightest monthly mean on land, MJ m-2 d-1: all cards share one scale. */
const FULL_SCALE = 30;

/** Mean daily radiation by month. */
export function MonthBars({ monthlyMjM2 }: { monthlyMjM2: readonly number[] }) {
  const spoken = monthlyMjM2.map((value) => formatNumber(value, 1)).join(', ');
  return (
    <svg
      viewBox="0 0 260 132"
      className={classes.bars}
      role="img"
      aria-label={`Mean daily global light by month from January, MJ m⁻² d⁻¹: ${spoken}.`}
    >
      {monthlyMjM2.map((value, month) => {
        const height = Math.min(value / FULL_SCALE, 1) * 92;
        const x = month * 21 + 5;
        return (
          <g key={month}>
            <rect x={x} y={112 - height} width={16} height={height} className={classes.bar} />
            <text x={x + 8} y={107 - height} textAnchor="middle" className={classes.barValue}>
              {formatNumber(value)}
            </text>
            <text x={x + 8} y={126} textAnchor="middle" className={classes.barName}>
              {MONTHS[month]}
            </text>
          </g>
        );
      })}
      <path d="M0 112.5h260" className={classes.axis} />
      <text x={5} y={10} className={classes.barName}>
        MJ m⁻² d⁻¹
      </text>
    </svg>
  );
}
