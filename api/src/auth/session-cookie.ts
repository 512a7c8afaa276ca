import { Injectable } from '@nestjs/common';
import type { CookieOptions, Request, Response } from 'express';
import { AppConfig } from '../config/app-config.js';

/** The cookie that carries a member's token; scripts cannot read it, other sites cannot send it. */
@Injectable()
export class SessionCookie {
  private readonly name: string;
  private readonly options: CookieOptions;

  constructor(config: AppConfig) {
    this.name = config.secureCookies ? '__Host-furrowlight' : 'furrowlight';
    this.options = {
      httpOnly: true,
      secure: config.secureCookies,
      sameSite: 'lax',
      path: '/',
    };
  }

  read(request: Request): string | null {
    const cookies = request.cookies as Record<string, unknown> | undefined;
    const token = cookies?.[this.name];
    return typeof token === 'string' && token.length > 0 ? token : null;
  }

  set(response: Response, token: string, expiresAt: string): void {
    response.cookie(this.name, token, { ...this.options, expires: new Date(expiresAt) });
  }

  clear(response: Response): void {
    response.clearCookie(this.name, this.options);
  }
}
