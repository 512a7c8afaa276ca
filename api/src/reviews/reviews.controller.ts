import type { LinkPrincipal, MemberPrincipal, Principal } from '@furrowlight/shared/access/may';
import {
  Review,
  ReviewCreated,
  ReviewEntry,
  ReviewInput,
  ReviewList,
  ReviewPage,
} from '@furrowlight/shared/contract/reviews';
import { Body, Controller, Get, HttpCode, Param, Post, Res } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import { Access, Public } from '../common/access.decorator.js';
import { DomainError } from '../common/domain-error.js';
import { CurrentMember, CurrentPrincipal } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { ReviewCookie } from './review-cookie.js';
import { ReviewsService } from './reviews.service.js';

function requireVisitor(principal: Principal): LinkPrincipal {
  if (principal.kind !== 'review-link') {
    throw new DomainError('expired', 'Open the link you were sent once more.');
  }
  return principal;
}

@ApiTags('reviews')
@Controller()
export class ReviewsController {
  constructor(
    private readonly reviews: ReviewsService,
    private readonly cookie: ReviewCookie,
  ) {}

  @Post('reviews')
  @Access('reviews:write')
  @ApiOperation({ summary: 'Make a review link; the answer holds its address this once' })
  @Responds(ReviewCreated, 201)
  create(
    @CurrentMember() member: MemberPrincipal,
    @Body({ schema: ReviewInput }) input: ReviewInput,
  ): Promise<ReviewCreated> {
    return this.reviews.create(member, input);
  }

  @Get('fields/:id/reviews')
  @Access('reviews:read')
  @ApiOperation({ summary: 'Review links of a field' })
  @Responds(ReviewList)
  async list(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') fieldId: string,
  ): Promise<{ items: Review[] }> {
    return { items: await this.reviews.list(member, fieldId) };
  }

  @Post('reviews/:id/revoke')
  @HttpCode(200)
  @Access('reviews:write')
  @ApiOperation({ summary: 'End a review link at once' })
  @Responds(Review)
  revoke(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Review> {
    return this.reviews.revoke(member, id);
  }

  @Post('review-session')
  @HttpCode(204)
  @Public()
  @ApiOperation({ summary: 'Swap the token of a review link for a cookie' })
  @ApiNoContentResponse({ description: 'The cookie opens /api/review' })
  async enter(
    @Body({ schema: ReviewEntry }) entry: ReviewEntry,
    @Res({ passthrough: true }) response: Response,
  ): Promise<void> {
    const { cookie, expiresAt } = await this.reviews.enter(entry.token);
    this.cookie.set(response, cookie, expiresAt);
  }

  @Get('review')
  @Access('review-page:read')
  @ApiOperation({ summary: 'The page a review link shows' })
  @Responds(ReviewPage)
  page(@CurrentPrincipal() principal: Principal): Promise<ReviewPage> {
    return this.reviews.page(requireVisitor(principal));
  }
}
