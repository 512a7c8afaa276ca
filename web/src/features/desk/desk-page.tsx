import type { Desk, DeskItem } from '@furrowlight/shared/contract/desk';
import { Button, Skeleton } from '@mantine/core';
import { IconPlus } from '@tabler/icons-react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { Section } from '../../components/section';
import { ago, formatNumber } from '../../lib/format';
import { useMay } from '../../lib/use-may';
import { deskQuery } from '../../queries/desk';
import { GROUPS, KINDS, placeOf } from './desk-items';
import classes from './desk-page.module.css';
import { FirstSteps } from './first-steps';

export function DeskPage() {
  const mayAdd = useMay('fields:write');
  const desk = useQuery({ ...deskQuery, refetchInterval: 30_000 });
  return (
    <>
      <PageHead
        title="Desk"
        actions={
          mayAdd && (
            <Button component={Link} to="/fields?add=draw" leftSection={<IconPlus size={16} />}>
              Add a field
            </Button>
          )
        }
      >
        What wants your attention, most pressing first.
      </PageHead>
      {desk.isPending && <DeskSkeleton />}
      {desk.isError && <ErrorPanel error={desk.error} onRetry={() => void desk.refetch()} />}
      {desk.data && <DeskBody desk={desk.data} />}
    </>
  );
}

function DeskBody({ desk }: { desk: Desk }) {
  const { counts, items } = desk;
  if (counts.fields === 0) return <FirstSteps counts={counts} />;
  const groups = GROUPS.map((group) => ({
    ...group,
    items: items.filter((item) => group.kinds.includes(item.kind)),
  })).filter((group) => group.items.length > 0);
  return (
    <div className={classes.columns}>
      <div>
        {groups.length === 0 && (
          <Section title="Nothing wants you today">
            <p className={classes.quiet}>
              No run is waiting, no link is about to expire and every field has its boundary and
              crop. Lay rows over a field to find out what they would take from its light.
            </p>
            <Button component={Link} to="/fields" variant="default" mt="md">
              Choose a field
            </Button>
          </Section>
        )}
        {groups.map((group) => (
          <Section key={group.title} title={group.title}>
            <ul className={classes.list}>
              {group.items.map((item) => (
                <Row
                  key={`${item.kind}-${item.fieldId}-${item.scenarioId}-${item.at}`}
                  item={item}
                />
              ))}
            </ul>
          </Section>
        ))}
      </div>
      <aside aria-label="In your care" className={classes.care}>
        <h2>In your care</h2>
        <dl>
          <Count name="Farms" value={counts.farms} to="/farms" />
          <Count name="Fields" value={counts.fields} to="/fields" />
          <Count name="Scenarios" value={counts.scenarios} />
          <Count name="Open review links" value={counts.openReviews} />
        </dl>
        {counts.scenarios === 0 && <FirstSteps counts={counts} />}
      </aside>
    </div>
  );
}

function Count({ name, value, to }: { name: string; value: number; to?: string }) {
  return (
    <div>
      <dt>{to ? <Link to={to}>{name}</Link> : name}</dt>
      <dd>{formatNumber(value)}</dd>
    </div>
  );
}

function Row({ item }: { item: DeskItem }) {
  const kind = KINDS[item.kind];
  return (
    <li className={classes.row} data-kind={item.kind}>
      <kind.icon size={20} stroke={1.5} aria-hidden className={classes.icon} />
      <div>
        <div className={classes.where}>
          <span className={classes.field}>{item.fieldName}</span>
          <span className={classes.farm}>{item.farmName}</span>
        </div>
        <p>{item.text}</p>
      </div>
      <div className={classes.side}>
        <Link to={placeOf(item)} aria-label={`${kind.step}: ${item.fieldName}`}>
          {kind.step}
        </Link>
        <time dateTime={item.at}>{ago(item.at, new Date())}</time>
      </div>
    </li>
  );
}

function DeskSkeleton() {
  return (
    <div className={classes.columns} aria-hidden>
      <div>
        {[0, 1, 2, 3, 4].map((i) => (
          <Skeleton key={i} height={68} mb="xs" />
        ))}
      </div>
      <Skeleton height={220} />
    </div>
  );
}
