import { Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { fieldQuery } from '../../queries/fields';
import { scenarioQuery } from '../../queries/scenarios';
import { seasonListQuery } from '../../queries/seasons';
import { weatherListQuery } from '../../queries/weather';
import { Designer } from './designer';

/** Opens the row designer on a new or a kept scenario once all it stands on is there. */
export function DesignerPage() {
  const { fieldId = '', scenarioId } = useParams();
  const field = useQuery(fieldQuery(fieldId));
  const seasons = useQuery(seasonListQuery(fieldId));
  const weather = useQuery(weatherListQuery);
  const scenario = useQuery({
    ...scenarioQuery(scenarioId ?? ''),
    enabled: scenarioId !== undefined,
  });
  const error = field.error ?? seasons.error ?? weather.error ?? scenario.error;
  if (error) return <ErrorPanel error={error} />;
  const waits = scenarioId !== undefined && !scenario.data;
  if (!field.data || !seasons.data || !weather.data || waits) {
    return (
      <div aria-hidden>
        <Skeleton height={36} width={320} mb="lg" />
        <Skeleton height={520} />
      </div>
    );
  }
  return (
    <Designer
      key={scenarioId ?? 'new'}
      field={field.data}
      scenario={scenario.data ?? null}
      seasons={seasons.data}
      weather={weather.data}
    />
  );
}
