import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { MemberList, type Member } from '@furrowlight/shared/contract/members';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { MembersService } from './members.service.js';

@ApiTags('members')
@Controller('members')
export class MembersController {
  constructor(private readonly members: MembersService) {}

  @Get()
  @Access('members:read')
  @ApiOperation({ summary: 'People of the cooperative' })
  @Responds(MemberList)
  async list(@CurrentMember() member: MemberPrincipal): Promise<{ items: Member[] }> {
    return { items: await this.members.list(member) };
  }
}
