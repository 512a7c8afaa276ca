import { Global, Module } from '@nestjs/common';
import { APP_INTERCEPTOR } from '@nestjs/core';
import { AnswerInterceptor } from './answer.interceptor.js';
import { Clock } from './clock.js';
import { EtagInterceptor } from './etag.interceptor.js';
import { IdempotencyInterceptor } from './idempotency.interceptor.js';
import { Ids } from './ids.js';
import { Log } from './log.js';

/** Outermost first: version header, idempotent replay, the contract's schema. */
const interceptors = [EtagInterceptor, IdempotencyInterceptor, AnswerInterceptor];

@Global()
@Module({
  providers: [
    Clock,
    Ids,
    Log,
    ...interceptors.map((useClass) => ({ provide: APP_INTERCEPTOR, useClass })),
  ],
  exports: [Clock, Ids, Log],
})
export class CommonModule {}
