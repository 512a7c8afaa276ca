import type { Site } from '@furrowlight/shared/contract/run';
import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { useMemo, useState } from 'react';
import { RowSlicePicture, sliceWords } from '../../../charts/row-slice';
import { useRowSlice } from '../../../charts/use-row-slice';
import { SunClock, type SunTime } from '../../../components/sun-clock';
import { withUnit } from '../../../lib/format';
import classes from './farmer.module.css';

interface Props {
  page: ReviewPage;
  scenario: ReviewPage['scenarios'][number];
}

/** The sun moved by thumb over a cut through the rows, to scale. */
export function SunOverRows({ page, scenario }: Props) {
  const [time, setTime] = useState<SunTime>({ day: 151, hour: 10 });
  const { result, layout, utcOffsetHours } = scenario;
  const crop = result.crops[0];
  const { heightM } = result.planes[crop?.planeIndex ?? 0];
  const { latitude, longitude } = page.site;
  const site = useMemo<Site>(
    () => ({
      latitude,
      longitude,
      elevationM: 0,
      slopePercent: 0,
      aspectDeg: 180,
      albedo: 0.2,
    }),
    [latitude, longitude],
  );
  const slice = useRowSlice(site, layout, heightM, { year: result.year, utcOffsetHours, ...time });
  if (!slice) return null;
  return (
    <section className={classes.part} aria-labelledby="sun-title">
      <h2 id="sun-title">Move the sun</h2>
      <p className={classes.small}>
        A cut through the rows, to scale, on level ground under a clear sky. The person is 1.75 m
        tall, the tractor 3 m high{crop ? `, ${crop.cropName.toLowerCase()} ` : ', the crop '}
        {withUnit(heightM, 'm', 1)}.
      </p>
      <RowSlicePicture layout={layout} slice={slice} canopyHeightM={heightM} />
      <p className={classes.small}>{sliceWords(slice)} Modelled.</p>
      <div className="no-print">
        <SunClock time={time} onChange={setTime} />
      </div>
    </section>
  );
}
