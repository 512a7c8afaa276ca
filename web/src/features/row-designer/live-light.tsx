import type { Layout } from '@furrowlight/shared/contract/layout';
import { Select, Skeleton } from '@mantine/core';
import { Figure, FigureRow } from '../../components/figure';
import { Term } from '../../components/term';
import { formatNumber, percent } from '../../lib/format';
import type { LivePreview } from '../../workers/use-preview';
import type { CropInView } from './crop-in-view';
import classes from './designer.module.css';
import { LiveWeave } from './live-weave';

interface Props {
  live: LivePreview;
  hasWeather: boolean;
  layout: Layout;
  crops: readonly CropInView[];
  crop: CropInView;
  onCrop: (id: string) => void;
}

/** Light of the season under the present rows: quick, and replaced by the full run. */
export function LiveLight({ live, hasWeather, layout, crops, crop, onCrop }: Props) {
  const { preview, problem } = live;
  return (
    <section className={classes.live} aria-label="Light over the season, preview">
      <div className={classes.liveHead}>
        <h2>
          Light over the season <small>modelled, preview</small>
        </h2>
        <Select
          aria-label="Crop for which light is counted"
          data={crops.map(({ id, name }) => ({ value: id, label: name }))}
          value={crop.id}
          onChange={(id) => id !== null && onCrop(id)}
          allowDeselect={false}
          size="xs"
        />
      </div>
      {!hasWeather && (
        <p className={classes.hint}>
          Choose a weather year, and the light of the season follows the sliders here.
        </p>
      )}
      {problem && <p className={classes.problem}>{problem}</p>}
      {hasWeather && !preview && !problem && <Skeleton height={180} />}
      {preview && (
        <>
          <FigureRow>
            <Figure
              label={
                <>
                  Mean <Term of="DLI" />
                </>
              }
              value={formatNumber(preview.meanDli, 1)}
              unit="mol m⁻² d⁻¹"
              note={`${percent(preview.meanShare)} of open field`}
            />
            <Figure
              label="Darkest strip"
              value={formatNumber(preview.darkestDli, 1)}
              unit="mol m⁻² d⁻¹"
              note={`${percent(preview.darkestShare)} of open field`}
            />
            <Figure
              label="Energy"
              value={formatNumber(preview.kwhPerKwp)}
              unit="kWh/kWp"
              note="a year"
            />
          </FigureRow>
          <LiveWeave weave={preview.weave} layout={layout} />
        </>
      )}
    </section>
  );
}
