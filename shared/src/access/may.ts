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

/** What of a farm decides who may reach it. */
export interface FarmAccess {
  cooperativeId: string;
  /** The member who farms it, where that person has an account. */
  farmerMemberId: string | null;
}

/** Which farms, and with them fields and all that hangs on them, a principal may reach. */
export type FarmScope =
  | { kind: 'cooperative'; cooperativeId: string }
  | { kind: 'held-by'; cooperativeId: string; memberId: string }
  | { kind: 'none' };

/** Does the principal hold the permission at all? Rows are judged by `mayReachFarm`. */
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

/** May the principal reach this one farm? */
export function mayReachFarm(principal: Principal, farm: FarmAccess): boolean {
  const scope = farmScope(principal);
  if (scope.kind === 'none' || scope.cooperativeId !== farm.cooperativeId) return false;
  return scope.kind === 'cooperative' || farm.farmerMemberId === scope.memberId;
}

/** May the principal see what a review link of this field and these scenarios shows? */
export function mayReadReviewPage(principal: Principal, reviewId: string): boolean {
  return principal.kind === 'review-link' && principal.reviewId === reviewId;
}
