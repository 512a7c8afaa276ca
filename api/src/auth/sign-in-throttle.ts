import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { LessThan, MoreThanOrEqual, type EntityManager } from 'typeorm';
import { Clock } from '../common/clock.js';
import { DomainError } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { SignInAttemptEntity } from './sign-in-attempt.entity.js';

const WINDOW_MS = 15 * 60_000;
/** Failures of one account from one address. */
const PER_ACCOUNT = 10;
/** Failures from one address over all accounts: a farm office may share one. */
const PER_ADDRESS = 60;

/**
 * Slows guessing down. Counted per account and address together, so that a stranger elsewhere
 * cannot lock a member out; and counted before the password is looked at, so that many guesses at
 * once do not slip through.
 */
@Injectable()
export class SignInThrottle {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
  ) {}

  /**
   * Note an attempt before it is judged.
   *
   * @throws DomainError too-many
   */
  async enter(email: string, address: string): Promise<void> {
    const account = accountKey(email);
    await this.database.write(async (manager) => {
      const now = this.clock.now();
      const since = new Date(now.getTime() - WINDOW_MS).toISOString();
      await manager.delete(SignInAttemptEntity, { at: LessThan(since) });
      await this.refuseTooMany(manager, account, address, since);
      const at = now.toISOString();
      await manager.insert(SignInAttemptEntity, { id: this.ids.next(), account, address, at });
    });
  }

  /** The attempt was right: forget this account's failures from this address. */
  async clear(manager: EntityManager, email: string, address: string): Promise<void> {
    await manager.delete(SignInAttemptEntity, { account: accountKey(email), address });
  }

  private async refuseTooMany(
    manager: EntityManager,
    account: string,
    address: string,
    since: string,
  ): Promise<void> {
    const fresh = { address, at: MoreThanOrEqual(since) };
    const ofAccount = await manager.countBy(SignInAttemptEntity, { ...fresh, account });
    const ofAddress = await manager.countBy(SignInAttemptEntity, fresh);
    if (ofAccount < PER_ACCOUNT && ofAddress < PER_ADDRESS) return;
    throw new DomainError(
      'too-many',
      'Too many attempts from this place. Wait a quarter of an hour, then try again.',
      [],
      WINDOW_MS / 1000,
    );
  }
}

function accountKey(email: string): string {
  return createHash('sha256').update(email).digest('hex');
}
