import { createHash } from 'node:crypto';
import type { MemberPrincipal, Principal } from '@furrowlight/shared/access/may';
import { Injectable } from '@nestjs/common';
import { LessThan, type EntityManager } from 'typeorm';
import { Clock } from '../common/clock.js';
import { Database } from '../database/database.js';
import { AuditEntryEntity } from './audit-entry.entity.js';

/** What was acted upon; the name is kept as it was then. */
export interface AuditSubject {
  kind: string;
  id: string;
  name: string;
}

/** Value before the first entry of a cooperative. */
const GENESIS = '0'.repeat(64);

type Hashed = Omit<AuditEntryEntity, 'seq' | 'hash'>;

/** SHA-256 over the entry and the hash before it: a changed or missing entry breaks the chain. */
function chainHash(entry: Hashed): string {
  const text = JSON.stringify([
    entry.previousHash,
    entry.cooperativeId,
    entry.at,
    entry.actorKind,
    entry.actorId,
    entry.actorName,
    entry.action,
    entry.subjectKind,
    entry.subjectId,
    entry.subjectName,
  ]);
  return createHash('sha256').update(text).digest('hex');
}

@Injectable()
export class AuditService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
  ) {}

  /** Write an entry in the transaction of the deed itself. */
  async record(
    manager: EntityManager,
    principal: Principal,
    action: string,
    subject: AuditSubject,
  ): Promise<void> {
    const { cooperativeId } = principal;
    const last = await manager.findOne(AuditEntryEntity, {
      where: { cooperativeId },
      order: { seq: 'DESC' },
    });
    const member = principal.kind === 'member';
    const entry: Hashed = {
      cooperativeId,
      at: this.clock.instant(),
      actorKind: principal.kind,
      actorId: member ? principal.memberId : principal.reviewId,
      actorName: member ? principal.name : 'Visitor with a review link',
      action,
      subjectKind: subject.kind,
      subjectId: subject.id,
      subjectName: subject.name,
      previousHash: last?.hash ?? GENESIS,
    };
    await manager.insert(AuditEntryEntity, { ...entry, hash: chainHash(entry) });
  }

  /** Newest first; `before` is the sequence number the page before ended with. */
  async page(principal: MemberPrincipal, before: number | null, size: number) {
    const rows = await this.database.read.find(AuditEntryEntity, {
      where: {
        cooperativeId: principal.cooperativeId,
        ...(before === null ? {} : { seq: LessThan(before) }),
      },
      order: { seq: 'DESC' },
      take: size + 1,
    });
    const items = rows.slice(0, size).map((row) => ({
      seq: row.seq,
      at: row.at,
      actorName: row.actorName,
      action: row.action,
      subjectKind: row.subjectKind,
      subjectId: row.subjectId,
      subjectName: row.subjectName,
      hash: row.hash,
    }));
    return { items, next: rows.length > size ? items[size - 1].seq : null };
  }

  /** Sequence number of the first entry that does not fit the chain; null when all fit. */
  async firstBroken(cooperativeId: string): Promise<number | null> {
    const rows = await this.database.read.find(AuditEntryEntity, {
      where: { cooperativeId },
      order: { seq: 'ASC' },
    });
    let previous = GENESIS;
    for (const row of rows) {
      if (row.previousHash !== previous || chainHash(row) !== row.hash) return row.seq;
      previous = row.hash;
    }
    return null;
  }
}
