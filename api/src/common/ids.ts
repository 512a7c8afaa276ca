import { randomBytes } from 'node:crypto';
import { Injectable } from '@nestjs/common';

/** The only source of row ids and secrets; tests may put a seeded one in its place. */
@Injectable()
export class Ids {
  /** An opaque row id: 120 random bits, 20 characters. */
  next(): string {
    return randomBytes(15).toString('base64url');
  }

  /** A secret for links: 256 random bits. */
  secret(): string {
    return randomBytes(32).toString('base64url');
  }
}
