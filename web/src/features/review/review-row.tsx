import type { Review } from '@furrowlight/shared/contract/reviews';
import { Button } from '@mantine/core';
import { modals } from '@mantine/modals';
import { notifications } from '@mantine/notifications';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { ApiProblem } from '../../lib/api';
import { instantIn } from '../../lib/format';
import { revokeReview } from '../../queries/reviews';
import classes from './review-links.module.css';

const STATES: Record<Review['state'], string> = {
  open: 'Open',
  expired: 'Expired',
  revoked: 'Revoked',
};

interface Props {
  review: Review;
  /** Scenario names by id. */
  names: ReadonlyMap<string, string>;
  timeZone: string;
}

/** One link: what it shows, how far it was read, and its end. */
export function ReviewRow({ review, names, timeZone }: Props) {
  const client = useQueryClient();
  const revoke = useMutation(revokeReview(client));
  const shown = review.scenarioIds.map((id) => names.get(id) ?? 'an archived scenario');
  const ask = () =>
    modals.openConfirmModal({
      title: 'Revoke this link?',
      children: 'Whoever holds it is out with the next click. It cannot be opened again.',
      labels: { confirm: 'Revoke the link', cancel: 'Keep it' },
      confirmProps: { color: 'danger' },
      onConfirm: () =>
        revoke.mutate(review.id, {
          onError: (error) =>
            notifications.show({
              color: 'danger',
              title: 'The link is still open',
              message: error instanceof ApiProblem ? error.detail : 'Something went wrong.',
            }),
        }),
    });
  return (
    <li className={classes.row} data-state={review.state}>
      <span className={classes.state}>{STATES[review.state]}</span>
      <div className={classes.what}>
        <strong>{shown.join(', ')}</strong>
        <span>
          {review.views === 0
            ? 'Not opened yet'
            : `Opened ${review.views === 1 ? 'once' : `${review.views} times`}, last ${review.lastOpenedAt ? instantIn(review.lastOpenedAt, timeZone) : ''}`}
        </span>
        <span>
          Made by {review.createdByName}, {instantIn(review.createdAt, timeZone)};{' '}
          {review.revokedAt
            ? `revoked ${instantIn(review.revokedAt, timeZone)}`
            : `${review.state === 'expired' ? 'expired' : 'open until'} ${instantIn(review.expiresAt, timeZone)}`}
        </span>
      </div>
      {review.state === 'open' && (
        <Button
          variant="subtle"
          color="danger"
          size="compact-sm"
          loading={revoke.isPending}
          onClick={ask}
          aria-label={`Revoke the link to ${shown.join(', ')}`}
        >
          Revoke
        </Button>
      )}
    </li>
  );
}
