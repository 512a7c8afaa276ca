import { createHash } from 'node:crypto';
import {
  Injectable,
  type CallHandler,
  type ExecutionContext,
  type NestInterceptor,
} from '@nestjs/common';
import { from, lastValueFrom, type Observable } from 'rxjs';
import { LessThan, type EntityManager } from 'typeorm';
import { Database } from '../database/database.js';
import { Clock } from './clock.js';
import { DomainError } from './domain-error.js';
import { openAnswer, sealAnswer } from './answer-seal.js';
import { IdempotencyKeyEntity } from './idempotency-key.entity.js';
import type { GuardedRequest } from './request.js';

const LIFE_MS = 24 * 3600_000;

/**
 * Makes a repeated POST with the same Idempotency-Key harmless: it gets the first one's answer.
 * Key and effect are written in one transaction, so that a crash leaves both or neither. The whole
 * handler runs inside that transaction: it must not wait for work that writes on its own.
 */
@Injectable()
export class IdempotencyInterceptor implements NestInterceptor {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
  ) {}

  intercept(context: ExecutionContext, next: CallHandler<unknown>): Observable<unknown> {
    const request = context.switchToHttp().getRequest<GuardedRequest>();
    const key = request.headers['idempotency-key'];
    if (request.method !== 'POST' || key === undefined) return next.handle();
    if (request.principal?.kind !== 'member') return next.handle();
    if (typeof key !== 'string' || !/^[\x21-\x7e]{8,200}$/.test(key)) {
      throw new DomainError(
        'malformed-request',
        'An Idempotency-Key has 8 to 200 visible characters.',
      );
    }
    const { memberId } = request.principal;
    const keyHash = sha256(key);
    const requestHash = sha256(`${request.originalUrl}\n${JSON.stringify(request.body ?? null)}`);
    return from(
      this.database.write(async (manager) => {
        const earlier = await this.earlier(manager, memberId, keyHash);
        if (earlier) return replay(earlier, requestHash, key);
        const answer = await lastValueFrom(next.handle(), { defaultValue: null });
        await manager.insert(IdempotencyKeyEntity, {
          memberId,
          key: keyHash,
          requestHash,
          answer: sealAnswer(JSON.stringify(answer ?? null), key),
          createdAt: this.clock.instant(),
        });
        return answer;
      }),
    );
  }

  private async earlier(manager: EntityManager, memberId: string, key: string) {
    const limit = new Date(this.clock.now().getTime() - LIFE_MS).toISOString();
    await manager.delete(IdempotencyKeyEntity, { createdAt: LessThan(limit) });
    return manager.findOneBy(IdempotencyKeyEntity, { memberId, key });
  }
}

const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');

function replay(earlier: IdempotencyKeyEntity, requestHash: string, key: string): unknown {
  if (earlier.requestHash !== requestHash) {
    throw new DomainError(
      'key-reused',
      'This Idempotency-Key already stands for another request. Use a new one.',
    );
  }
  return JSON.parse(openAnswer(earlier.answer, key)) as unknown;
}
