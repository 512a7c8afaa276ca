import { Injectable, type LoggerService } from '@nestjs/common';
import { pino, type Logger } from 'pino';
import { AppConfig } from '../config/app-config.js';

/** Structured lines on standard output; secrets never reach them. */
@Injectable()
export class Log implements LoggerService {
  readonly pino: Logger;

  constructor(config: AppConfig) {
    this.pino = pino({
      level: config.logLevel,
      redact: ['req.headers.cookie', 'req.headers.authorization', 'res.headers["set-cookie"]'],
    });
  }

  log(message: unknown, context?: string): void {
    this.pino.info({ context }, String(message));
  }

  error(message: unknown, stack?: string, context?: string): void {
    this.pino.error({ context, stack }, String(message));
  }

  warn(message: unknown, context?: string): void {
    this.pino.warn({ context }, String(message));
  }

  debug(message: unknown, context?: string): void {
    this.pino.debug({ context }, String(message));
  }

  verbose(message: unknown, context?: string): void {
    this.pino.trace({ context }, String(message));
  }

  /** Something that ought not to happen, with the request it happened in. */
  failure(error: unknown, requestId: string): void {
    this.pino.error({ err: error, requestId }, 'request failed');
  }

  /** Something worth a line for whoever watches over accounts. */
  security(event: string, details: Record<string, string>): void {
    this.pino.warn({ event, ...details }, 'security');
  }
}
