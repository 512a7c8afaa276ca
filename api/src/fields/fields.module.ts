import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { CropsModule } from '../crops/crops.module.js';
import { FarmsModule } from '../farms/farms.module.js';
import { FieldsController } from './fields.controller.js';
import { FieldsService } from './fields.service.js';
import { LandTotals } from './land-totals.js';
import { ScenarioCounts } from './scenario-counts.js';
import { SeasonsController } from './seasons.controller.js';
import { SeasonsService } from './seasons.service.js';

@Module({
  imports: [AuditModule, CropsModule, FarmsModule],
  controllers: [FieldsController, SeasonsController],
  providers: [FieldsService, SeasonsService, LandTotals, ScenarioCounts],
  exports: [FieldsService, SeasonsService, ScenarioCounts],
})
export class FieldsModule {}
