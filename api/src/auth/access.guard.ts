import { holds, type Principal } from '@furrowlight/shared/access/may';
import { isLinkPermission, type Permission } from '@furrowlight/shared/access/permissions';
import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import type { Response } from 'express';
import { DomainError } from '../common/domain-error.js';
import type { GuardedRequest } from '../common/request.js';
import { ACCESS, type AccessRule } from '../common/access.decorator.js';
import { LinkPrincipals } from './link-principals.js';
import { SessionCookie } from './session-cookie.js';
import { SessionsService } from './sessions.service.js';

/** Default deny: a handler that says nothing about access is reached by nobody. */
@Injectable()
export class AccessGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly sessions: SessionsService,
    private readonly cookie: SessionCookie,
    private readonly links: LinkPrincipals,
  ) {}

  async canActivate(context: ExecutionContext): Promise<boolean> {
    const rule = this.reflector.get<AccessRule | undefined>(ACCESS, context.getHandler());
    if (!rule) throw new Error(`${context.getHandler().name} names no permission.`);
    if (rule.public) return true;
    const request = context.switchToHttp().getRequest<GuardedRequest>();
    const response = context.switchToHttp().getResponse<Response>();
    request.principal = await this.identify(rule.permission, request, response);
    if (!holds(request.principal, rule.permission)) {
      throw new DomainError(
        'forbidden',
        'Your role does not allow this. Ask your cooperative’s admin.',
      );
    }
    return true;
  }

  private async identify(
    permission: Permission,
    request: GuardedRequest,
    response: Response,
  ): Promise<Principal> {
    if (isLinkPermission(permission)) {
      const visitor = await this.links.of(request);
      if (!visitor) throw new DomainError('expired', 'Open the link you were sent once more.');
      return visitor;
    }
    const session = await this.sessions.resolve(this.cookie.read(request));
    if (!session) throw new DomainError('not-signed-in', 'Your session has ended. Please sign in.');
    if (session.freshToken) this.cookie.set(response, session.freshToken, session.expiresAt);
    request.sessionExpiresAt = session.expiresAt;
    request.sessionId = session.id;
    return session.principal;
  }
}
