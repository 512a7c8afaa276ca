import { CropList, type Crop } from '@furrowlight/shared/contract/crops';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Access } from '../common/access.decorator.js';
import { Responds } from '../common/responds.js';
import { CropsService } from './crops.service.js';

@ApiTags('crops')
@Controller('crops')
export class CropsController {
  constructor(private readonly crops: CropsService) {}

  @Get()
  @Access('crops:read')
  @ApiOperation({ summary: 'The crop table with its sources' })
  @Responds(CropList)
  list(): { items: readonly Crop[] } {
    return { items: this.crops.list() };
  }
}
