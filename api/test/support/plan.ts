import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import { Layout } from '@furrowlight/shared/contract/layout';
import { expect } from 'vitest';
import { Database } from '../../src/database/database.js';
import { ReviewEntity } from '../../src/reviews/review.entity.js';
import { RunEntity } from '../../src/runs/run.entity.js';
import type { TestServer } from './server.js';
import type { Visitor } from './visitor.js';
import type { Land } from './world.js';

/** Ids of what hangs on a field beyond its crops. */
export interface Plan {
  weatherId: string;
  scenarioId: string;
  runId: string;
  reviewId: string;
}

/** Rows over a cereal field, wide enough for a combine. */
export const LAYOUT: Layout = Layout.parse({
  kind: 'overhead-fixed',
  pitchM: 10,
  collectorWidthM: 3.4,
  tiltDeg: 20,
  azimuthDeg: 180,
  clearHeightM: 5,
  headlandM: 8,
  sideMarginM: 4,
  stripWidthM: 0.6,
  offsetM: 0,
  postSpacingM: 10,
  structureShade: 0.03,
  module: {
    powerWm2: 210,
    lengthM: 1.13,
    transmittance: 0.05,
    frontReflectance: 0.05,
    rearReflectance: 0.2,
    bifaciality: 0.7,
    temperaturePercentPerK: -0.34,
  },
  gaps: null,
  tracker: null,
  dcAcRatio: 1.2,
  lossesPercent: 12,
});

/** A review page without scenarios. */
const emptyPage = ({ farm, field }: Land, expiresAt: string): ReviewEntity['shown'] => ({
  fieldName: field.name,
  farmName: farm.name,
  cooperativeName: 'C',
  advisorName: 'A',
  message: '',
  expiresAt,
  timeZone: field.timeZone,
  pin: field.pin,
  boundary: field.boundary,
  slopePercent: 0,
  site: { latitude: field.pin[1], longitude: field.pin[0] },
  scenarios: [],
});

/**
 * A weather year and a scenario through the interface, and a run and a review link straight into
 * their tables: nothing here needs the engine to work.
 */
export async function addPlan(
  server: TestServer,
  admin: Visitor,
  owner: MemberPrincipal,
  land: Land,
): Promise<Plan> {
  const weather = await admin.post('/api/weather', {
    kind: 'clear-sky',
    name: `Clear sky at ${land.farm.name}`,
    latitude: 48.68,
    longitude: 12.85,
    elevationM: 380,
    utcOffsetHours: 1,
  });
  expect(weather.status, weather.text).toBe(201);
  const scenario = await admin.post('/api/scenarios', {
    fieldId: land.field.id,
    name: `Rows over ${land.farm.name}`,
    layout: LAYOUT,
  });
  expect(scenario.status, scenario.text).toBe(201);
  const scenarioId: string = scenario.body.id;
  const runId = `run-of-${scenarioId.slice(0, 12)}`;
  const reviewId = `link-of-${scenarioId.slice(0, 12)}`;
  const now = new Date().toISOString();
  const { cooperativeId, memberId, name } = owner;
  await server.app.get(Database).write(async (manager) => {
    await manager.insert(RunEntity, {
      id: runId,
      cooperativeId,
      scenarioId,
      status: 'cancelled',
      progress: 0,
      modelVersion: '0.0.0',
      inputHash: 'none',
      frozen: JSON.parse('{}') as RunEntity['frozen'],
      attempts: 1,
      createdAt: now,
      finishedAt: now,
    });
    await manager.insert(ReviewEntity, {
      id: reviewId,
      cooperativeId,
      fieldId: land.field.id,
      message: '',
      tokenHash: reviewId,
      shown: emptyPage(land, now),
      createdAt: now,
      createdById: memberId,
      createdByName: name,
      expiresAt: new Date(Date.now() + 86_400_000).toISOString(),
      views: 0,
    });
  });
  return { weatherId: weather.body.id, scenarioId, runId, reviewId };
}
