import { Problem } from '@furrowlight/shared/contract/common';
import * as fc from 'fast-check';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { openApiDocument } from '../src/common/openapi.js';
import { startServer, type TestServer } from './support/server.js';
import { addPlan, LAYOUT, type Plan } from './support/plan.js';
import type { Visitor } from './support/visitor.js';
import { boxAt, foundCooperative, signedIn, type Cooperative } from './support/world.js';

/** Cases per operation; more by hand: FUZZ_RUNS=300 npx vitest run test/fuzz.test.ts */
const RUNS = Number(process.env.FUZZ_RUNS ?? 15);
/** Operations that end the session under test, or whose bodies say nothing. */
const LEFT_OUT = ['DELETE /api/session', 'POST /api/session'];

interface Operation {
  method: string;
  path: string;
  query: string[];
  body: boolean;
}

let server: TestServer;
let cooperative: Cooperative;
let admin: Visitor;
let plan: Plan;
let operations: Operation[];

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  admin = await signedIn(server, cooperative, 'admin');
  plan = await addPlan(server, admin, cooperative.members.admin, cooperative.own);
  const { paths } = openApiDocument(server.app);
  operations = Object.entries(paths).flatMap(([path, item]) =>
    Object.entries(
      item as Record<
        string,
        { parameters?: { name: string; in: string }[]; requestBody?: unknown }
      >,
    ).map(([verb, operation]) => ({
      method: verb.toUpperCase(),
      path,
      query: (operation.parameters ?? []).filter((p) => p.in === 'query').map((p) => p.name),
      body: operation.requestBody !== undefined,
    })),
  );
  // What removes rows comes last, so that the others find them.
  operations.sort((a, b) => Number(a.method === 'DELETE') - Number(b.method === 'DELETE'));
});
afterAll(() => server.close());

/** Bodies that are right or nearly so, by the resource they make or change. */
function seeds(): Record<string, Record<string, unknown>[]> {
  const { farm, field } = cooperative.own;
  const place = { latitude: 48.68, longitude: 12.85, elevationM: 380 };
  const season = { cropId: 'lettuce', sowing: '2030-01-01', harvest: '2030-03-01' };
  const file = { fileName: 'w.csv', content: 'time;ghi\n2025-01-01 00:00;1' };
  return {
    farms: [{ name: 'F', holder: 'H', farmNumber: '', place: '', advisorId: null, notes: '' }],
    fields: [
      { farmId: farm.id, name: 'F', pin: [12.85, 48.68], boundary: boxAt(), occluders: [] },
      { name: 'F', pin: [12.85, 48.68], boundary: boxAt(), slopePercent: 3, aspectDeg: 10 },
    ],
    seasons: [{ ...season, canopyHeightM: 0.3 }],
    scenarios: [
      { fieldId: field.id, name: 'S', weatherId: null, layout: LAYOUT, notes: '' },
      { name: 'S', layout: { ...LAYOUT, tiltDeg: 30 }, archived: false },
      { name: 'Copy' },
    ],
    reviews: [{ fieldId: field.id, scenarioIds: [plan.scenarioId], message: '', expiresInDays: 3 }],
    weather: [
      { kind: 'file', name: 'W', ...file, ...place },
      { kind: 'clear-sky', name: 'W', utcOffsetHours: 1, ...place },
    ],
    preview: [{ ...file, latitude: 48, longitude: 12 }],
    'review-session': [{ token: 'x'.repeat(43) }],
  };
}

/** The row of the kind a path asks for. */
function rowOf(path: string): string {
  const { farm, field, season } = cooperative.own;
  const rows: Record<string, string> = {
    farms: farm.id,
    fields: field.id,
    seasons: season.id,
    scenarios: plan.scenarioId,
    runs: plan.runId,
    reviews: plan.reviewId,
    weather: plan.weatherId,
  };
  return rows[path.split('/')[2]];
}

/** A seed with one value, anywhere in it, put in place of another. */
function mutated(value: unknown, at: number, replacement: unknown): unknown {
  const slots: [Record<string, unknown>, string][] = [];
  const copy: unknown = structuredClone(value);
  const walk = (node: unknown): void => {
    if (node === null || typeof node !== 'object') return;
    for (const key of Object.keys(node)) {
      const parent = node as Record<string, unknown>;
      slots.push([parent, key]);
      walk(parent[key]);
    }
  };
  walk(copy);
  if (slots.length === 0) return copy;
  const [parent, key] = slots[at % slots.length];
  parent[key] = replacement;
  return copy;
}

const odd = fc.oneof(
  fc.jsonValue(),
  fc.constantFrom(
    '',
    ' ',
    '0',
    -1,
    0,
    1e308,
    -1e-320,
    90,
    180,
    null,
    true,
    [],
    {},
    '2026-02-30',
    '\u0000',
    '💡',
    "'; --",
  ),
  fc.double({ noNaN: true }),
);

it('no odd body, id or query makes the server fail or answer without a problem', async () => {
  const wrong = ['AAAAAAAAAAAAAAAAAAAA', 'x', '%00', '💡'.repeat(20), plan.runId];
  const bodies = seeds();
  const statuses = new Set<number>();
  const caseOf = (operation: Operation) => {
    const parts = operation.path.split('/').filter((part) => part in bodies);
    const fitting = bodies[parts[parts.length - 1]] ?? [{}];
    return fc.record({
      id: fc.oneof(
        { arbitrary: fc.constant(rowOf(operation.path)), weight: 3 },
        fc.constantFrom(...wrong),
      ),
      seed: fc.constantFrom(...fitting),
      at: fc.nat(),
      value: odd,
      shape: fc.constantFrom('seed', 'mutated', 'mutated', 'mutated', 'odd'),
      version: fc.constantFrom(undefined, 1, 2, 3),
      query: fc.oneof(fc.string(), fc.constantFrom('weeks', 'true', '1', '-1')),
    });
  };
  for (const operation of operations) {
    const name = `${operation.method} ${operation.path}`;
    if (LEFT_OUT.includes(name)) continue;
    await fc.assert(
      fc.asyncProperty(caseOf(operation), async (one) => {
        const query = operation.query.map((key) => `${key}=${encodeURIComponent(one.query)}`);
        const address =
          operation.path.replace('{id}', encodeURIComponent(one.id)) +
          (query.length > 0 ? `?${query.join('&')}` : '');
        const near = one.shape === 'seed' ? one.seed : mutated(one.seed, one.at, one.value);
        const body = one.shape === 'odd' ? one.value : near;
        const response = await admin.send(operation.method, address, {
          version: one.version,
          ...(operation.body ? { body: asBody(body), headers: JSON_TYPE } : {}),
        });
        statuses.add(response.status);
        expect(response.status, `${name}: ${response.text.slice(0, 300)}`).toBeLessThan(500);
        if (response.status >= 400) Problem.parse(response.body);
      }),
      { numRuns: RUNS, seed: 20261201 },
    );
  }
  // The fuzz reached both what is taken and what is refused.
  for (const status of [200, 201, 400, 404]) expect(statuses).toContain(status);
}, 300_000);

const JSON_TYPE = { 'Content-Type': 'application/json' };
/** Sent as text, so that values which are no objects travel as they are. */
const asBody = (value: unknown): string => JSON.stringify(value) ?? 'null';
