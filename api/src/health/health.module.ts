import { Module } from '@nestjs/common';
import { TerminusModule } from '@nestjs/terminus';
import { CooperativesModule } from '../cooperatives/cooperatives.module.js';
import { ClientConfigController } from './client-config.controller.js';
import { HealthController } from './health.controller.js';

@Module({
  imports: [CooperativesModule, TerminusModule],
  controllers: [ClientConfigController, HealthController],
})
export class HealthModule {}
