import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Member } from '@furrowlight/shared/contract/members';
import type { Role } from '@furrowlight/shared/contract/session';
import { Injectable } from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { DomainError, notFound } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { MemberEntity } from './member.entity.js';
import { Passwords } from './passwords.js';

export interface NewMember {
  cooperativeId: string;
  name: string;
  email: string;
  role: Role;
  /** Null while the person has not chosen one; nobody can sign in so far. */
  password: string | null;
}

/** What sign-in needs to know of an account. */
export interface Credentials {
  principal: MemberPrincipal;
  active: boolean;
  passwordHash: string | null;
}

const toContract = (row: MemberEntity): Member => ({
  id: row.id,
  name: row.name,
  email: row.email,
  role: row.role,
  active: row.active,
});

const toPrincipal = (row: MemberEntity): MemberPrincipal => ({
  kind: 'member',
  memberId: row.id,
  name: row.name,
  role: row.role,
  cooperativeId: row.cooperativeId,
});

@Injectable()
export class MembersService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly passwords: Passwords,
  ) {}

  /** Everyone of the principal's cooperative, by name. */
  async list(principal: MemberPrincipal): Promise<Member[]> {
    const rows = await this.database.read.find(MemberEntity, {
      where: { cooperativeId: principal.cooperativeId },
      order: { name: 'ASC' },
    });
    return rows.map(toContract);
  }

  /** @throws DomainError not-found for everyone outside the principal's cooperative */
  async get(principal: MemberPrincipal, id: string): Promise<Member> {
    const { cooperativeId } = principal;
    const row = await this.database.read.findOneBy(MemberEntity, { id, cooperativeId });
    if (!row) throw notFound('member');
    return toContract(row);
  }

  /** Names by id, of one cooperative. */
  async names(cooperativeId: string): Promise<Map<string, string>> {
    const rows = await this.database.read.find(MemberEntity, {
      select: { id: true, name: true },
      where: { cooperativeId },
    });
    return new Map(rows.map((row) => [row.id, row.name]));
  }

  /** The member as a principal; null when there is none or the account is disabled. */
  async activePrincipal(id: string): Promise<MemberPrincipal | null> {
    const row = await this.database.read.findOneBy(MemberEntity, { id, active: true });
    return row ? toPrincipal(row) : null;
  }

  /** For sign-in only. */
  async credentials(email: string): Promise<Credentials | null> {
    const row = await this.database.read.findOneBy(MemberEntity, { email });
    if (!row) return null;
    return { principal: toPrincipal(row), active: row.active, passwordHash: row.passwordHash };
  }

  /**
   * Add a member; for the seed, the first run and invitations.
   *
   * @throws DomainError conflict when the address has an account already
   */
  async create(input: NewMember): Promise<Member> {
    const email = input.email.trim().toLowerCase();
    const passwordHash = input.password === null ? null : await this.passwords.hash(input.password);
    return this.database.write(async (manager) => {
      if (await manager.existsBy(MemberEntity, { email })) {
        throw new DomainError('conflict', `${email} already has an account.`);
      }
      const now = this.clock.instant();
      const row = manager.create(MemberEntity, {
        id: this.ids.next(),
        cooperativeId: input.cooperativeId,
        version: 1,
        name: input.name.trim(),
        email,
        role: input.role,
        active: true,
        passwordHash,
        createdAt: now,
        updatedAt: now,
      });
      await manager.insert(MemberEntity, row);
      return toContract(row);
    });
  }
}
