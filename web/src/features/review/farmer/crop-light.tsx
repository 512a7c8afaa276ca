import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { formatNumber, percent, withUnit } from '../../../lib/format';
import classes from './farmer.module.css';

interface Props {
  scenario: ReviewPage['scenarios'][number];
}

/** How much light each crop keeps from sowing to harvest, and how little where it is darkest. */
export function CropLight({ scenario }: Props) {
  const { crops, planes } = scenario.result;
  const lights =
    crops.length > 0
      ? crops.map(({ seasonId, cropName, season, stages }) => ({
          key: seasonId,
          name: cropName,
          budget: season,
          critical: stages.find(({ critical }) => critical)?.budget ?? null,
        }))
      : [{ key: 'year', name: 'Over the year', budget: planes[0].year, critical: null }];
  return (
    <section className={classes.part} aria-labelledby="light-title">
      <h2 id="light-title">How much light the crop keeps</h2>
      <p className={classes.small}>
        Light that plants can use, at the top of the crop, from sowing to harvest. Modelled.
      </p>
      {lights.map(({ key, name, budget, critical }) => (
        <article key={key} className={classes.crop}>
          <h3>{name}</h3>
          <Bar label="On average" share={budget.meanShare} dli={budget.meanDli} />
          <Bar label="In the darkest strip" share={budget.darkestShare} dli={budget.darkestDli} />
          <Bar
            label="In the brightest strip"
            share={budget.brightestShare}
            dli={budget.brightestDli}
          />
          <p className={classes.small}>
            The open field gets {withUnit(budget.openDli, 'mol m⁻² d⁻¹', 1)}.
            {critical &&
              ` In the weeks that decide most (${critical.label.charAt(0).toLowerCase()}${critical.label.slice(1)}) the average is ${percent(critical.meanShare)} and the darkest strip ${percent(critical.darkestShare)} of open field.`}
          </p>
        </article>
      ))}
    </section>
  );
}

function Bar({ label, share, dli }: { label: string; share: number; dli: number }) {
  return (
    <div className={classes.bar}>
      <span>{label}</span>
      <b>{percent(share)}</b>
      <span className={classes.track} aria-hidden>
        <span style={{ width: `${Math.min(share, 1) * 100}%` }} />
      </span>
      <span className={classes.small}>{formatNumber(dli, 1)} mol m⁻² d⁻¹, share of open field</span>
    </div>
  );
}
