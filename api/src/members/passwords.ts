import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import bcrypt from 'bcryptjs';
import { AppConfig } from '../config/app-config.js';

/**
 * bcrypt reads 72 bytes and stops at a zero byte: two long passwords with one beginning would be
 * the same. The SHA-256 of the password, written in base64 (44 bytes, no zero), goes in instead.
 */
function condensed(password: string): string {
  return createHash('sha256').update(password.normalize('NFKC'), 'utf8').digest('base64');
}

@Injectable()
export class Passwords {
  private readonly stranger: Promise<string>;

  constructor(private readonly config: AppConfig) {
    this.stranger = this.hash('nobody has this password');
  }

  hash(password: string): Promise<string> {
    return bcrypt.hash(condensed(password), this.config.passwordCost);
  }

  /** Compare in the same time whether or not there is such an account. */
  async matches(password: string, hash: string | null): Promise<boolean> {
    const same = await bcrypt.compare(condensed(password), hash ?? (await this.stranger));
    return same && hash !== null;
  }
}
