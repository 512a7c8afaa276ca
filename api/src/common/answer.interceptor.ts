import {
  Injectable,
  type CallHandler,
  type ExecutionContext,
  type NestInterceptor,
} from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { map, type Observable } from 'rxjs';
import type { z } from 'zod';
import { ANSWER_SCHEMA } from './responds.js';

/** Puts an answer through the contract's schema, so that no column leaves by accident. */
@Injectable()
export class AnswerInterceptor implements NestInterceptor {
  constructor(private readonly reflector: Reflector) {}

  intercept(context: ExecutionContext, next: CallHandler<unknown>): Observable<unknown> {
    const schema = this.reflector.get<z.ZodType | undefined>(ANSWER_SCHEMA, context.getHandler());
    return next.handle().pipe(map((answer) => (schema ? schema.parse(answer) : answer)));
  }
}
