import type { Field } from '@furrowlight/shared/contract/fields';
import type { ScenarioResult } from '@furrowlight/shared/contract/result';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { Button, Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { LightWeave } from '../../charts/light-weave';
import { Picture } from '../../charts/picture';
import { SunSplitBar } from '../../charts/sun-split-bar';
import { EmptyState } from '../../components/empty-state';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { Section } from '../../components/section';
import { ApiProblem } from '../../lib/api';
import { fieldQuery } from '../../queries/fields';
import { resultQuery } from '../../queries/runs';
import { scenarioQuery } from '../../queries/scenarios';
import { BudgetTable } from './budget-table';
import { DataSheet } from './data-sheet';
import { EnergyBars, EnergyFigures } from './energy-panel';
import { Headline } from './headline';
import { LightCourse } from './light-course';
import { SeasonLedger } from './season-ledger';
import { sidesOf } from './sides';
import { EnergyTable, SplitTable, WeaveTable } from './tables';

/** What a run found: pictures first, tables under them, CSV behind the tables. */
export function ResultPage() {
  const { fieldId = '', scenarioId = '' } = useParams();
  const field = useQuery(fieldQuery(fieldId));
  const scenario = useQuery(scenarioQuery(scenarioId));
  const stored = useQuery(resultQuery(scenarioId));
  const failed = field.error ?? scenario.error;
  if (failed) return <ErrorPanel error={failed} />;
  if (stored.error instanceof ApiProblem && stored.error.status === 404) {
    return (
      <EmptyState
        title="No light budget yet"
        action={
          <Button component={Link} to={`/fields/${fieldId}/scenarios/${scenarioId}`}>
            Open the scenario
          </Button>
        }
      >
        Choose a weather year and run the scenario; the result appears here.
      </EmptyState>
    );
  }
  if (stored.error)
    return <ErrorPanel error={stored.error} onRetry={() => void stored.refetch()} />;
  if (!field.data || !scenario.data || !stored.data) return <Skeleton height={480} />;
  return <Result field={field.data} scenario={scenario.data} stored={stored.data} />;
}

interface ResultProps {
  field: Field;
  scenario: Scenario;
  stored: ScenarioResult;
}

function Result({ field, scenario, stored }: ResultProps) {
  const { result } = stored;
  const layout = scenario.frozen?.layout ?? scenario.layout;
  const here = `/fields/${field.id}/scenarios/${scenario.id}`;
  const csv = (table: string) => `/api/scenarios/${scenario.id}/result.csv?table=${table}`;
  const file = (part: string) => `${field.name} ${scenario.name} ${part}`;
  const weave = {
    weekly: result.planes[0].weekly,
    openWeekly: result.openWeekly,
    positionsM: result.positionsM,
    pitchM: result.pitchM,
  };
  return (
    <>
      <PageHead
        title={scenario.name}
        crumbs={[
          { label: 'Fields', to: '/fields' },
          { label: field.name, to: `/fields/${field.id}` },
          { label: 'Layout', to: here },
        ]}
        actions={
          <>
            <Button component={Link} to={here} variant="default">
              Layout
            </Button>
            <Button component={Link} to={`/fields/${field.id}/compare?ids=${scenario.id}`}>
              Compare
            </Button>
          </>
        }
      >
        Light budget at canopy top over {scenario.weatherName ?? 'its weather year'}, modelled
      </PageHead>
      <Headline result={result} />
      <Picture
        title="Light weave"
        intro="Each column is a week, each thread a strip of ground across one pitch; the row stands in the middle."
        fileName={file('light weave')}
        csvHref={csv('weave')}
        table={<WeaveTable result={result} />}
      >
        <LightWeave data={weave} sides={sidesOf(layout)} />
      </Picture>
      <Picture
        title="Daily light over the year"
        fileName={file('daily light')}
        csvHref={csv('weeks')}
        table={
          <BudgetTable
            caption="By month, mol m⁻² d⁻¹, modelled."
            rows={result.planes[0].months.map((budget) => ({
              key: budget.label,
              label: budget.label,
              budget,
            }))}
          />
        }
      >
        <LightCourse result={result} />
      </Picture>
      <Section
        title="Season ledger"
        actions={
          <Button
            component="a"
            href={csv('crops')}
            download
            size="compact-sm"
            variant="default"
            aria-label="CSV: Season ledger"
          >
            CSV
          </Button>
        }
      >
        <SeasonLedger result={result} />
      </Section>
      <Picture
        title="Sun split"
        intro={`Where 100 units of the year's sunlight go (${(result.sunSplit.year.incomingMjM2 / 3.6).toFixed(0)} kWh on each square metre of land).`}
        fileName={file('sun split')}
        csvHref={csv('sunsplit')}
        table={<SplitTable split={result.sunSplit} />}
      >
        <SunSplitBar split={result.sunSplit.year} />
      </Picture>
      <Picture
        title="Energy by month"
        intro="Alternating current, kWh per kWp."
        fileName={file('energy')}
        csvHref={csv('energy')}
        table={<EnergyTable energy={result.energy} />}
      >
        <EnergyBars energy={result.energy} />
      </Picture>
      <EnergyFigures energy={result.energy} figures={scenario.figures} />
      <div style={{ height: '2.5rem' }} />
      <DataSheet scenario={scenario} stored={stored} timeZone={field.timeZone} />
    </>
  );
}
