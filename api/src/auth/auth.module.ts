import { Module } from '@nestjs/common';
import { APP_GUARD, DiscoveryModule } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { AuditModule } from '../audit/audit.module.js';
import { AppConfig } from '../config/app-config.js';
import { CooperativesModule } from '../cooperatives/cooperatives.module.js';
import { MembersModule } from '../members/members.module.js';
import { AccessCheck } from './access-check.js';
import { AccessGuard } from './access.guard.js';
import { AuthService } from './auth.service.js';
import { LinkPrincipals } from './link-principals.js';
import { SessionController } from './session.controller.js';
import { SessionCookie } from './session-cookie.js';
import { SessionToken } from './session-token.js';
import { SessionsService } from './sessions.service.js';
import { SignInThrottle } from './sign-in-throttle.js';

@Module({
  imports: [
    AuditModule,
    DiscoveryModule,
    CooperativesModule,
    MembersModule,
    JwtModule.registerAsync({
      inject: [AppConfig],
      useFactory: (config: AppConfig) => ({ secret: config.jwtSecret }),
    }),
  ],
  controllers: [SessionController],
  providers: [
    AccessCheck,
    AuthService,
    LinkPrincipals,
    SessionCookie,
    SessionToken,
    SessionsService,
    SignInThrottle,
    { provide: APP_GUARD, useClass: AccessGuard },
  ],
  exports: [LinkPrincipals, SessionsService],
})
export class AuthModule {}
