/** A message for one field of the request; `path` is dotted. */
export interface FieldMessage {
  path: string;
  message: string;
}

/** Every way a request can be refused, with its HTTP status and title. */
export const PROBLEMS = {
  'invalid-input': { status: 400, title: 'Something in the input needs attention' },
  'malformed-request': { status: 400, title: 'The request could not be read' },
  'not-signed-in': { status: 401, title: 'Please sign in' },
  'sign-in-refused': { status: 401, title: 'Sign-in did not work' },
  forbidden: { status: 403, title: 'Your role does not allow this' },
  'cross-site': { status: 403, title: 'The request came from another site' },
  'not-found': { status: 404, title: 'There is nothing here' },
  'method-not-allowed': { status: 405, title: 'This cannot be done here' },
  conflict: { status: 409, title: 'This clashes with what is already there' },
  'key-reused': { status: 409, title: 'This key was used for another request' },
  expired: { status: 410, title: 'This has expired' },
  'stale-version': { status: 412, title: 'Someone else changed this meanwhile' },
  'too-large': { status: 413, title: 'The request is too large' },
  'not-json': { status: 415, title: 'The request must be JSON' },
  'version-missing': { status: 428, title: 'The version is missing' },
  'too-many': { status: 429, title: 'Too many attempts' },
  unexpected: { status: 500, title: 'Something went wrong here' },
  'database-unavailable': { status: 503, title: 'The data cannot be reached just now' },
  'not-ready': { status: 503, title: 'The server is not ready' },
  'storage-full': { status: 507, title: 'The server has no room left' },
} as const;

export type ProblemCode = keyof typeof PROBLEMS;

/** A refusal with a code; `message` is a sentence for people. */
export class DomainError extends Error {
  override readonly name = 'DomainError';

  constructor(
    readonly code: ProblemCode,
    message: string,
    readonly errors: readonly FieldMessage[] = [],
    /** Seconds after which trying again makes sense. */
    readonly retryAfterSeconds: number | null = null,
  ) {
    super(message);
  }
}

/** One answer for what is missing and what belongs to someone else. */
export const notFound = (what: string) =>
  new DomainError('not-found', `This ${what} does not exist, or it is not yours to see.`);

/** Input that fails a check; the message goes to the field concerned. */
export const invalid = (...errors: FieldMessage[]) =>
  new DomainError('invalid-input', errors.map((error) => error.message).join(' '), errors);

/**
 * Refuse a write made from another version than the stored one.
 *
 * @throws DomainError stale-version
 */
export function requireVersion(stored: number, given: number, what: string): void {
  if (stored !== given) {
    throw new DomainError(
      'stale-version',
      `This ${what} was changed since you opened it. Compare both versions before saving.`,
    );
  }
}
