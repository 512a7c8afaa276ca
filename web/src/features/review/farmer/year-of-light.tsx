import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { LightWeave } from '../../../charts/light-weave';
import { compassPoint } from '../../../lib/format';
import classes from './farmer.module.css';

/** Where and when the field is dark: one cloth over the year. */
export function YearOfLight({ scenario }: { scenario: ReviewPage['scenarios'][number] }) {
  const { result, layout } = scenario;
  const plane = result.planes[result.crops[0]?.planeIndex ?? 0];
  return (
    <section className={classes.part} aria-labelledby="weave-title">
      <h2 id="weave-title">Where and when it is dark</h2>
      <p className={classes.small}>
        From left to right the year, from top to bottom the ground from one row to the next. Bright
        is full sun, dark is shade. Modelled.
      </p>
      <LightWeave
        data={{
          weekly: plane.weekly,
          openWeekly: result.openWeekly,
          positionsM: result.positionsM,
          pitchM: result.pitchM,
        }}
        sides={{
          front: `${compassPoint(layout.azimuthDeg)} side`,
          back: `${compassPoint(layout.azimuthDeg + 180)} side`,
        }}
      />
    </section>
  );
}
