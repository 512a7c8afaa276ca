import { Button, Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorPanel } from '../../components/error-panel';
import { Section } from '../../components/section';
import { fieldQuery } from '../../queries/fields';
import { reviewListQuery } from '../../queries/reviews';
import { scenarioListQuery } from '../../queries/scenarios';
import { NewLink } from './new-link';
import { ReviewRow } from './review-row';
import classes from './review-links.module.css';

/** Links handed to the farmer for this field: make, copy, watch, revoke. */
export function ReviewLinks({ fieldId }: { fieldId: string }) {
  const [making, setMaking] = useState(false);
  const reviews = useQuery(reviewListQuery(fieldId));
  const scenarios = useQuery(scenarioListQuery(fieldId));
  const field = useQuery(fieldQuery(fieldId));
  const error = reviews.error ?? scenarios.error;
  const ready = (scenarios.data ?? []).filter(({ latestRun }) => latestRun?.status === 'done');
  const names = new Map((scenarios.data ?? []).map(({ id, name }) => [id, name]));
  return (
    <Section
      title="Review with the farmer"
      intro="A link opens the frozen scenarios on a phone, without an account, until it expires or you revoke it."
      actions={
        !making &&
        ready.length > 0 && (
          <Button size="compact-md" onClick={() => setMaking(true)}>
            Make a review link
          </Button>
        )
      }
    >
      {error && <ErrorPanel error={error} onRetry={() => void reviews.refetch()} />}
      {making && <NewLink fieldId={fieldId} ready={ready} onDone={() => setMaking(false)} />}
      {reviews.isPending && <Skeleton height={64} />}
      {reviews.data?.length === 0 && !making && (
        <p className={classes.none}>
          {ready.length > 0
            ? 'No link yet.'
            : 'No link yet. Work out the light budget of a scenario first; then it can be shown.'}
        </p>
      )}
      {reviews.data && reviews.data.length > 0 && (
        <ul className={classes.list}>
          {reviews.data.map((review) => (
            <ReviewRow
              key={review.id}
              review={review}
              names={names}
              timeZone={field.data?.timeZone ?? 'UTC'}
            />
          ))}
        </ul>
      )}
    </Section>
  );
}
