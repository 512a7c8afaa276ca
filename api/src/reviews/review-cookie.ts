import { Injectable } from '@nestjs/common';
import type { CookieOptions, Request, Response } from 'express';
import { AppConfig } from '../config/app-config.js';

/** The visitor's cookie: apart from members' sessions, sent to our own pages only. */
@Injectable()
export class ReviewCookie {
  private readonly name: string;
  private readonly options: CookieOptions;

  constructor(config: AppConfig) {
    this.name = config.secureCookies ? '__Host-furrowlight-review' : 'furrowlight-review';
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
}
