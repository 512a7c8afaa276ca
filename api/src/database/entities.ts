import { AuditEntryEntity } from '../audit/audit-entry.entity.js';
import { SessionEntity } from '../auth/session.entity.js';
import { SignInAttemptEntity } from '../auth/sign-in-attempt.entity.js';
import { IdempotencyKeyEntity } from '../common/idempotency-key.entity.js';
import { CooperativeEntity } from '../cooperatives/cooperative.entity.js';
import { FarmEntity } from '../farms/farm.entity.js';
import { FieldEntity } from '../fields/field.entity.js';
import { SeasonEntity } from '../fields/season.entity.js';
import { MemberEntity } from '../members/member.entity.js';
import { ReviewVisitEntity } from '../reviews/review-visit.entity.js';
import { ReviewEntity } from '../reviews/review.entity.js';
import { ResultEntity } from '../runs/result.entity.js';
import { RunEntity } from '../runs/run.entity.js';
import { ScenarioEntity } from '../scenarios/scenario.entity.js';
import { WeatherYearEntity } from '../weather/weather-year.entity.js';

/** Every table's class; a new one is added here and by a migration. */
export const ENTITIES = [
  AuditEntryEntity,
  CooperativeEntity,
  FarmEntity,
  FieldEntity,
  IdempotencyKeyEntity,
  MemberEntity,
  SeasonEntity,
  ReviewVisitEntity,
  ReviewEntity,
  ResultEntity,
  RunEntity,
  ScenarioEntity,
  SessionEntity,
  SignInAttemptEntity,
  WeatherYearEntity,
];
