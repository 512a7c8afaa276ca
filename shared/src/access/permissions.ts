import type { Role } from '../contract/session.js';

/**
 * Every permission of the product with the roles that hold it. This table is the only place that
 * says so: the API's guard, the screens and the tests all read it. Which rows a holder may reach
 * is answered by may.ts.
 */
export const MEMBER_PERMISSIONS = {
  'session:own': ['admin', 'advisor', 'farmer', 'reader'],
  'members:read': ['admin', 'advisor', 'reader'],
  'farms:read': ['admin', 'advisor', 'farmer', 'reader'],
  'farms:write': ['admin', 'advisor'],
  'fields:read': ['admin', 'advisor', 'farmer', 'reader'],
  'fields:write': ['admin', 'advisor'],
  'crops:read': ['admin', 'advisor', 'farmer', 'reader'],
  'rules:read': ['admin', 'advisor', 'farmer', 'reader'],
  'weather:read': ['admin', 'advisor', 'farmer', 'reader'],
  'weather:write': ['admin', 'advisor'],
  'scenarios:read': ['admin', 'advisor', 'farmer', 'reader'],
  'scenarios:write': ['admin', 'advisor'],
  'runs:read': ['admin', 'advisor', 'farmer', 'reader'],
  'runs:start': ['admin', 'advisor'],
  'reviews:read': ['admin', 'advisor', 'reader'],
  'reviews:write': ['admin', 'advisor'],
  'desk:read': ['admin', 'advisor', 'farmer', 'reader'],
  'audit:read': ['admin'],
} as const satisfies Record<string, readonly Role[]>;

/** Held by whoever came through a review link, and by no member. */
export const LINK_PERMISSIONS = ['review-page:read'] as const;

export type MemberPermission = keyof typeof MEMBER_PERMISSIONS;
export type LinkPermission = (typeof LINK_PERMISSIONS)[number];
export type Permission = MemberPermission | LinkPermission;

/** Is this permission for visitors with a review link? */
export function isLinkPermission(permission: Permission): permission is LinkPermission {
  return (LINK_PERMISSIONS as readonly string[]).includes(permission);
}
