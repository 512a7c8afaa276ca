import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { CropsModule } from '../crops/crops.module.js';
import { DeskModule } from '../desk/desk.module.js';
import { FieldsModule } from '../fields/fields.module.js';
import { RunsModule } from '../runs/runs.module.js';
import { WeatherModule } from '../weather/weather.module.js';
import { ScenariosController } from './scenarios.controller.js';
import { ScenariosDesk } from './scenarios-desk.js';
import { ScenariosService } from './scenarios.service.js';

@Module({
  imports: [AuditModule, CropsModule, DeskModule, FieldsModule, RunsModule, WeatherModule],
  controllers: [ScenariosController],
  providers: [ScenariosService, ScenariosDesk],
  exports: [ScenariosService],
})
export class ScenariosModule {}
