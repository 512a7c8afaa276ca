import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Farm, FarmInput, FarmList, FarmPatch } from '@furrowlight/shared/contract/farms';
import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { z } from 'zod';
import { Access } from '../common/access.decorator.js';
import { CurrentMember, IfMatch } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { FarmsService } from './farms.service.js';

@ApiTags('farms')
@Controller('farms')
export class FarmsController {
  constructor(private readonly farms: FarmsService) {}

  @Get()
  @Access('farms:read')
  @ApiOperation({ summary: 'Farms you may see' })
  @Responds(FarmList)
  async list(@CurrentMember() member: MemberPrincipal): Promise<z.infer<typeof FarmList>> {
    return { items: await this.farms.list(member) };
  }

  @Post()
  @Access('farms:write')
  @ApiOperation({ summary: 'Add a farm' })
  @Responds(Farm, 201)
  create(
    @CurrentMember() member: MemberPrincipal,
    @Body({ schema: FarmInput }) input: FarmInput,
  ): Promise<Farm> {
    return this.farms.create(member, input);
  }

  @Get(':id')
  @Access('farms:read')
  @ApiOperation({ summary: 'One farm' })
  @Responds(Farm)
  get(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Farm> {
    return this.farms.get(member, id);
  }

  @Patch(':id')
  @Access('farms:write')
  @ApiOperation({ summary: 'Change a farm' })
  @Responds(Farm)
  change(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
    @Body({ schema: FarmPatch }) patch: FarmPatch,
  ): Promise<Farm> {
    return this.farms.change(member, id, version, patch);
  }

  @Delete(':id')
  @HttpCode(204)
  @Access('farms:write')
  @ApiOperation({ summary: 'Put a farm into the bin' })
  @ApiNoContentResponse({ description: 'In the bin for 30 days' })
  remove(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
  ): Promise<void> {
    return this.farms.remove(member, id, version);
  }

  @Post(':id/restore')
  @HttpCode(200)
  @Access('farms:write')
  @ApiOperation({ summary: 'Bring a farm back from the bin' })
  @Responds(Farm)
  restore(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Farm> {
    return this.farms.restore(member, id);
  }
}
