import type { BinItem } from '@furrowlight/shared/contract/bin';
import { Button, Skeleton } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { ErrorPanel } from '../../components/error-panel';
import { Section } from '../../components/section';
import { instantIn } from '../../lib/format';
import { showRefusal } from '../../lib/show-refusal';
import { binQuery, restore } from '../../queries/bin';
import classes from './cooperative.module.css';

export function BinSection({ timeZone }: { timeZone: string }) {
  const bin = useQuery(binQuery);
  return (
    <Section
      title="Bin"
      intro="Removed farms and fields stay here for 30 days with all that belongs to them."
    >
      {bin.isPending && <Skeleton height={80} />}
      {bin.isError && <ErrorPanel error={bin.error} onRetry={() => void bin.refetch()} />}
      {bin.data?.length === 0 && <p className={classes.quiet}>The bin is empty.</p>}
      <ul className={classes.list}>
        {bin.data?.map((item) => (
          <BinRow key={`${item.kind}-${item.id}`} item={item} timeZone={timeZone} />
        ))}
      </ul>
    </Section>
  );
}

function BinRow({ item, timeZone }: { item: BinItem; timeZone: string }) {
  const client = useQueryClient();
  const bringBack = useMutation(restore(client));
  const onClick = () =>
    bringBack
      .mutateAsync(item)
      .then(() => notifications.show({ message: `${item.name} is back.` }))
      .catch((error: unknown) => showRefusal(`${item.name} stays in the bin`, error));
  return (
    <li>
      <div>
        <strong>{item.name}</strong>
        <small>
          {item.kind === 'field' ? `Field of ${item.farmName}` : 'Farm'}, removed{' '}
          {instantIn(item.deletedAt, timeZone)}, kept until {instantIn(item.keptUntil, timeZone)}
        </small>
      </div>
      <Button variant="default" loading={bringBack.isPending} onClick={() => void onClick()}>
        Bring back
      </Button>
    </li>
  );
}
