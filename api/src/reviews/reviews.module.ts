import { Module } from '@nestjs/common';
import { AuditModule } from '../audit/audit.module.js';
import { AuthModule } from '../auth/auth.module.js';
import { CooperativesModule } from '../cooperatives/cooperatives.module.js';
import { DeskModule } from '../desk/desk.module.js';
import { FieldsModule } from '../fields/fields.module.js';
import { RunsModule } from '../runs/runs.module.js';
import { ScenariosModule } from '../scenarios/scenarios.module.js';
import { WeatherModule } from '../weather/weather.module.js';
import { ReviewCookie } from './review-cookie.js';
import { ReviewsController } from './reviews.controller.js';
import { ReviewsDesk } from './reviews-desk.js';
import { ReviewsService } from './reviews.service.js';

@Module({
  imports: [
    AuditModule,
    AuthModule,
    CooperativesModule,
    DeskModule,
    FieldsModule,
    RunsModule,
    ScenariosModule,
    WeatherModule,
  ],
  controllers: [ReviewsController],
  providers: [ReviewsService, ReviewsDesk, ReviewCookie],
  exports: [ReviewsService],
})
export class ReviewsModule {}
