import {
  Injectable,
  type CallHandler,
  type ExecutionContext,
  type NestInterceptor,
} from '@nestjs/common';
import type { Response } from 'express';
import { tap, type Observable } from 'rxjs';

/** Names the version of a single row in the ETag header, for the If-Match of the next write. */
@Injectable()
export class EtagInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler<unknown>): Observable<unknown> {
    const response = context.switchToHttp().getResponse<Response>();
    return next.handle().pipe(
      tap((answer) => {
        if (!answer || typeof answer !== 'object' || !('version' in answer)) return;
        if (typeof answer.version === 'number') response.setHeader('ETag', `"${answer.version}"`);
      }),
    );
  }
}
