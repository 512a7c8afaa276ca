import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Session, SignIn } from '@furrowlight/shared/contract/session';
import { Body, Controller, Delete, Get, HttpCode, Post, Req, Res } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Request, Response } from 'express';
import { CurrentMember } from '../common/params.js';
import type { GuardedRequest } from '../common/request.js';
import { Responds } from '../common/responds.js';
import { Access, Public } from '../common/access.decorator.js';
import { AuthService } from './auth.service.js';
import { SessionCookie } from './session-cookie.js';
import { SessionsService } from './sessions.service.js';

@ApiTags('session')
@Controller('session')
export class SessionController {
  constructor(
    private readonly auth: AuthService,
    private readonly sessions: SessionsService,
    private readonly cookie: SessionCookie,
  ) {}

  @Post()
  @HttpCode(200)
  @Public()
  @ApiOperation({ summary: 'Sign in' })
  @Responds(Session)
  async signIn(
    @Body({ schema: SignIn }) input: SignIn,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Session> {
    const earlier = await this.sessions.resolve(this.cookie.read(request));
    const session = await this.auth.signIn(input, request.ip ?? 'unknown');
    if (earlier) await this.sessions.revoke(earlier.id);
    if (session.freshToken) this.cookie.set(response, session.freshToken, session.expiresAt);
    return this.auth.describe(session.principal, session.expiresAt);
  }

  @Get()
  @Access('session:own')
  @ApiOperation({ summary: 'Who is signed in' })
  @Responds(Session)
  read(@CurrentMember() member: MemberPrincipal, @Req() request: GuardedRequest): Promise<Session> {
    return this.auth.describe(member, request.sessionExpiresAt ?? '');
  }

  @Delete()
  @HttpCode(204)
  @Public()
  @ApiOperation({ summary: 'Sign out' })
  @ApiNoContentResponse({ description: 'Nobody is signed in any more' })
  async signOut(
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<void> {
    const session = await this.sessions.resolve(this.cookie.read(request));
    if (session) await this.sessions.revoke(session.id);
    this.cookie.clear(response);
  }
}
