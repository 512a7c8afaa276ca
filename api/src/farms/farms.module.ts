import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { MembersModule } from '../members/members.module.js';
import { FarmTotals } from './farm-totals.js';
import { FarmsController } from './farms.controller.js';
import { FarmsService } from './farms.service.js';

@Module({
  imports: [AuditModule, MembersModule],
  controllers: [FarmsController],
  providers: [FarmsService, FarmTotals],
  exports: [FarmsService, FarmTotals],
})
export class FarmsModule {}
