import type { Weather } from '@furrowlight/shared/contract/weather';
import { Button, Skeleton } from '@mantine/core';
import { IconPlus } from '@tabler/icons-react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { EmptyState } from '../../components/empty-state';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { formatNumber, percent } from '../../lib/format';
import { removeWeather, weatherListQuery } from '../../queries/weather';
import { AddWeather } from './add-weather';
import { FindingList } from './finding-list';
import { MonthBars } from './month-bars';
import classes from './weather.module.css';

/** The shelf of weather years scenarios are run over. */
export function WeatherPage() {
  const [search, setSearch] = useSearchParams();
  const years = useQuery(weatherListQuery);
  const adding = search.has('add');
  const open = (add: boolean) => setSearch(add ? { add: '1' } : {});
  return (
    <>
      <PageHead
        title="Weather years"
        actions={
          !adding && (
            <Button leftSection={<IconPlus size={16} />} onClick={() => open(true)}>
              Add a weather year
            </Button>
          )
        }
      >
        Hourly sun, temperature and wind that light budgets are worked out with
      </PageHead>
      {adding && <AddWeather onDone={() => open(false)} />}
      {years.isError && <ErrorPanel error={years.error} onRetry={() => void years.refetch()} />}
      {years.isPending && <Skeleton height={180} />}
      {years.data?.length === 0 && !adding && (
        <EmptyState
          title="No weather year yet"
          action={<Button onClick={() => open(true)}>Add a weather year</Button>}
        >
          Upload a typical year for your area (EPW, or any hourly CSV), or type twelve monthly
          means.
        </EmptyState>
      )}
      {years.data && years.data.length > 0 && (
        <ul className={classes.shelf}>
          {years.data.map((weather) => (
            <WeatherCard key={weather.id} weather={weather} />
          ))}
        </ul>
      )}
    </>
  );
}

const KINDS = { file: 'From a file', climate: 'From monthly means', 'clear-sky': 'Clear sky' };

function WeatherCard({ weather }: { weather: Weather }) {
  const client = useQueryClient();
  const remove = useMutation(removeWeather(client));
  const { summary } = weather;
  return (
    <li className={classes.card}>
      <div>
        <h2 className={classes.name}>{weather.name}</h2>
        <p className={classes.quiet}>
          {KINDS[weather.kind]}, {formatNumber(weather.latitude, 2)}° N{' '}
          {formatNumber(weather.longitude, 2)}° E, {formatNumber(weather.elevationM)} m, UTC
          {weather.utcOffsetHours >= 0 ? '+' : ''}
          {weather.utcOffsetHours}
        </p>
        <p className={classes.quiet}>{weather.source}</p>
        <dl className={classes.facts}>
          <div>
            <dt>Global light</dt>
            <dd>{formatNumber(summary.ghiKwhM2)} kWh m⁻² a year</dd>
          </div>
          <div>
            <dt>Diffuse</dt>
            <dd>{percent(summary.diffuseShare)}</dd>
          </div>
          {summary.meanTemperatureC !== null && (
            <div>
              <dt>Mean temperature</dt>
              <dd>{formatNumber(summary.meanTemperatureC, 1)} °C</dd>
            </div>
          )}
        </dl>
        {weather.findings.length > 0 && (
          <details className={classes.details}>
            <summary>{weather.findings.length} findings</summary>
            <FindingList findings={weather.findings} />
          </details>
        )}
        <Button
          variant="subtle"
          size="compact-sm"
          color="ink"
          loading={remove.isPending}
          onClick={() => remove.mutate(weather.id)}
          aria-label={`Remove ${weather.name}`}
        >
          Remove
        </Button>
        {remove.isError && <ErrorPanel error={remove.error} title="It stays on the shelf" />}
      </div>
      <MonthBars monthlyMjM2={summary.monthlyMjM2} />
    </li>
  );
}
