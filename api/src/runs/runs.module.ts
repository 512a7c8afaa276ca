import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { WeatherModule } from '../weather/weather.module.js';
import { RunPool } from './run-pool.js';
import { RunQueue } from './run-queue.js';
import { RunsService } from './runs.service.js';

@Module({
  imports: [AuditModule, WeatherModule],
  providers: [RunsService, RunQueue, RunPool],
  exports: [RunsService],
})
export class RunsModule {}
