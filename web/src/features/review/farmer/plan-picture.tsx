import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { useMemo } from 'react';
import { compassPoint, formatNumber, hectares, percent, withUnit } from '../../../lib/format';
import { LAYOUT_KINDS } from '../../../lib/layout-kinds';
import classes from './farmer.module.css';
import { planDrawing } from './plan-geometry';

type Scenario = ReviewPage['scenarios'][number];

const COMPASS: Record<string, string> = {
  N: 'north',
  NE: 'north-east',
  E: 'east',
  SE: 'south-east',
  S: 'south',
  SW: 'south-west',
  W: 'west',
  NW: 'north-west',
};

function words({ layout, figures }: Scenario): string {
  const facing =
    layout.kind === 'single-axis-tracker'
      ? 'turning with the sun'
      : `front to the ${COMPASS[compassPoint(layout.azimuthDeg)]}`;
  const rows = figures ? `${formatNumber(figures.rowCount)} rows` : 'Rows';
  return `${rows}, ${withUnit(layout.pitchM, 'm', 1)} from row to row, panels ${withUnit(layout.collectorWidthM, 'm', 1)} wide, ${facing}. The lowest edge is ${withUnit(layout.clearHeightM, 'm', 1)} above the ground.`;
}

/** What is proposed, in one picture: the field from above, north up. */
export function PlanPicture({ page, scenario }: { page: ReviewPage; scenario: Scenario }) {
  const { layout, figures } = scenario;
  const drawing = useMemo(
    () => (page.boundary ? planDrawing(layout, page.boundary.coordinates) : null),
    [layout, page.boundary],
  );
  const line = drawing ? Math.max(drawing.width, drawing.height) / 260 : 1;
  return (
    <section className={classes.part} aria-labelledby="plan-title">
      <h2 id="plan-title">What is proposed</h2>
      <p className={classes.kind}>{LAYOUT_KINDS[layout.kind].name}</p>
      {drawing && (
        <svg
          viewBox={`0 0 ${drawing.width} ${drawing.height}`}
          className={classes.plan}
          role="img"
          aria-label={`${page.fieldName} from above, north up. ${words(scenario)}`}
        >
          <path d={drawing.field} className={classes.field} strokeWidth={line * 1.6} />
          <path d={drawing.rows} className={classes.rows} />
          <g className={classes.scale} strokeWidth={line}>
            <path d={`M${line * 6} ${drawing.height - line * 6}h${drawing.scaleM}`} fill="none" />
            <text x={line * 6} y={drawing.height - line * 10} fontSize={line * 10}>
              {withUnit(drawing.scaleM, 'm')}
            </text>
            <text x={drawing.width - line * 14} y={line * 14} fontSize={line * 11}>
              N
            </text>
            <path
              d={`M${drawing.width - line * 10} ${line * 32}v${-line * 14}m${-line * 4} ${line * 5}l${line * 4} ${-line * 5}l${line * 4} ${line * 5}`}
              fill="none"
            />
          </g>
        </svg>
      )}
      <p>{words(scenario)}</p>
      {figures && (
        <p>
          {hectares(figures.fieldAreaM2)} of field, of which {percent(figures.landLostShare, 1)} is
          no longer farmed. Panels cover {percent(figures.coverageRatio)} of it, seen from above.
        </p>
      )}
    </section>
  );
}
