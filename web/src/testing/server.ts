import { setupServer } from 'msw/node';

export const server = setupServer();

/** Requests that a test did not declare; setup fails the test that made them. */
export const undeclared = {
  seen: [] as string[],
  record(request: Request): void {
    this.seen.push(`${request.method} ${request.url}`);
    throw new Error(`undeclared request ${request.method} ${request.url}`);
  },
  take(): string[] {
    const seen = this.seen;
    this.seen = [];
    return seen;
  },
};
