import { StandardSchemaValidationPipe } from '@nestjs/common';
import { invalid } from './domain-error.js';

/** Checks bodies, queries and parameters against the contract's schema named at the parameter. */
export const contractPipe = () =>
  new StandardSchemaValidationPipe({
    exceptionFactory: (issues) =>
      invalid(
        ...issues.slice(0, 50).map((issue) => ({
          path: (issue.path ?? [])
            .map((part) => String(typeof part === 'object' ? part.key : part))
            .join('.'),
          message: issue.message,
        })),
      ),
  });
