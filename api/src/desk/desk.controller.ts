import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Desk } from '@furrowlight/shared/contract/desk';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { DeskService } from './desk.service.js';

@ApiTags('desk')
@Controller('desk')
export class DeskController {
  constructor(private readonly desk: DeskService) {}

  @Get()
  @Access('desk:read')
  @ApiOperation({ summary: 'What wants your attention' })
  @Responds(Desk)
  read(@CurrentMember() member: MemberPrincipal): Promise<Desk> {
    return this.desk.of(member);
  }
}
