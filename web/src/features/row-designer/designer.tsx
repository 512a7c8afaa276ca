import type { Field, FieldSeason } from '@furrowlight/shared/contract/fields';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import type { Weather } from '@furrowlight/shared/contract/weather';
import { layRows } from '@furrowlight/shared/layout/rows-over-field';
import { Button } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useDeferredValue, useMemo, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { RowSlicePicture, sliceWords } from '../../charts/row-slice';
import { useRowSlice } from '../../charts/use-row-slice';
import { ConflictPanel } from '../../components/conflict-panel';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { SunClock, type SunTime } from '../../components/sun-clock';
import { ApiProblem, newIdempotencyKey } from '../../lib/api';
import { startRun } from '../../queries/runs';
import { copyScenario } from '../../queries/scenarios';
import { weatherYearQuery } from '../../queries/weather';
import { usePreview } from '../../workers/use-preview';
import { ControlPanel } from './control-panel';
import { BARE_SEASON, cropInView } from './crop-in-view';
import classes from './designer.module.css';
import { LiveFigures } from './live-figures';
import { LiveLight } from './live-light';
import { RowsMap } from './rows-map';
import { RunPanel } from './run-panel';
import { siteOf } from './site';
import { useDesign } from './use-design';

interface Props {
  field: Field;
  scenario: Scenario | null;
  seasons: readonly FieldSeason[];
  weather: readonly Weather[];
}

const MIDSUMMER: SunTime = { day: 171, hour: 10 };

/** Rows over a field: decided on the right, seen on the left, at once. */
export function Designer({ field, scenario, seasons, weather }: Props) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const work = useDesign(field, scenario, weather.length === 1 ? weather[0].id : null);
  const run = useMutation(startRun(client));
  const duplicate = useMutation(copyScenario(client));
  const [failure, setFailure] = useState<unknown>(null);
  const [time, setTime] = useState<SunTime>(MIDSUMMER);
  const [cropId, setCropId] = useState(seasons[0]?.id ?? '');

  const { shown, design } = work;
  const site = useMemo(() => siteOf(field), [field]);
  const crops = useMemo(() => [...seasons.map(cropInView), BARE_SEASON], [seasons]);
  const crop = crops.find(({ id }) => id === cropId) ?? crops[0];
  const chosen = weather.find(({ id }) => id === design.weatherId) ?? null;
  const hours = useQuery({ ...weatherYearQuery(chosen?.id ?? ''), enabled: chosen !== null });
  const question = useMemo(
    () => ({ layout: shown, canopyHeightM: crop.canopyHeightM, season: crop.season }),
    [shown, crop],
  );
  const live = usePreview(site, (chosen && hours.data) ?? null, question);
  const onMap = useDeferredValue(shown);
  const laid = useMemo(
    () => (field.boundary ? layRows(onMap, field.boundary.coordinates) : null),
    [onMap, field.boundary],
  );
  const before = work.dirty ? (scenario?.layout ?? null) : null;
  const saved = useMemo(
    () => (before && field.boundary ? layRows(before, field.boundary.coordinates) : null),
    [before, field.boundary],
  );
  const utcOffsetHours = chosen?.utcOffsetHours ?? Math.round(field.pin[0] / 15);
  const slice = useRowSlice(site, shown, crop.canopyHeightM, {
    year: chosen?.summary.year ?? 2025,
    utcOffsetHours,
    ...time,
  });
  const here = `/fields/${field.id}/scenarios`;
  const conflict = work.problem instanceof ApiProblem && work.problem.status === 412;

  const save = async (): Promise<Scenario | null> => {
    const made = await work.save();
    if (made) {
      notifications.show({ message: `${made.name} is saved.` });
      if (!scenario) void navigate(`${here}/${made.id}`, { replace: true });
    }
    return made;
  };
  const start = async () => {
    setFailure(null);
    const ready = work.dirty ? await save() : scenario;
    if (!ready) return;
    try {
      await run.mutateAsync({ scenarioId: ready.id, idempotencyKey: newIdempotencyKey() });
    } catch (error) {
      setFailure(error);
    }
  };
  const copy = async () => {
    if (!scenario) return;
    setFailure(null);
    try {
      const name = `${scenario.name}, changed`.slice(0, 120);
      const made = await duplicate.mutateAsync({
        id: scenario.id,
        name,
        idempotencyKey: newIdempotencyKey(),
      });
      void navigate(`${here}/${made.id}`);
    } catch (error) {
      setFailure(error);
    }
  };

  return (
    <>
      <PageHead
        title={scenario?.name ?? 'New scenario'}
        crumbs={[
          { label: 'Fields', to: '/fields' },
          { label: field.name, to: `/fields/${field.id}` },
        ]}
        actions={
          <>
            <Button
              variant="default"
              loading={work.saving}
              disabled={!work.dirty}
              onClick={() => void save()}
            >
              {work.dirty ? 'Save' : 'Saved'}
            </Button>
            {!work.locked && (
              <Button loading={run.isPending} onClick={() => void start()}>
                Work out the light budget
              </Button>
            )}
          </>
        }
      />
      {conflict && (
        <ConflictPanel
          what="this scenario"
          busy={work.saving}
          onTheirs={() => void work.takeTheirs()}
          onMine={() => void work.keepMine()}
        />
      )}
      {work.problem !== null && !conflict && <ErrorPanel error={work.problem} />}
      {failure !== null && <ErrorPanel error={failure} title="The run could not be started" />}
      {scenario?.latestRun && (
        <RunPanel
          key={scenario.latestRun.id}
          run={scenario.latestRun}
          resultTo={`${here}/${scenario.id}/result`}
          onCopy={() => void copy()}
          copying={duplicate.isPending}
        />
      )}
      <div className={classes.split}>
        <div className={classes.views}>
          <RowsMap field={field} laid={laid} saved={saved} />
          {laid?.empty && <p className={classes.problem}>{laid.empty}</p>}
          {!field.boundary && (
            <p className={classes.hint}>
              This field has no boundary yet, so rows cannot be laid out on the map. Light can be
              worked out all the same.
            </p>
          )}
          <LiveFigures layout={onMap} laid={laid} />
          <section className={classes.sliceBox} aria-label="Row slice">
            {slice ? (
              <>
                <RowSlicePicture layout={shown} slice={slice} canopyHeightM={crop.canopyHeightM} />
                <p className={classes.words}>{sliceWords(slice)} Modelled.</p>
              </>
            ) : (
              <p className={classes.problem}>
                The ground falls more steeply than the panels tilt: raise the tilt or turn the rows.
              </p>
            )}
            <SunClock time={time} onChange={setTime} />
          </section>
          <LiveLight
            live={live}
            hasWeather={chosen !== null}
            layout={shown}
            crops={crops}
            crop={crop}
            onCrop={setCropId}
          />
        </div>
        <ControlPanel work={work} field={field} weather={weather} />
      </div>
    </>
  );
}
