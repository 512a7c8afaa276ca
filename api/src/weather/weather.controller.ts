import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Id } from '@furrowlight/shared/contract/common';
import {
  HourlyYearAnswer,
  Weather,
  WeatherInput,
  WeatherList,
  WeatherPreview,
  WeatherPreviewRequest,
} from '@furrowlight/shared/contract/weather';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import { Body, Controller, Delete, Get, HttpCode, Param, Post } from '@nestjs/common';
import { ApiNoContentResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { CurrentMember } from '../common/params.js';
import { Responds } from '../common/responds.js';
import { WeatherService } from './weather.service.js';

@ApiTags('weather')
@Controller('weather')
export class WeatherController {
  constructor(private readonly weather: WeatherService) {}

  @Post('preview')
  @HttpCode(200)
  @Access('weather:write')
  @ApiOperation({ summary: 'How a weather file would be read; nothing is stored' })
  @Responds(WeatherPreview)
  preview(@Body({ schema: WeatherPreviewRequest }) input: WeatherPreviewRequest): WeatherPreview {
    return this.weather.preview(input);
  }

  @Post()
  @Access('weather:write')
  @ApiOperation({ summary: 'Store a weather year from a file, a climate table or a clear sky' })
  @Responds(Weather, 201, 'Stored, or found stored already')
  create(
    @CurrentMember() member: MemberPrincipal,
    @Body({ schema: WeatherInput }) input: WeatherInput,
  ): Promise<Weather> {
    return this.weather.create(member, input);
  }

  @Get()
  @Access('weather:read')
  @ApiOperation({ summary: 'Weather years of the cooperative' })
  @Responds(WeatherList)
  async list(@CurrentMember() member: MemberPrincipal): Promise<{ items: Weather[] }> {
    return { items: await this.weather.list(member) };
  }

  @Get(':id')
  @Access('weather:read')
  @ApiOperation({ summary: 'One weather year with its findings' })
  @Responds(Weather)
  get(
    @CurrentMember() member: MemberPrincipal,
    @Param('id', { schema: Id }) id: string,
  ): Promise<Weather> {
    return this.weather.get(member, id);
  }

  @Get(':id/year')
  @Access('weather:read')
  @ApiOperation({ summary: 'The hourly values, for the preview in the browser' })
  @Responds(HourlyYearAnswer)
  async year(
    @CurrentMember() member: MemberPrincipal,
    @Param('id', { schema: Id }) id: string,
  ): Promise<HourlyYear> {
    return (await this.weather.year(member, id)).year;
  }

  @Delete(':id')
  @HttpCode(204)
  @Access('weather:write')
  @ApiOperation({ summary: 'Remove a weather year no scenario rests on' })
  @ApiNoContentResponse({ description: 'Removed' })
  async remove(
    @CurrentMember() member: MemberPrincipal,
    @Param('id', { schema: Id }) id: string,
  ): Promise<void> {
    await this.weather.remove(member, id);
  }
}
