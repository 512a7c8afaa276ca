import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { ScenarioResult } from '@furrowlight/shared/contract/result';
import { Run } from '@furrowlight/shared/contract/run';
import {
  Scenario,
  ScenarioCopy,
  ScenarioInput,
  ScenarioList,
  ScenarioPatch,
} from '@furrowlight/shared/contract/scenarios';
import { Body, Controller, Get, HttpCode, Param, Patch, Post, Query, Res } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import { z } from 'zod';
import { Access } from '../common/access.decorator.js';
import { CurrentMember, IfMatch } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { resultCsv, ResultTable } from './result-csv.js';
import { ScenariosService } from './scenarios.service.js';

const ListQuery = z.strictObject({ archived: z.enum(['true', 'false']).optional() });
const CsvQuery = z.strictObject({ table: ResultTable });

@ApiTags('scenarios')
@Controller()
export class ScenariosController {
  constructor(private readonly scenarios: ScenariosService) {}

  @Get('fields/:id/scenarios')
  @Access('scenarios:read')
  @ApiOperation({ summary: 'Scenarios of a field' })
  @Responds(ScenarioList)
  async list(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') fieldId: string,
    @Query({ schema: ListQuery }) query: z.infer<typeof ListQuery>,
  ): Promise<ScenarioList> {
    return { items: await this.scenarios.list(member, fieldId, query.archived === 'true') };
  }

  @Post('scenarios')
  @Access('scenarios:write')
  @ApiOperation({ summary: 'Add a scenario' })
  @Responds(Scenario, 201)
  create(
    @CurrentMember() member: MemberPrincipal,
    @Body({ schema: ScenarioInput }) input: ScenarioInput,
  ): Promise<Scenario> {
    return this.scenarios.create(member, input);
  }

  @Get('scenarios/:id')
  @Access('scenarios:read')
  @ApiOperation({ summary: 'One scenario' })
  @Responds(Scenario)
  get(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Scenario> {
    return this.scenarios.get(member, id);
  }

  @Patch('scenarios/:id')
  @Access('scenarios:write')
  @ApiOperation({ summary: 'Change a scenario; layout and weather only before its first run' })
  @Responds(Scenario)
  change(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @IfMatch() version: number,
    @Body({ schema: ScenarioPatch }) patch: ScenarioPatch,
  ): Promise<Scenario> {
    return this.scenarios.change(member, id, version, patch);
  }

  @Post('scenarios/:id/copy')
  @Access('scenarios:write')
  @ApiOperation({ summary: 'Copy a scenario, to change the copy' })
  @Responds(Scenario, 201)
  copy(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @Body({ schema: ScenarioCopy }) input: ScenarioCopy,
  ): Promise<Scenario> {
    return this.scenarios.copy(member, id, input.name);
  }

  @Post('scenarios/:id/runs')
  @HttpCode(202)
  @Access('runs:start')
  @ApiOperation({ summary: 'Freeze the scenario and run it over its weather year' })
  @Responds(Run, 202, 'Waiting, or done already from the same input')
  run(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Run> {
    return this.scenarios.run(member, id);
  }

  @Get('scenarios/:id/result')
  @Access('scenarios:read')
  @ApiOperation({ summary: 'Newest finished result' })
  @Responds(ScenarioResult)
  async result(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
  ): Promise<ScenarioResult> {
    return (await this.scenarios.result(member, id)).result;
  }

  @Get('scenarios/:id/result.csv')
  @Access('scenarios:read')
  @ApiOperation({ summary: 'One table of the newest result as CSV' })
  @ApiOkResponse({ description: 'CSV (RFC 4180)', content: { 'text/csv': {} } })
  async csv(
    @CurrentMember() member: MemberPrincipal,
    @Param('id') id: string,
    @Query({ schema: CsvQuery }) query: z.infer<typeof CsvQuery>,
    @Res({ passthrough: true }) response: Response,
  ): Promise<string> {
    const { scenario, result } = await this.scenarios.result(member, id);
    const name = `${scenario.name.replaceAll(/[^\p{L}\p{N}]+/gu, '-')}-${query.table}.csv`;
    response.type('text/csv; charset=utf-8');
    response.setHeader(
      'Content-Disposition',
      `attachment; filename*=UTF-8''${encodeURIComponent(name)}`,
    );
    return resultCsv(result.result, query.table);
  }

  @Get('runs/:id')
  @Access('runs:read')
  @ApiOperation({ summary: 'How far a run is' })
  @Responds(Run)
  getRun(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Run> {
    return this.scenarios.getRun(member, id);
  }

  @Post('runs/:id/cancel')
  @HttpCode(200)
  @Access('runs:start')
  @ApiOperation({ summary: 'Stop a run' })
  @Responds(Run)
  cancel(@CurrentMember() member: MemberPrincipal, @Param('id') id: string): Promise<Run> {
    return this.scenarios.cancelRun(member, id);
  }
}
