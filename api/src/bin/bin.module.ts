import { Module } from '@nestjs/common';
import { FarmsModule } from '../farms/farms.module.js';
import { FieldsModule } from '../fields/fields.module.js';
import { BinController } from './bin.controller.js';
import { BinService } from './bin.service.js';

@Module({
  imports: [FarmsModule, FieldsModule],
  controllers: [BinController],
  providers: [BinService],
})
export class BinModule {}
