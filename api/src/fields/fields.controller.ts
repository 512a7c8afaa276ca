import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Id } from '@furrowlight/shared/contract/common';
import { Field, FieldInput, FieldList, FieldPatch } from '@furrowlight/shared/contract/fields';
import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import { z } from 'zod';
import { Access } from '../common/access.decorator.js';
import { CurrentMember, IfMatch } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { FieldsService } from './fields.service.js';

const FieldQuery = z.strictObject({ farmId: Id.optional() });

@ApiTags('fields')
@Controller('fields')
export class FieldsController {
  constructor(private readonly fields: FieldsService) {}

  @Get()
  @Access('fields:read')
  @ApiOperation({ summary: 'Fields you may see' })
  @Responds(FieldList)
  async list(
    @CurrentMember() member: MemberPrincipal,
    @Query({ schema: FieldQuery }) query: z.infer<typeof FieldQuery>,
  ): Promise<FieldList> {
    return { items: await this.fields.list(member, query.farmId ?? null) };
  }

  @Post()
  @Access('fields:write')
  @ApiOperation({ summary: 'Add a field' })
  @Responds(Field, 201)
  create(
    @CurrentMember() member: MemberPrincipal,
    @Body({ schema: FieldInput }) input: FieldInput,
  ): Promise<Field> {
    return this.fields.create(member, input);
  }

  @Get(':id')
  @Access('fields:read')
  @ApiOperation({ summary: 'One field' })
  @Responds(Field)
  get(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Field> {
    return this.fields.get(member, id);
  }

  @Patch(':id')
  @Access('fields:write')
  @ApiOperation({ summary: 'Change a field' })
  @Responds(Field)
  change(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
    @Body({ schema: FieldPatch }) patch: FieldPatch,
  ): Promise<Field> {
    return this.fields.change(member, id, version, patch);
  }

  @Delete(':id')
  @HttpCode(204)
  @Access('fields:write')
  @ApiOperation({ summary: 'Put a field into the bin' })
  @ApiNoContentResponse({ description: 'In the bin for 30 days' })
  remove(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
  ): Promise<void> {
    return this.fields.remove(member, id, version);
  }

  @Post(':id/restore')
  @HttpCode(200)
  @Access('fields:write')
  @ApiOperation({ summary: 'Bring a field back from the bin' })
  @Responds(Field)
  restore(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Field> {
    return this.fields.restore(member, id);
  }
}
