import type { Field } from '@furrowlight/shared/contract/fields';
import { Button, Skeleton } from '@mantine/core';
import { IconPolygon } from '@tabler/icons-react';
import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useMemo, useRef, type ReactNode } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import { Section } from '../../../components/section';
import { useMay } from '../../../lib/use-may';
import { fieldListQuery } from '../../../queries/fields';
import { scenarioListQuery } from '../../../queries/scenarios';
import { seasonListQuery } from '../../../queries/seasons';
import { shapeOf } from '../boundary/shape';
import { useBoundaryEditor } from '../boundary/use-boundary-editor';
import { BoundaryEdit } from './boundary-edit';
import { FieldFacts } from './field-facts';
import { GroundForm } from './ground-form';
import { nextStep } from './next-step';
import { OccludersSection } from './occluders-section';
import classes from './overview.module.css';
import { ScenariosSection } from './scenarios-section';
import { SeasonsSection } from './seasons-section';
import { useOccluderDrawing } from './use-occluder-drawing';

const OverviewMap = lazy(async () => ({ default: (await import('./overview-map')).OverviewMap }));

interface Props {
  field: Field;
  /** Review links of this field, made by another room. */
  reviews: ReactNode;
}

/** One field: where it lies, what grows, what was tried, who was asked. */
export function FieldOverview({ field, reviews }: Props) {
  const [search, setSearch] = useSearchParams();
  const { hash } = useLocation();
  const around = useQuery(fieldListQuery());
  const seasons = useQuery(seasonListQuery(field.id));
  const scenarios = useQuery({
    ...scenarioListQuery(field.id),
    refetchInterval: ({ state }) =>
      state.data?.some(({ latestRun }) => ['queued', 'running'].includes(latestRun?.status ?? ''))
        ? 2000
        : false,
  });
  const savedShape = useMemo(() => shapeOf(field.boundary), [field.boundary]);
  const editor = useBoundaryEditor(`boundary:${field.id}`, savedShape, field.version);
  const drawing = useOccluderDrawing();
  const top = useRef<HTMLDivElement>(null);
  const mayWrite = useMay('fields:write');
  const editing = mayWrite && search.get('edit') === 'boundary';
  const tapping = drawing.line !== null;
  const ready = seasons.isSuccess && scenarios.isSuccess;

  useEffect(() => {
    if (hash && ready) document.getElementById(hash.slice(1))?.scrollIntoView();
  }, [hash, ready]);

  // The tools work on the map; it must be in sight when they come up.
  useEffect(() => {
    if (editing || tapping) top.current?.scrollIntoView({ block: 'start' });
  }, [editing, tapping]);

  const open = (name: string, value: string | null) =>
    setSearch((before) => {
      const next = new URLSearchParams(before);
      if (value) next.set(name, value);
      else next.delete(name);
      return next;
    });

  return (
    <>
      <div className={classes.top} ref={top}>
        <div>
          <Suspense fallback={<Skeleton className={classes.map} />}>
            <OverviewMap
              field={field}
              around={(around.data ?? []).filter(({ id }) => id !== field.id)}
              editor={editing ? editor : null}
              drawing={drawing}
            />
          </Suspense>
          {!editing && mayWrite && (
            <div className={classes.mapTools}>
              <Button
                variant="default"
                leftSection={<IconPolygon size={17} stroke={1.6} />}
                onClick={() => open('edit', 'boundary')}
              >
                {field.boundary ? 'Change the boundary' : 'Draw the boundary'}
              </Button>
            </div>
          )}
        </div>
        {editing ? (
          <BoundaryEdit field={field} editor={editor} onDone={() => open('edit', null)} />
        ) : (
          <FieldFacts
            field={field}
            step={ready && mayWrite ? nextStep(field, seasons.data.length, scenarios.data) : null}
          />
        )}
      </div>
      <ScenariosSection field={field} scenarios={scenarios} />
      <div className={classes.columns}>
        <div>
          <SeasonsSection
            field={field}
            open={search.get('season')}
            onOpen={(season) => open('season', season)}
          />
          <OccludersSection field={field} drawing={drawing} />
        </div>
        <div>
          <Section title="Ground">
            <GroundForm key={field.id} field={field} />
          </Section>
          <div id="reviews">{reviews}</div>
        </div>
      </div>
    </>
  );
}
