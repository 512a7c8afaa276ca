import { Button, Skeleton } from '@mantine/core';
import { useInfiniteQuery } from '@tanstack/react-query';
import { ErrorPanel } from '../../components/error-panel';
import { Section } from '../../components/section';
import { instantIn } from '../../lib/format';
import { auditQuery } from '../../queries/audit';
import classes from './cooperative.module.css';

/** The log of what happened; each entry carries a hash over itself and the one before. */
export function AuditSection({ timeZone }: { timeZone: string }) {
  const log = useInfiniteQuery(auditQuery);
  const entries = log.data?.pages.flatMap((page) => page.items) ?? [];
  const brokenAt = log.data?.pages[0]?.brokenAt ?? null;
  return (
    <Section
      title="What happened"
      intro="Every entry is sealed with a hash over itself and the one before, so that none can be changed or taken out unseen."
    >
      {log.isPending && <Skeleton height={240} />}
      {log.isError && <ErrorPanel error={log.error} onRetry={() => void log.refetch()} />}
      {log.data && (
        <p role="status" className={brokenAt === null ? classes.quiet : classes.broken}>
          {brokenAt === null
            ? 'The chain of hashes is whole.'
            : `The chain of hashes breaks at entry ${brokenAt}: that entry or one before it was changed outside the program.`}
        </p>
      )}
      {entries.length > 0 && (
        <table className={classes.log}>
          <caption>Entries, newest first</caption>
          <thead>
            <tr>
              <th scope="col">When</th>
              <th scope="col">Who</th>
              <th scope="col">What</th>
              <th scope="col">Which</th>
              <th scope="col">Seal</th>
            </tr>
          </thead>
          <tbody>
            {entries.map((entry) => (
              <tr key={entry.seq}>
                <td>{instantIn(entry.at, timeZone)}</td>
                <td>{entry.actorName}</td>
                <td>{entry.action}</td>
                <td>
                  {entry.subjectName || entry.subjectId} <small>{entry.subjectKind}</small>
                </td>
                <td>
                  <code title={entry.hash}>{entry.hash.slice(0, 10)}</code>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      {log.hasNextPage && (
        <Button
          mt="md"
          variant="default"
          loading={log.isFetchingNextPage}
          onClick={() => void log.fetchNextPage()}
        >
          Show older entries
        </Button>
      )}
    </Section>
  );
}
