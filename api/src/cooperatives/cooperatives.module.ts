import { Module } from '@nestjs/common';
import { CooperativesService } from './cooperatives.service.js';

@Module({ providers: [CooperativesService], exports: [CooperativesService] })
export class CooperativesModule {}
