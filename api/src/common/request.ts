import type { Principal } from '@furrowlight/shared/access/may';
import type { Request } from 'express';

/** A request once the access guard has looked at it. */
export interface GuardedRequest extends Request {
  principal?: Principal;
  /** When the session of a member ends unless it is used again. */
  sessionExpiresAt?: string;
  sessionId?: string;
}
