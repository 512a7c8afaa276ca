import { Button, SegmentedControl, Skeleton } from '@mantine/core';
import { useQueries, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { EmptyState } from '../../components/empty-state';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { fieldQuery } from '../../queries/fields';
import { resultQuery } from '../../queries/runs';
import { scenarioListQuery, scenarioQuery } from '../../queries/scenarios';
import { ChooseScenarios } from './choose-scenarios';
import { CompareView } from './compare-view';
import type { Compared } from './compared';

const MOST = 4;

/** Up to four scenarios beside the open field, season by season. */
export function ComparePage() {
  const { fieldId = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const ids = (search.get('ids') ?? '').split(',').filter(Boolean).slice(0, MOST);
  const field = useQuery(fieldQuery(fieldId));
  const all = useQuery(scenarioListQuery(fieldId));
  const scenarios = useQueries({ queries: ids.map((id) => scenarioQuery(id)) });
  const results = useQueries({ queries: ids.map((id) => resultQuery(id)) });
  const [measure, setMeasure] = useState<'mean' | 'darkest'>('mean');
  const failed = field.error ?? scenarios.find(({ error }) => error)?.error;
  if (failed) return <ErrorPanel error={failed} />;
  const compared: Compared[] = ids.flatMap((_, i) => {
    const scenario = scenarios[i].data;
    const stored = results[i].data;
    return scenario && stored ? [{ scenario, result: stored.result }] : [];
  });
  const waiting = results.some(({ isPending }) => isPending) || !field.data;
  const choose = (next: string[]) => setSearch({ ids: next.join(',') }, { replace: true });
  return (
    <>
      <PageHead
        title="Compare"
        crumbs={[
          { label: 'Fields', to: '/fields' },
          { label: field.data?.name ?? 'Field', to: `/fields/${fieldId}` },
        ]}
        actions={
          <SegmentedControl
            value={measure}
            onChange={(value) => setMeasure(value === 'darkest' ? 'darkest' : 'mean')}
            data={[
              { value: 'mean', label: 'Mean of the field' },
              { value: 'darkest', label: 'Darkest strip' },
            ]}
            aria-label="What is compared"
          />
        }
      >
        Layouts beside the open field, light at canopy top, modelled
      </PageHead>
      <ChooseScenarios
        all={(all.data ?? []).filter(({ latestRun }) => latestRun?.status === 'done')}
        chosen={ids}
        most={MOST}
        onChange={choose}
      />
      {waiting && ids.length > 0 && <Skeleton height={420} />}
      {!waiting && compared.length === 0 && (
        <EmptyState
          title="Nothing to compare yet"
          action={
            <Button component={Link} to={`/fields/${fieldId}`}>
              To the scenarios
            </Button>
          }
        >
          Choose scenarios whose light has been worked out. Each is set beside the open field.
        </EmptyState>
      )}
      {!waiting && compared.length > 0 && <CompareView compared={compared} measure={measure} />}
    </>
  );
}
