import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import {
  FieldSeason,
  FieldSeasonList,
  SeasonInput,
  SeasonPatch,
} from '@furrowlight/shared/contract/fields';
import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember, IfMatch } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { SeasonsService } from './seasons.service.js';

@ApiTags('seasons')
@Controller()
export class SeasonsController {
  constructor(private readonly seasons: SeasonsService) {}

  @Get('fields/:id/seasons')
  @Access('fields:read')
  @ApiOperation({ summary: 'Crops of a field, latest first' })
  @Responds(FieldSeasonList)
  async list(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
  ): Promise<{ items: FieldSeason[] }> {
    return { items: await this.seasons.list(member, id) };
  }

  @Post('fields/:id/seasons')
  @Access('fields:write')
  @ApiOperation({ summary: 'Add a crop season' })
  @Responds(FieldSeason, 201)
  create(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @Body({ schema: SeasonInput }) input: SeasonInput,
  ): Promise<FieldSeason> {
    return this.seasons.create(member, id, input);
  }

  @Patch('seasons/:id')
  @Access('fields:write')
  @ApiOperation({ summary: 'Change a crop season' })
  @Responds(FieldSeason)
  change(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
    @Body({ schema: SeasonPatch }) patch: SeasonPatch,
  ): Promise<FieldSeason> {
    return this.seasons.change(member, id, version, patch);
  }

  @Delete('seasons/:id')
  @HttpCode(204)
  @Access('fields:write')
  @ApiOperation({ summary: 'Remove a crop season' })
  @ApiNoContentResponse({ description: 'Removed' })
  remove(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
  ): Promise<void> {
    return this.seasons.remove(member, id, version);
  }
}
