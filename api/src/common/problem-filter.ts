import { InputError } from '@furrowlight/shared/errors';
import type { Problem } from '@furrowlight/shared/contract/common';
import { Catch, HttpException, type ArgumentsHost, type ExceptionFilter } from '@nestjs/common';
import type { Request, Response } from 'express';
import { DomainError, PROBLEMS, type ProblemCode } from './domain-error.js';
import { Log } from './log.js';

/** Errors of the body parser carry a type; Express's own carry a status. */
interface HttpLikeError {
  type?: string;
  status?: number;
}

const byStatus: Record<number, ProblemCode> = {
  400: 'malformed-request',
  401: 'not-signed-in',
  403: 'forbidden',
  404: 'not-found',
  405: 'method-not-allowed',
  413: 'too-large',
  415: 'not-json',
  429: 'too-many',
};

const sentences: Partial<Record<ProblemCode, string>> = {
  'malformed-request': 'The request is not readable JSON. Reload the page and try again.',
  'not-found': 'This address does not exist.',
  'too-large': 'The request is larger than this address accepts.',
  'not-json': 'Send the request as UTF-8 JSON.',
};

function sqliteCode(error: unknown): string | null {
  let current: unknown = error;
  for (let depth = 0; depth < 3 && current instanceof Error; depth += 1) {
    const { code, driverError } = current as Error & { code?: unknown; driverError?: unknown };
    if (typeof code === 'string' && code.startsWith('SQLITE_')) return code;
    current = driverError ?? current.cause;
  }
  return null;
}

function fromDatabase(code: string): DomainError | null {
  if (code.startsWith('SQLITE_CONSTRAINT')) return null;
  if (code === 'SQLITE_FULL') {
    return new DomainError('storage-full', 'Nothing was saved: the disk is full. Tell the admin.');
  }
  return new DomainError(
    'database-unavailable',
    'Nothing was saved: the database does not answer. Try again in a moment.',
    [],
    5,
  );
}

/** Any thrown thing as a coded refusal; what we did not foresee becomes `unexpected`. */
export function toDomainError(thrown: unknown): DomainError {
  if (thrown instanceof DomainError) return thrown;
  if (thrown instanceof InputError) {
    return new DomainError('invalid-input', thrown.message, [
      { path: thrown.field, message: thrown.message },
    ]);
  }
  const database = sqliteCode(thrown);
  const refusal = database ? fromDatabase(database) : null;
  if (refusal) return refusal;
  const status =
    thrown instanceof HttpException ? thrown.getStatus() : (thrown as HttpLikeError | null)?.status;
  const code = status === undefined ? undefined : byStatus[status];
  if (code) return new DomainError(code, sentences[code] ?? PROBLEMS[code].title);
  return new DomainError(
    'unexpected',
    'This is our fault, not yours. Nothing was half saved. Try again, and give the admin the request number if it stays.',
  );
}

/** The body of RFC 9457 for a refusal. */
export function toProblem(error: DomainError, requestId: string): Problem {
  const { status, title } = PROBLEMS[error.code];
  return {
    type: `urn:furrowlight:problem:${error.code}`,
    title,
    status,
    code: error.code,
    detail: error.message,
    requestId,
    ...(error.errors.length > 0 ? { errors: [...error.errors] } : {}),
  };
}

/** The one place where errors become answers: problem details with a request id. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  constructor(private readonly log: Log) {}

  catch(thrown: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    const request = http.getRequest<Request>();
    const response = http.getResponse<Response>();
    const error = toDomainError(thrown);
    const problem = toProblem(error, String(request.id ?? 'none'));
    if (problem.status >= 500) this.log.failure(thrown, problem.requestId);
    if (response.headersSent) {
      response.end();
      return;
    }
    if (error.retryAfterSeconds !== null) {
      response.setHeader('Retry-After', String(error.retryAfterSeconds));
    }
    response.removeHeader('ETag');
    response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
  }
}
