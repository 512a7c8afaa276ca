import type { MemberPrincipal, Principal } from '@furrowlight/shared/access/may';
import { createParamDecorator, type ExecutionContext } from '@nestjs/common';
import { ApiHeader } from '@nestjs/swagger';
import { DomainError } from './domain-error.js';
import type { GuardedRequest } from './request.js';

const requestOf = (context: ExecutionContext) =>
  context.switchToHttp().getRequest<GuardedRequest>();

/** Whoever the access guard let in: member or visitor with a review link. */
export const CurrentPrincipal = createParamDecorator((_: unknown, context): Principal => {
  const { principal } = requestOf(context);
  if (!principal) throw new DomainError('not-signed-in', 'Please sign in.');
  return principal;
});

/** The signed-in member; link visitors are refused. */
export const CurrentMember = createParamDecorator((_: unknown, context): MemberPrincipal => {
  const { principal } = requestOf(context);
  if (principal?.kind !== 'member') throw new DomainError('not-signed-in', 'Please sign in.');
  return principal;
});

const documentIfMatch: ParameterDecorator = (target, key) => {
  if (key === undefined) return;
  const handler = Object.getOwnPropertyDescriptor(target, key);
  if (!handler) return;
  const description = 'Version the change was made from, as in the ETag of its answer: "3"';
  ApiHeader({ name: 'If-Match', required: true, description })(target, key, handler);
};

/**
 * The row version a write was made from, out of `If-Match: "3"`.
 *
 * @throws DomainError version-missing without the header, stale-version where it is no version
 */
export const IfMatch = createParamDecorator(
  (_: unknown, context): number => {
    const header = requestOf(context).headers['if-match'];
    if (!header) {
      throw new DomainError(
        'version-missing',
        'Say which version you change: send its number in the If-Match header.',
      );
    }
    const match = /^(?:W\/)?"(\d{1,9})"$/.exec(header.trim());
    if (!match) {
      throw new DomainError('stale-version', 'The If-Match header names no version of this row.');
    }
    return Number(match[1]);
  },
  [documentIfMatch],
);
