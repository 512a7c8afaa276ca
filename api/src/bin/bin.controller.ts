import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { BinList, type BinItem } from '@furrowlight/shared/contract/bin';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { BinService } from './bin.service.js';

@ApiTags('bin')
@Controller('bin')
export class BinController {
  constructor(private readonly bin: BinService) {}

  @Get()
  @Access('farms:write')
  @ApiOperation({ summary: 'Removed farms and fields that can be brought back' })
  @Responds(BinList)
  async list(@CurrentMember() member: MemberPrincipal): Promise<{ items: BinItem[] }> {
    return { items: await this.bin.list(member) };
  }
}
