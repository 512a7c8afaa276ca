import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useMemo, useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { Button, Skeleton } from '@mantine/core';
import { IconPlus } from '@tabler/icons-react';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { countOf, hectares } from '../../lib/format';
import { useMay } from '../../lib/use-may';
import { farmListQuery } from '../../queries/farms';
import { fieldListQuery } from '../../queries/fields';
import { AddPanel } from './add/add-panel';
import { isAddMode } from './add/add-mode';
import { useBoundaryEditor } from './boundary/use-boundary-editor';
import { EMPTY } from './boundary/shape';
import { BrowsePanel } from './browse-panel';
import { fieldsMatching } from './fields-matching';
import classes from './fields-page.module.css';
import type { ReadPolygon } from './import/parse-geojson';

const FieldsMap = lazy(async () => ({ default: (await import('./fields-map')).FieldsMap }));
const NONE: never[] = [];

/** All fields as list and map; both show the same choice. What is shown stands in the address. */
export function FieldsPage() {
  const [search, setSearch] = useSearchParams();
  const navigate = useNavigate();
  const fields = useQuery(fieldListQuery());
  const farms = useQuery(farmListQuery);
  const editor = useBoundaryEditor('boundary:new', EMPTY, 0);
  const [importing, setImporting] = useState<ReadPolygon[]>([]);
  const [pin, setPin] = useState<[number, number] | null>(null);

  const farmId = search.get('farm');
  const query = search.get('q') ?? '';
  const selectedId = search.get('field');
  const add = search.get('add');
  const mayWrite = useMay('fields:write');
  const mode = mayWrite && isAddMode(add) ? add : null;
  const all = fields.data ?? NONE;
  const shown = useMemo(() => fieldsMatching(all, query, farmId), [all, query, farmId]);
  const farm = farms.data?.find(({ id }) => id === farmId);

  const change = (changes: Record<string, string | null>) =>
    setSearch(
      (before) => {
        const next = new URLSearchParams(before);
        for (const [name, value] of Object.entries(changes)) {
          if (value) next.set(name, value);
          else next.delete(name);
        }
        return next;
      },
      { replace: !('add' in changes) },
    );
  const total = shown.reduce((sum, field) => sum + (field.geometry?.areaM2 ?? 0), 0);

  return (
    <div className={classes.page}>
      <PageHead
        title={mode ? 'Add fields' : farm ? farm.name : 'Fields'}
        crumbs={
          mode
            ? [{ label: 'Fields', to: '/fields' }]
            : farm
              ? [
                  { label: 'Farms', to: '/farms' },
                  { label: 'All fields', to: '/fields' },
                ]
              : []
        }
        actions={
          !mode &&
          mayWrite && (
            <Button
              leftSection={<IconPlus size={16} />}
              onClick={() => change({ add: 'draw', field: null })}
            >
              Add a field
            </Button>
          )
        }
      >
        {!mode && fields.data && (
          <span className="tabular">
            {countOf(shown.length, 'field')}, {hectares(total)}
          </span>
        )}
      </PageHead>
      {fields.isError && <ErrorPanel error={fields.error} onRetry={() => void fields.refetch()} />}
      <div className={classes.split} data-adding={mode ?? undefined}>
        <div className={classes.side}>
          {mode ? (
            <AddPanel
              mode={mode}
              onMode={(next) => change({ add: next })}
              onClose={() => change({ add: null })}
              editor={editor}
              pin={pin}
              onPin={setPin}
              importing={importing}
              onImporting={setImporting}
              fields={all}
              farmId={farmId}
            />
          ) : (
            <BrowsePanel
              fields={shown}
              pending={fields.isPending}
              none={fields.data?.length === 0}
              farms={farms.data ?? NONE}
              farmId={farmId}
              query={query}
              selectedId={selectedId}
              onFarm={(id) => change({ farm: id, field: null })}
              onQuery={(text) => change({ q: text })}
              onSelect={(id) => change({ field: id })}
              onOpen={(id) => void navigate(`/fields/${id}`)}
              onAdd={mayWrite ? (next) => change({ add: next }) : undefined}
            />
          )}
        </div>
        <Suspense fallback={<Skeleton className={classes.map} />}>
          {fields.data && (
            <FieldsMap
              className={classes.map}
              fields={mode ? all : shown}
              farmId={farmId}
              selectedId={selectedId}
              onSelect={(id) => change({ field: id })}
              mode={mode}
              editor={editor}
              pin={pin}
              onPin={setPin}
              importing={importing}
            />
          )}
        </Suspense>
      </div>
    </div>
  );
}
