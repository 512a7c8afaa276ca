import type { Role } from '../contract/session.js';
import { isLinkPermission, MEMBER_PERMISSIONS, type Permission } from './permissions.js';

/** A signed-in person of one cooperative. */
export interface MemberPrincipal {
  kind: 'member';
  memberId: string;
  name: string;
  role: Role;
  cooperativeId: string;
}

/** A visitor who came through a review link: one field, some scenarios, nothing else. */
export interface LinkPrincipal {
  kind: 'review-link';
  reviewId: string;
  cooperativeId: string;
  fieldId: string;
  scenarioIds: readonly string[];
}

export type Principal = MemberPrincipal | LinkPrincipal;

/** Which farms, and with them fields and all that hangs on them, a principal may reach. */
export type FarmScope =
  | { kind: 'cooperative'; cooperativeId: string }
  | { kind: 'held-by'; cooperativeId: string; memberId: string }
  | { kind: 'none' };

/** Does the principal hold the permission at all? Which rows it counts for says `farmScope`. */
export function holds(principal: Principal, permission: Permission): boolean {
  if (isLinkPermission(permission)) return principal.kind === 'review-link';
  if (principal.kind !== 'member') return false;
  const roles: readonly Role[] | undefined = MEMBER_PERMISSIONS[permission];
  return roles?.includes(principal.role) ?? false;
}

/** The farms a principal may reach; a principal we do not know reaches none. */
export function farmScope(principal: Principal): FarmScope {
  if (principal.kind !== 'member') return { kind: 'none' };
  const { cooperativeId, memberId } = principal;
  switch (principal.role) {
    case 'admin':
    case 'advisor':
    case 'reader':
      return { kind: 'cooperative', cooperativeId };
    case 'farmer':
      return { kind: 'held-by', cooperativeId, memberId };
    default:
      return { kind: 'none' };
  }
}
