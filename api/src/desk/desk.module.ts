import { Module } from '@nestjs/common';
import { FarmsModule } from '../farms/farms.module.js';
import { FieldsModule } from '../fields/fields.module.js';
import { DeskController } from './desk.controller.js';
import { DeskService } from './desk.service.js';
import { DeskSources } from './desk-sources.js';

@Module({
  imports: [FarmsModule, FieldsModule],
  controllers: [DeskController],
  providers: [DeskService, DeskSources],
  exports: [DeskSources],
})
export class DeskModule {}
