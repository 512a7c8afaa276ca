import { statfs } from 'node:fs/promises';
import { Controller, Get } from '@nestjs/common';
import { ApiOperation, ApiTags } from '@nestjs/swagger';
import {
  HealthCheckService,
  HealthIndicatorService,
  type HealthCheckResult,
} from '@nestjs/terminus';
import { Public } from '../common/access.decorator.js';
import { DomainError } from '../common/domain-error.js';
import { AppConfig } from '../config/app-config.js';
import { Database } from '../database/database.js';

const LEAST_FREE_BYTES = 200_000_000;

@ApiTags('health')
@Controller('health')
export class HealthController {
  constructor(
    private readonly health: HealthCheckService,
    private readonly indicators: HealthIndicatorService,
    private readonly database: Database,
    private readonly config: AppConfig,
  ) {}

  @Get('livez')
  @Public()
  @ApiOperation({ summary: 'The process answers' })
  live(): { status: 'ok' } {
    return { status: 'ok' };
  }

  @Get('readyz')
  @Public()
  @ApiOperation({ summary: 'Database and disk are in order' })
  async ready(): Promise<HealthCheckResult> {
    try {
      return await this.health.check([() => this.rows(), () => this.disk()]);
    } catch {
      throw new DomainError('not-ready', 'Database or disk are not in order; the log says which.');
    }
  }

  private async rows() {
    const indicator = this.indicators.check('database');
    await this.database.read.query('SELECT 1 FROM cooperatives LIMIT 1');
    return indicator.up();
  }

  private async disk() {
    const indicator = this.indicators.check('disk');
    const { bavail, bsize } = await statfs(this.config.dataDir);
    const freeBytes = bavail * bsize;
    return freeBytes > LEAST_FREE_BYTES ? indicator.up() : indicator.down({ freeBytes });
  }
}
