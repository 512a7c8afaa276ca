import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Session, SignIn } from '@furrowlight/shared/contract/session';
import { Injectable } from '@nestjs/common';
import { AuditService } from '../audit/audit.service.js';
import { DomainError } from '../common/domain-error.js';
import { Log } from '../common/log.js';
import { CooperativesService } from '../cooperatives/cooperatives.service.js';
import { Database } from '../database/database.js';
import { MembersService } from '../members/members.service.js';
import { Passwords } from '../members/passwords.js';
import { SessionsService, type LiveSession } from './sessions.service.js';
import { SignInThrottle } from './sign-in-throttle.js';

@Injectable()
export class AuthService {
  constructor(
    private readonly database: Database,
    private readonly members: MembersService,
    private readonly cooperatives: CooperativesService,
    private readonly passwords: Passwords,
    private readonly sessions: SessionsService,
    private readonly throttle: SignInThrottle,
    private readonly audit: AuditService,
    private readonly log: Log,
  ) {}

  /**
   * Sign a member in. Unknown address, wrong password, no password yet and disabled account get
   * the same answer after the same work.
   *
   * @throws DomainError sign-in-refused, too-many
   */
  async signIn(input: SignIn, address: string): Promise<LiveSession> {
    const email = input.email.trim().toLowerCase();
    await this.throttle.enter(email, address);
    const account = await this.members.credentials(email);
    const right = await this.passwords.matches(input.password, account?.passwordHash ?? null);
    if (!account || !right || !account.active) {
      this.log.security('sign-in-refused', {
        address,
        memberId: account?.principal.memberId ?? '',
      });
      throw new DomainError('sign-in-refused', 'E-mail address or password is not right.');
    }
    return this.database.write(async (manager) => {
      await this.throttle.clear(manager, email, address);
      await this.audit.record(manager, account.principal, 'signed in', {
        kind: 'member',
        id: account.principal.memberId,
        name: account.principal.name,
      });
      return this.sessions.begin(manager, account.principal);
    });
  }

  /** Who is signed in, as the client may know it. */
  async describe(principal: MemberPrincipal, expiresAt: string): Promise<Session> {
    const member = await this.members.get(principal, principal.memberId);
    const cooperative = await this.cooperatives.get(principal.cooperativeId);
    return {
      memberId: principal.memberId,
      name: principal.name,
      email: member.email,
      role: principal.role,
      cooperative,
      expiresAt,
    };
  }
}
