import { holds } from '@furrowlight/shared/access/may';
import type { MemberPermission } from '@furrowlight/shared/access/permissions';
import type { Session } from '@furrowlight/shared/contract/session';
import { useQuery } from '@tanstack/react-query';
import { sessionQuery } from '../queries/session';

/** May a person of this session do that at all? The server decides again, row by row. */
export function mayDo(session: Session | null | undefined, permission: MemberPermission): boolean {
  if (!session) return false;
  const { memberId, name, role, cooperative } = session;
  return holds({ kind: 'member', memberId, name, role, cooperativeId: cooperative.id }, permission);
}

/** May the signed-in person do that? What they may not do is not offered. */
export function useMay(permission: MemberPermission): boolean {
  return mayDo(useQuery(sessionQuery).data, permission);
}
