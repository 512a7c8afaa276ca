import { Skeleton } from '@mantine/core';
import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useParams } from 'react-router-dom';
import { ErrorPanel } from '../../components/error-panel';
import { PageHead } from '../../components/page-head';
import { FieldMenu } from '../../features/field-map/overview/field-menu';
import { FieldOverview } from '../../features/field-map/overview/field-overview';
import { ReviewLinks } from '../../features/review/review-links';
import { ApiProblem } from '../../lib/api';
import { mayDo } from '../../lib/use-may';
import { noteRecent } from '../../lib/recent';
import { fieldQuery } from '../../queries/fields';
import { sessionQuery } from '../../queries/session';
import { NotFound } from './not-found';

/** The page of one field, put together from the rooms that know its parts. */
export function FieldRoute() {
  const { fieldId = '' } = useParams();
  const session = useQuery(sessionQuery);
  const field = useQuery(fieldQuery(fieldId));
  const memberId = session.data?.memberId;
  const maySeeReviews = mayDo(session.data, 'reviews:read');
  const name = field.data?.name;
  const farmName = field.data?.farmName;

  useEffect(() => {
    if (memberId && name && farmName) {
      noteRecent(memberId, { to: `/fields/${fieldId}`, label: name, under: farmName });
    }
  }, [memberId, fieldId, name, farmName]);

  if (field.isError) {
    const gone = field.error instanceof ApiProblem && field.error.status === 404;
    if (gone) return <NotFound />;
    return <ErrorPanel error={field.error} onRetry={() => void field.refetch()} />;
  }
  if (!field.data) {
    return (
      <div aria-hidden>
        <Skeleton height={14} width={180} mb="sm" />
        <Skeleton height={36} width={320} mb="xl" />
        <Skeleton height={432} />
      </div>
    );
  }
  return (
    <>
      <PageHead
        title={field.data.name}
        crumbs={[
          { label: 'Fields', to: '/fields' },
          { label: field.data.farmName, to: `/fields?farm=${field.data.farmId}` },
        ]}
        actions={memberId && <FieldMenu field={field.data} memberId={memberId} />}
      />
      <FieldOverview
        key={field.data.id}
        field={field.data}
        reviews={maySeeReviews && <ReviewLinks fieldId={field.data.id} />}
      />
    </>
  );
}
