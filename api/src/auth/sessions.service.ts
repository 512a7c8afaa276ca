import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Injectable } from '@nestjs/common';
import { IsNull, type EntityManager } from 'typeorm';
import { Clock } from '../common/clock.js';
import { Ids } from '../common/ids.js';
import { Log } from '../common/log.js';
import { Database } from '../database/database.js';
import { MembersService } from '../members/members.service.js';
import { SessionEntity } from './session.entity.js';
import { SessionToken } from './session-token.js';

const HOUR_MS = 3600_000;
/** A token is replaced once it is this old. */
const ROTATE_AFTER_MS = 15 * 60_000;
/** Requests under way at a rotation may still carry the token before. */
const GRACE_MS = 60_000;
/** A session ends when it is not used for this long, and after `LONGEST_MS` in any case. */
const IDLE_MS = 12 * HOUR_MS;
const LONGEST_MS = 14 * 24 * HOUR_MS;

export interface LiveSession {
  id: string;
  principal: MemberPrincipal;
  expiresAt: string;
  /** Set when the client must take a new token. */
  freshToken: string | null;
}

/**
 * Members' sessions. The row decides, the token only points to it: a revoked session, a disabled
 * member or a changed role counts from the next request on.
 */
@Injectable()
export class SessionsService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly tokens: SessionToken,
    private readonly members: MembersService,
    private readonly log: Log,
  ) {}

  /** Begin a session; its token goes into the cookie. */
  async begin(manager: EntityManager, principal: MemberPrincipal): Promise<LiveSession> {
    const now = this.clock.now();
    const session = manager.create(SessionEntity, {
      id: this.ids.next(),
      memberId: principal.memberId,
      generation: 1,
      confirmed: false,
      createdAt: now.toISOString(),
      rotatedAt: now.toISOString(),
      expiresAt: new Date(now.getTime() + IDLE_MS).toISOString(),
      revokedAt: null,
    });
    await manager.insert(SessionEntity, session);
    return this.live(session, principal, await this.tokenOf(session));
  }

  /** The session behind a token; null unless token, session and member are all in good order. */
  async resolve(token: string | null): Promise<LiveSession | null> {
    if (!token) return null;
    const now = this.clock.now();
    const claims = await this.tokens.read(token, now);
    if (!claims) return null;
    const session = await this.database.read.findOneBy(SessionEntity, { id: claims.sessionId });
    if (!session || session.revokedAt || session.memberId !== claims.memberId) return null;
    if (session.expiresAt <= now.toISOString()) return null;
    const principal = await this.members.activePrincipal(session.memberId);
    if (!principal) return null;
    return this.admit(session, claims.generation, principal, now);
  }

  async revoke(sessionId: string): Promise<void> {
    await this.database.write((manager) =>
      manager.update(
        SessionEntity,
        { id: sessionId, revokedAt: IsNull() },
        { revokedAt: this.clock.instant() },
      ),
    );
  }

  /**
   * Rotation. The current token is renewed when old. The one before is good during the grace, and
   * as long as the current one was never seen (its answer may have been lost on the way); after
   * that it is a copy in someone else's hands, and the session ends.
   */
  private async admit(
    session: SessionEntity,
    generation: number,
    principal: MemberPrincipal,
    now: Date,
  ): Promise<LiveSession | null> {
    const age = now.getTime() - Date.parse(session.rotatedAt);
    if (generation === session.generation) {
      if (age >= ROTATE_AFTER_MS) return this.rotate(session, principal, now);
      if (!session.confirmed) await this.confirm(session);
      return this.live(session, principal, null);
    }
    if (generation === session.generation - 1) {
      if (!session.confirmed) return this.live(session, principal, await this.tokenOf(session));
      if (age < GRACE_MS) return this.live(session, principal, null);
    }
    this.log.security('session-token-reused', { memberId: session.memberId, session: session.id });
    await this.revoke(session.id);
    return null;
  }

  private async confirm(session: SessionEntity): Promise<void> {
    const { id, generation } = session;
    await this.database.write((manager) =>
      manager.update(SessionEntity, { id, generation }, { confirmed: true }),
    );
  }

  private async rotate(
    session: SessionEntity,
    principal: MemberPrincipal,
    now: Date,
  ): Promise<LiveSession> {
    const end = Math.min(now.getTime() + IDLE_MS, Date.parse(session.createdAt) + LONGEST_MS);
    const next = {
      generation: session.generation + 1,
      confirmed: false,
      rotatedAt: now.toISOString(),
      expiresAt: new Date(end).toISOString(),
    };
    const { id, generation } = session;
    const { affected } = await this.database.write((manager) =>
      manager.update(SessionEntity, { id, generation }, next),
    );
    // A parallel request was first: it hands out the new token.
    if (!affected) return this.live(session, principal, null);
    const rotated = Object.assign(session, next);
    return this.live(rotated, principal, await this.tokenOf(rotated));
  }

  private tokenOf(session: SessionEntity): Promise<string> {
    return this.tokens.sign(
      {
        sessionId: session.id,
        memberId: session.memberId,
        generation: session.generation,
      },
      new Date(session.expiresAt),
    );
  }

  private live(
    session: SessionEntity,
    principal: MemberPrincipal,
    freshToken: string | null,
  ): LiveSession {
    return { id: session.id, principal, expiresAt: session.expiresAt, freshToken };
  }
}
