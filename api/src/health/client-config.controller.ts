import { ClientConfig } from '@furrowlight/shared/contract/config';
import { MODEL_VERSION } from '@furrowlight/shared/run/model-version';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import { Public } from '../common/access.decorator.js';
import { Responds } from '../common/responds.js';
import { PRODUCT_VERSION } from '../config/product-version.js';
import { AppConfig } from '../config/app-config.js';
import { CooperativesService } from '../cooperatives/cooperatives.service.js';

@ApiTags('config')
@Controller('config')
export class ClientConfigController {
  constructor(
    private readonly config: AppConfig,
    private readonly cooperatives: CooperativesService,
  ) {}

  @Get()
  @Public()
  @ApiOperation({ summary: 'What the pages must know before anyone signs in' })
  @Responds(ClientConfig)
  async read(): Promise<ClientConfig> {
    const demoAccounts = this.config.demo ? await this.cooperatives.demoAccounts() : [];
    return {
      version: PRODUCT_VERSION,
      modelVersion: MODEL_VERSION,
      demo: demoAccounts.length > 0,
      demoAccounts,
      tileLayers: [...this.config.tileLayers],
    };
  }
}
