import { Module, type DynamicModule } from '@nestjs/common';
import { ScheduleModule } from '@nestjs/schedule';
import { AuditModule } from './audit/audit.module.js';
import { AuthModule } from './auth/auth.module.js';
import { BinModule } from './bin/bin.module.js';
import { CommonModule } from './common/common.module.js';
import type { AppConfig } from './config/app-config.js';
import { ConfigModule } from './config/config.module.js';
import { CooperativesModule } from './cooperatives/cooperatives.module.js';
import { CropsModule } from './crops/crops.module.js';
import { DatabaseModule } from './database/database.module.js';
import { DeskModule } from './desk/desk.module.js';
import { FarmsModule } from './farms/farms.module.js';
import { FieldsModule } from './fields/fields.module.js';
import { HealthModule } from './health/health.module.js';
import { MembersModule } from './members/members.module.js';
import { ReviewsModule } from './reviews/reviews.module.js';
import { RunsModule } from './runs/runs.module.js';
import { ScenariosModule } from './scenarios/scenarios.module.js';
import { WeatherModule } from './weather/weather.module.js';

@Module({})
export class AppModule {
  static with(config: AppConfig): DynamicModule {
    return {
      module: AppModule,
      imports: [
        ConfigModule.with(config),
        ScheduleModule.forRoot(),
        CommonModule,
        DatabaseModule,
        AuthModule,
        MembersModule,
        CooperativesModule,
        AuditModule,
        FarmsModule,
        FieldsModule,
        CropsModule,
        BinModule,
        DeskModule,
        HealthModule,
        WeatherModule,
        ScenariosModule,
        RunsModule,
        ReviewsModule,
      ],
    };
  }
}
