import type { Energy } from '@furrowlight/shared/contract/result';
import type { LaidFigures } from '@furrowlight/shared/contract/scenarios';
import { Figure, FigureRow } from '../../components/figure';
import { formatNumber } from '../../lib/format';
import classes from './results.module.css';

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** Energy by month as bars to scale. */
export function EnergyBars({ energy }: { energy: Energy }) {
  const most = Math.max(...energy.monthly.map(({ kwhPerKwp }) => kwhPerKwp), 1);
  const spoken = energy.monthly
    .map(({ month, kwhPerKwp }) => `${MONTHS[month - 1]} ${formatNumber(kwhPerKwp)}`)
    .join(', ');
  return (
    <svg
      viewBox="0 0 600 190"
      className={classes.bars}
      role="img"
      aria-label={`Energy by month, kWh per kWp: ${spoken}.`}
    >
      {energy.monthly.map(({ month, kwhPerKwp }) => {
        const height = (kwhPerKwp / most) * 140;
        const x = (month - 1) * 50 + 6;
        return (
          <g key={month}>
            <rect x={x} y={160 - height} width={38} height={height} className={classes.bar} />
            <text x={x + 19} y={152 - height} textAnchor="middle" className={classes.barValue}>
              {formatNumber(kwhPerKwp)}
            </text>
            <text x={x + 19} y={178} textAnchor="middle" className={classes.barName}>
              {MONTHS[month - 1]}
            </text>
          </g>
        );
      })}
      <path d="M0 160.5h600" className={classes.axis} />
    </svg>
  );
}

/** Yearly energy with what was lost on the way. */
export function EnergyFigures({
  energy,
  figures,
}: {
  energy: Energy;
  figures: LaidFigures | null;
}) {
  return (
    <FigureRow>
      <Figure label="Energy" value={formatNumber(energy.kwhPerKwp)} unit="kWh per kWp and year" />
      {figures && figures.kwp > 0 && (
        <Figure
          label="On this field"
          value={formatNumber((energy.kwhPerKwp * figures.kwp) / 1000)}
          unit="MWh a year"
          note={`${formatNumber(figures.kwp)} kWp`}
        />
      )}
      <Figure
        label="From the rear face"
        value={formatNumber(energy.bifacialGainPercent, 1)}
        unit="% gain"
      />
      <Figure
        label="Lost to row shade"
        value={formatNumber(energy.rowShadeLossPercent, 1)}
        unit="%"
      />
      <Figure
        label="Lost to heat"
        value={formatNumber(energy.temperatureLossPercent, 1)}
        unit="%"
      />
      <Figure
        label="Lost to slanting light"
        value={formatNumber(energy.incidenceLossPercent, 1)}
        unit="%"
      />
      <Figure
        label="Cut by the inverter"
        value={formatNumber(energy.clippingLossPercent, 1)}
        unit="%"
      />
      {energy.cropFirstCostPercent !== null && (
        <Figure
          label="Given up for the crop"
          value={formatNumber(energy.cropFirstCostPercent, 1)}
          unit="%"
          note="against the same tracker serving the meter"
        />
      )}
      {energy.cropFirstGainPercent != null && (
        <Figure
          label="Light won for the crop"
          value={formatNumber(energy.cropFirstGainPercent, 1)}
          unit="%"
          note="on the days of the programme"
        />
      )}
    </FigureRow>
  );
}
