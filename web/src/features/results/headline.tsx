import type { CropBudget, RunResult } from '@furrowlight/shared/contract/result';
import { formatNumber, percent } from '../../lib/format';
import classes from './results.module.css';

/** What the light means, in one sentence a crop; the whole year where no crop stands. */
export function Headline({ result }: { result: RunResult }) {
  const { year } = result.planes[0];
  if (result.crops.length === 0) {
    return (
      <div className={classes.headline}>
        <Sentence
          name="Over the whole year"
          dli={year.meanDli}
          share={year.meanShare}
          darkest={year.darkestShare}
        />
        <p className={classes.quiet}>
          Record the crops of this field to see the light in their own seasons.
        </p>
      </div>
    );
  }
  return (
    <div className={classes.headline}>
      {result.crops.map((crop) => (
        <CropSentence key={crop.seasonId} crop={crop} />
      ))}
    </div>
  );
}

function CropSentence({ crop }: { crop: CropBudget }) {
  const { season } = crop;
  const { low, high, basis } = crop.yield;
  return (
    <article className={classes.crop}>
      <Sentence
        name={crop.cropName}
        dli={season.meanDli}
        share={season.meanShare}
        darkest={season.darkestShare}
      />
      <dl className={classes.cropFacts}>
        <div>
          <dt>Yield by light, of open field</dt>
          <dd>
            {low !== null && high !== null ? `${percent(low)} to ${percent(high)}` : 'no number'}
          </dd>
        </div>
        {crop.relativeBiomass != null && (
          <div>
            <dt>Second opinion: biomass by light use</dt>
            <dd>{percent(crop.relativeBiomass)} of open field</dd>
          </div>
        )}
        {crop.et0OpenMm !== null && crop.et0ShadedMm !== null && (
          <div>
            <dt>Reference water use in the season</dt>
            <dd>
              {formatNumber(crop.et0ShadedMm)} mm (open field {formatNumber(crop.et0OpenMm)} mm)
            </dd>
          </div>
        )}
      </dl>
      <p className={classes.quiet}>{basis}</p>
    </article>
  );
}

function Sentence(props: { name: string; dli: number; share: number; darkest: number }) {
  return (
    <>
      <h2 className={classes.cropName}>{props.name}</h2>
      <p className={classes.big}>
        {formatNumber(props.dli, 1)} <small>mol m⁻² d⁻¹</small>
      </p>
      <p className={classes.under}>
        {percent(props.share)} of open field, darkest strip {percent(props.darkest)}
      </p>
      <span
        className={classes.lightBar}
        role="img"
        aria-label={`${percent(props.share)} of the light of open field`}
      >
        <span style={{ width: percent(props.share).replace('\u00a0', '') }} />
        <i style={{ left: percent(props.darkest).replace('\u00a0', '') }} />
      </span>
    </>
  );
}
