import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { AuditPage, AuditQuery } from '@furrowlight/shared/contract/audit';
import { Controller, Get, Query } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { AuditService } from './audit.service.js';

@ApiTags('audit')
@Controller('audit')
export class AuditController {
  constructor(private readonly audit: AuditService) {}

  @Get()
  @Access('audit:read')
  @ApiOperation({ summary: 'Who did what to which, newest first' })
  @Responds(AuditPage)
  async page(
    @CurrentMember() member: MemberPrincipal,
    @Query({ schema: AuditQuery }) query: AuditQuery,
  ): Promise<AuditPage> {
    const page = await this.audit.page(member, query.before ?? null, query.size);
    return { ...page, brokenAt: await this.audit.firstBroken(member.cooperativeId) };
  }
}
