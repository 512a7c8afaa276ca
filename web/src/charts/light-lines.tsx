import { ResponsiveLine, type LineSeries } from '@nivo/line';
import { usePalette } from '../map/use-palette';
import { formatNumber } from '../lib/format';
import classes from './light-lines.module.css';

/** One line of light over a year. */
export interface LightLine {
  id: string;
  colour: string;
  /** Dash pattern, so that lines differ without colour too. */
  dash?: string;
  points: readonly { x: number; y: number }[];
}

interface Props {
  lines: readonly LightLine[];
  /** Labels along the bottom, by x. */
  ticks: readonly { at: number; label: string }[];
  yLabel: string;
  /** Sentence read out in place of the picture. */
  label: string;
  /** How x is named in the read-out. */
  nameOf: (x: number) => string;
  decimals?: number;
}

type Series = LineSeries & { id: string };

/** Lines of light over the year, with a read-out at the pointer. */
export function LightLines({ lines, ticks, yLabel, label, nameOf, decimals = 1 }: Props) {
  const palette = usePalette();
  const data: Series[] = lines.map(({ id, points }) => ({
    id,
    data: points.map(({ x, y }) => ({ x, y })),
  }));
  const dashes = new Map(lines.map(({ id, dash }) => [id, dash]));
  return (
    <div className={classes.lines}>
      <div className={classes.frame} role="img" aria-label={label}>
        <ResponsiveLine
          data={data}
          role="presentation"
          colors={lines.map(({ colour }) => colour)}
          margin={{ top: 16, right: 16, bottom: 36, left: 52 }}
          xScale={{ type: 'linear', min: 'auto', max: 'auto' }}
          yScale={{ type: 'linear', min: 0, max: 'auto' }}
          curve="monotoneX"
          lineWidth={2.25}
          enablePoints={false}
          enableGridX={false}
          gridYValues={5}
          axisLeft={{
            tickSize: 0,
            tickPadding: 8,
            tickValues: 5,
            legend: yLabel,
            legendOffset: -42,
            legendPosition: 'middle',
          }}
          axisBottom={{
            tickSize: 4,
            tickPadding: 6,
            tickValues: ticks.map(({ at }) => at),
            format: (x) => ticks.find(({ at }) => at === x)?.label ?? '',
          }}
          layers={[
            'grid',
            'axes',
            ({ series, lineGenerator }) =>
              series.map(({ id, data: points, color }) => (
                <path
                  key={id}
                  d={lineGenerator(points.map((point) => point.position)) ?? ''}
                  fill="none"
                  stroke={color}
                  strokeWidth={2.25}
                  strokeDasharray={dashes.get(String(id))}
                />
              )),
            'crosshair',
            'slices',
          ]}
          enableSlices="x"
          animate={false}
          theme={{
            text: { fill: palette.inkSoft, fontFamily: 'inherit', fontSize: 12 },
            grid: { line: { stroke: palette.line, strokeWidth: 1 } },
            axis: {
              legend: { text: { fill: palette.inkSoft, fontSize: 12 } },
              ticks: { line: { stroke: palette.edge } },
            },
            crosshair: { line: { stroke: palette.edge, strokeDasharray: '3 3' } },
          }}
          sliceTooltip={({ slice }) => (
            <div className={classes.card}>
              <strong>{nameOf(Number(slice.points[0].data.x))}</strong>
              {[...slice.points]
                .sort((a, b) => Number(b.data.y) - Number(a.data.y))
                .map((point) => (
                  <div key={point.id}>
                    <span style={{ background: point.seriesColor }} aria-hidden />
                    {point.seriesId}
                    <b>{formatNumber(Number(point.data.y), decimals)}</b>
                  </div>
                ))}
            </div>
          )}
        />
      </div>
      <ul className={classes.key} aria-hidden>
        {lines.map(({ id, colour, dash }) => (
          <li key={id}>
            <svg width="26" height="8">
              <path d="M1 4h24" stroke={colour} strokeWidth="2.5" strokeDasharray={dash} />
            </svg>
            {id}
          </li>
        ))}
      </ul>
    </div>
  );
}
