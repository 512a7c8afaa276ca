import type { LinkPrincipal } from '@furrowlight/shared/access/may';
import { Injectable } from '@nestjs/common';
import type { Request } from 'express';

type Resolver = (request: Request) => Promise<LinkPrincipal | null>;

/** Where the room of review links tells the access guard how to recognise its visitors. */
@Injectable()
export class LinkPrincipals {
  private resolver: Resolver | null = null;

  /** Called once at start by the room that issues the links. */
  recogniseBy(resolver: Resolver): void {
    this.resolver = resolver;
  }

  /** The visitor behind a request; null when the request carries no living link. */
  async of(request: Request): Promise<LinkPrincipal | null> {
    return this.resolver ? this.resolver(request) : null;
  }
}
