import type { Farm } from '@furrowlight/shared/contract/farms';
import { Button, Skeleton, TextInput } from '@mantine/core';
import { IconPlus, IconSearch } from '@tabler/icons-react';
import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { EmptyState } from '../../components/empty-state';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { countOf, hectares } from '../../lib/format';
import { useMay } from '../../lib/use-may';
import { farmListQuery } from '../../queries/farms';
import { FarmDrawer } from './farm-drawer';
import { FarmTable } from './farm-table';

function matching(farms: readonly Farm[], query: string): Farm[] {
  const words = query.toLowerCase().split(/\s+/).filter(Boolean);
  return farms.filter((farm) => {
    const text = `${farm.name} ${farm.holder} ${farm.place} ${farm.farmNumber} ${farm.advisorName ?? ''}`;
    return words.every((word) => text.toLowerCase().includes(word));
  });
}

/** The members' farms. What is open and filtered stands in the address. */
export function FarmsPage() {
  const [search, setSearch] = useSearchParams();
  const farms = useQuery(farmListQuery);
  const mayWrite = useMay('farms:write');
  const query = search.get('q') ?? '';
  const shown = useMemo(() => matching(farms.data ?? [], query), [farms.data, query]);
  const editing = farms.data?.find((farm) => farm.id === search.get('edit'));
  const adding = search.has('add');

  const change = (name: string, value: string | null) =>
    setSearch(
      (before) => {
        const next = new URLSearchParams(before);
        if (name !== 'q') ['add', 'edit'].forEach((key) => next.delete(key));
        if (value) next.set(name, value);
        else next.delete(name);
        return next;
      },
      { replace: name === 'q' },
    );
  const total = shown.reduce((sum, farm) => sum + farm.areaM2, 0);

  return (
    <>
      <PageHead
        title="Farms"
        actions={
          mayWrite && (
            <Button leftSection={<IconPlus size={16} />} onClick={() => change('add', '1')}>
              Add a farm
            </Button>
          )
        }
      >
        {farms.data && farms.data.length > 0 && (
          <span className="tabular">
            {countOf(shown.length, 'farm')}, {hectares(total)} of fields with a boundary
          </span>
        )}
      </PageHead>
      {farms.isPending && <FarmsSkeleton />}
      {farms.isError && <ErrorPanel error={farms.error} onRetry={() => void farms.refetch()} />}
      {farms.data?.length === 0 && (
        <EmptyState
          title="No farm is recorded yet"
          action={
            mayWrite && <Button onClick={() => change('add', '1')}>Add the first farm</Button>
          }
        >
          A farm holds its fields together and names who farms them. Letters and review pages speak
          to that person.
        </EmptyState>
      )}
      {farms.data && farms.data.length > 0 && (
        <>
          <TextInput
            aria-label="Find a farm by name, holder, place or number"
            placeholder="Name, holder, place or number"
            leftSection={<IconSearch size={16} stroke={1.7} />}
            maw={360}
            mb="md"
            value={query}
            onChange={(event) => change('q', event.currentTarget.value)}
          />
          {shown.length > 0 ? (
            <FarmTable farms={shown} onEdit={mayWrite ? (id) => change('edit', id) : undefined} />
          ) : (
            <p>
              No farm answers to “{query}”.{' '}
              <Button variant="default" size="compact-sm" onClick={() => change('q', null)}>
                Show all
              </Button>
            </p>
          )}
        </>
      )}
      <FarmDrawer
        key={editing?.id ?? 'new'}
        opened={mayWrite && (adding || editing !== undefined)}
        farm={editing ?? null}
        onClose={() => change('add', null)}
      />
    </>
  );
}

function FarmsSkeleton() {
  return (
    <div aria-hidden>
      <Skeleton height={36} maw={360} mb="lg" />
      {[0, 1, 2, 3, 4, 5].map((i) => (
        <Skeleton key={i} height={44} mb={6} />
      ))}
    </div>
  );
}
