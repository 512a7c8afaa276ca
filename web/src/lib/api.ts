import { Problem } from '@furrowlight/shared/contract/common';
import type { z } from 'zod';

/** A refusal or failure of the API, with a sentence for people and per-field messages. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    readonly detail: string,
    readonly requestId: string | null,
    readonly errors: readonly { path: string; message: string }[] = [],
  ) {
    super(detail);
  }

  /** Messages by dotted field path, as forms take them. */
  get fieldErrors(): Record<string, string> {
    return Object.fromEntries(this.errors.map(({ path, message }) => [path, message]));
  }
}

export interface CallOptions {
  method?: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';
  /** Sent as JSON; a Blob or FormData goes as it is. */
  body?: unknown;
  /** Row version the write was made from; sent as If-Match. */
  version?: number;
  /** Same key, same effect: makes a repeated POST harmless. */
  idempotencyKey?: string;
  headers?: Record<string, string>;
  signal?: AbortSignal;
}

type Listener = () => void;
const signedOutListeners = new Set<Listener>();

/** Called whenever the server answers that nobody is signed in. Returns the unsubscribe. */
export function onSignedOut(listener: Listener): () => void {
  signedOutListeners.add(listener);
  return () => signedOutListeners.delete(listener);
}

function requestInit(options: CallOptions): RequestInit {
  const headers: Record<string, string> = { Accept: 'application/json', ...options.headers };
  const raw = options.body instanceof Blob || options.body instanceof FormData;
  if (options.body !== undefined && !raw) headers['Content-Type'] = 'application/json';
  if (options.version !== undefined) headers['If-Match'] = `"${options.version}"`;
  if (options.idempotencyKey) headers['Idempotency-Key'] = options.idempotencyKey;
  return {
    method: options.method ?? 'GET',
    credentials: 'same-origin',
    headers,
    body: raw
      ? (options.body as Blob | FormData)
      : options.body === undefined
        ? undefined
        : JSON.stringify(options.body),
    signal: options.signal,
  };
}

async function toProblem(response: Response): Promise<ApiProblem> {
  const requestId = response.headers.get('x-request-id');
  const parsed = Problem.safeParse(await response.json().catch(() => null));
  if (parsed.success) {
    const p = parsed.data;
    return new ApiProblem(response.status, p.code, p.title, p.detail, p.requestId, p.errors);
  }
  return new ApiProblem(
    response.status,
    'unexpected-answer',
    'The server did not answer as expected',
    `The server answered with status ${response.status} and no explanation. Try again in a moment.`,
    requestId,
  );
}

/**
 * Call the API and return the raw response once it is a success.
 *
 * @throws ApiProblem for every refusal, and with code `offline` when no answer came at all
 */
export async function call(path: string, options: CallOptions = {}): Promise<Response> {
  let response: Response;
  try {
    response = await fetch(new URL(path, window.location.origin), requestInit(options));
  } catch (cause) {
    if (cause instanceof DOMException && cause.name === 'AbortError') throw cause;
    throw new ApiProblem(
      0,
      'offline',
      'No connection',
      'The server cannot be reached. Your input is still here; try again when you are online.',
      null,
    );
  }
  if (response.ok) return response;
  const problem = await toProblem(response);
  if (problem.status === 401) signedOutListeners.forEach((listener) => listener());
  throw problem;
}

/**
 * Call the API and read its JSON answer through the contract's schema.
 *
 * @throws ApiProblem as `call`, and when the answer does not fit the contract
 */
export async function request<T>(
  schema: z.ZodType<T>,
  path: string,
  options: CallOptions = {},
): Promise<T> {
  const response = await call(path, options);
  const parsed = schema.safeParse(await response.json().catch(() => null));
  if (parsed.success) return parsed.data;
  throw new ApiProblem(
    response.status,
    'contract-mismatch',
    'The answer could not be read',
    'The page and the server speak different versions. Reload the page.',
    response.headers.get('x-request-id'),
    parsed.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message })),
  );
}

/** A fresh key for one intended effect; keep it across retries of the same submit. */
export function newIdempotencyKey(): string {
  return crypto.randomUUID();
}
