import type { Member } from '@furrowlight/shared/contract/members';
import { Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { DataTable, type Column } from '../../components/data-table';
import { ErrorPanel } from '../../components/error-panel';
import { Section } from '../../components/section';
import { memberListQuery } from '../../queries/members';

const COLUMNS: Column<Member>[] = [
  { id: 'name', head: 'Name', sortBy: ({ name }) => name, cell: ({ name }) => <b>{name}</b> },
  { id: 'email', head: 'E-mail', sortBy: ({ email }) => email, cell: ({ email }) => email },
  { id: 'role', head: 'Role', sortBy: ({ role }) => role, cell: ({ role }) => role },
  {
    id: 'active',
    head: 'Sign-in',
    sortBy: ({ active }) => (active ? 0 : 1),
    cell: ({ active }) => (active ? 'open' : 'closed'),
  },
];

export function MembersSection() {
  const members = useQuery(memberListQuery);
  return (
    <Section title="People">
      {members.isPending && <Skeleton height={200} />}
      {members.isError && (
        <ErrorPanel error={members.error} onRetry={() => void members.refetch()} />
      )}
      {members.data && (
        <DataTable
          caption="People of the cooperative"
          rows={members.data}
          columns={COLUMNS}
          rowKey={({ id }) => id}
          initialSort="name"
        />
      )}
    </Section>
  );
}
