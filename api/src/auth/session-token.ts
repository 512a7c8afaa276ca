import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { z } from 'zod';

const ISSUER = 'furrowlight';
const AUDIENCE = 'furrowlight-members';

const Claims = z.object({
  jti: z.string().min(8),
  sub: z.string().min(8),
  gen: z.int().min(1),
  exp: z.number(),
});

/** What a token says: which session, whose, and which rotation of it. */
export interface TokenClaims {
  sessionId: string;
  memberId: string;
  generation: number;
}

/** Signs and reads the members' tokens: HS256 and nothing else, our issuer and audience only. */
@Injectable()
export class SessionToken {
  constructor(private readonly jwt: JwtService) {}

  sign(claims: TokenClaims, expiresAt: Date): Promise<string> {
    return this.jwt.signAsync(
      { gen: claims.generation, exp: Math.floor(expiresAt.getTime() / 1000) },
      {
        algorithm: 'HS256',
        jwtid: claims.sessionId,
        subject: claims.memberId,
        issuer: ISSUER,
        audience: AUDIENCE,
      },
    );
  }

  /** The claims of a genuine, unexpired token; null for everything else. */
  async read(token: string, now: Date): Promise<TokenClaims | null> {
    let payload: unknown;
    try {
      payload = await this.jwt.verifyAsync<Record<string, unknown>>(token, {
        algorithms: ['HS256'],
        issuer: ISSUER,
        audience: AUDIENCE,
        clockTimestamp: Math.floor(now.getTime() / 1000),
      });
    } catch {
      return null;
    }
    const claims = Claims.safeParse(payload);
    if (!claims.success) return null;
    const { jti, sub, gen } = claims.data;
    return { sessionId: jti, memberId: sub, generation: gen };
  }
}
