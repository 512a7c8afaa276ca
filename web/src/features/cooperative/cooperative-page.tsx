import { useQuery } from '@tanstack/react-query';
import { PageHead } from '../../components/page-head';
import { useMay } from '../../lib/use-may';
import { sessionQuery } from '../../queries/session';
import { AuditSection } from './audit-section';
import { BinSection } from './bin-section';
import { MembersSection } from './members-section';

/** The people of the cooperative, what was removed, and proof of what happened. */
export function CooperativePage() {
  const session = useQuery(sessionQuery);
  const mayRestore = useMay('farms:write');
  const mayAudit = useMay('audit:read');
  const cooperative = session.data?.cooperative;
  return (
    <>
      <PageHead title={cooperative?.name ?? 'Cooperative'}>
        {cooperative && `Clock of ${cooperative.timeZone}.`}
        {cooperative?.demo && ' This is the demo: its people and farms are made up.'}
      </PageHead>
      <MembersSection />
      {mayRestore && <BinSection timeZone={cooperative?.timeZone ?? 'UTC'} />}
      {mayAudit && <AuditSection timeZone={cooperative?.timeZone ?? 'UTC'} />}
    </>
  );
}
