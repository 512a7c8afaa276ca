import { holds } from '@furrowlight/shared/access/may';
import { MEMBER_PERMISSIONS, type Permission } from '@furrowlight/shared/access/permissions';
import type { Role } from '@furrowlight/shared/contract/session';
import { Controller, Get } from '@nestjs/common';
import { Test } from '@nestjs/testing';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AccessCheck } from '../src/auth/access-check.js';
import { Access } from '../src/common/access.decorator.js';
import { DiscoveryModule } from '@nestjs/core';
import { openApiDocument } from '../src/common/openapi.js';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, ROLES, signedIn, type Cooperative, type Land } from './support/world.js';
import { addPlan, type Plan } from './support/plan.js';

interface Route {
  method: string;
  path: string;
  permission: Permission | null;
}

/** Rows of the routes' ids, by the first part of the path. */
type Rows = Record<string, string>;

/** Routes that answer whoever asks; a new one has to be added here on purpose. */
const PUBLIC = [
  'GET /api/config',
  'GET /api/health/livez',
  'GET /api/health/readyz',
  'POST /api/session',
  'DELETE /api/session',
  'POST /api/review-session',
];
/** What a route must be asked besides its id. */
const QUERIES: Record<string, string> = { '/api/scenarios/:id/result.csv': '?table=weeks' };
const NOBODY = 'AAAAAAAAAAAAAAAAAAAA';

let server: TestServer;
let north: Cooperative;
let south: Cooperative;
let routes: Route[];
let own: Rows;
let neighbour: Rows;
let foreign: Rows;
const visitors = new Map<Role, Visitor>();

function rowsOf(land: Land, plan: Plan): Rows {
  return {
    farms: land.farm.id,
    fields: land.field.id,
    seasons: land.season.id,
    scenarios: plan.scenarioId,
    runs: plan.runId,
    reviews: plan.reviewId,
    weather: plan.weatherId,
  };
}

/** Every route the server really listens on, with the permission its handler names. */
function registeredRoutes(): Route[] {
  interface Layer {
    route?: { path: string; methods: Record<string, boolean> };
  }
  const express = server.app.getHttpAdapter().getInstance() as { router: { stack: Layer[] } };
  const { paths } = openApiDocument(server.app);
  return express.router.stack.flatMap(({ route }) => {
    if (!route || route.path.startsWith('/api/docs')) return [];
    const address = route.path.replaceAll(/:(\w+)/g, '{$1}');
    return Object.keys(route.methods).map((verb) => {
      const item = paths[address] as Record<string, Record<string, unknown>> | undefined;
      const operation = item?.[verb];
      expect(operation, `${verb} ${route.path} is in the OpenAPI document`).toBeDefined();
      const permission = (operation?.['x-permission'] as Permission | undefined) ?? null;
      return { method: verb.toUpperCase(), path: route.path, permission };
    });
  });
}

const withId = (route: Route, rows: Rows): string =>
  route.path.replace(':id', rows[route.path.split('/')[2]] ?? NOBODY) + (QUERIES[route.path] ?? '');

/** Weather years have no version: the own one is left alone for those who come after. */
const ownId = (route: Route): string =>
  withId(route, `${route.method} ${route.path}` === 'DELETE /api/weather/:id' ? {} : own);

/** Call a route in a way that changes nothing even where it is allowed: version 999 is stale. */
function attempt(visitor: Visitor, route: Route, address: string) {
  const body = ['POST', 'PATCH', 'PUT'].includes(route.method) ? {} : undefined;
  return visitor.send(route.method, address, { body, version: 999 });
}

beforeAll(async () => {
  server = await startServer();
  north = await foundCooperative(server, 'North');
  south = await foundCooperative(server, 'South');
  const northAdmin = await signedIn(server, north, 'admin');
  const southAdmin = await signedIn(server, south, 'admin');
  own = rowsOf(north.own, await addPlan(server, northAdmin, north.members.admin, north.own));
  neighbour = rowsOf(
    north.neighbour,
    await addPlan(server, northAdmin, north.members.admin, north.neighbour),
  );
  foreign = rowsOf(south.own, await addPlan(server, southAdmin, south.members.admin, south.own));
  for (const role of ROLES) visitors.set(role, await signedIn(server, north, role));
  routes = registeredRoutes();
}, 120_000);
afterAll(() => server.close());

const as = (role: Role): Visitor => visitors.get(role) ?? expect.unreachable();
const guarded = () => routes.filter((route) => route.permission !== null);

describe('every route', () => {
  it('is mapped: it names a permission, or is public on purpose', () => {
    const open = routes.filter((route) => route.permission === null);
    expect(open.map((route) => `${route.method} ${route.path}`).sort()).toEqual([...PUBLIC].sort());
    expect(routes.length).toBeGreaterThan(35);
  });

  it('has an own and a foreign row for its id', () => {
    for (const { path } of routes.filter((route) => route.path.includes(':id'))) {
      const kind = path.split('/')[2];
      for (const rows of [own, neighbour, foreign]) expect(rows[kind], path).toBeTruthy();
    }
  });

  it('refuses whoever is not signed in', async () => {
    for (const route of guarded()) {
      const { status } = await attempt(server.visitor(), route, withId(route, own));
      const expected = route.permission === 'review-page:read' ? 410 : 401;
      expect(status, `${route.method} ${route.path}`).toBe(expected);
    }
  });

  it.each(ROLES)('lets %s in exactly where the table of permissions says so', async (role) => {
    const principal = north.members[role];
    for (const route of guarded()) {
      if (route.permission === 'review-page:read') continue;
      const { status, body } = await attempt(as(role), route, ownId(route));
      const what = `${role} ${route.method} ${route.path} -> ${status} ${body.code ?? ''}`;
      if (holds(principal, route.permission as Permission)) {
        // Whatever else is wrong with the request, it is not the role.
        expect([401, 403, 500], what).not.toContain(status);
        if (route.method === 'GET') expect([200, 404], what).toContain(status);
        if (route.method === 'GET' && !/result/.test(route.path)) expect(status, what).toBe(200);
      } else {
        expect(status, what).toBe(403);
        expect(body.code, what).toBe('forbidden');
      }
    }
  });

  it.each(ROLES)('tells %s of foreign rows what it tells of missing ones', async (role) => {
    for (const route of guarded().filter(({ path }) => path.includes(':id'))) {
      const missing = await attempt(as(role), route, withId(route, {}));
      const other = await attempt(as(role), route, withId(route, foreign));
      const what = `${role} ${route.method} ${route.path}`;
      expect([400, 403, 404], what).toContain(other.status);
      expect(other.status, what).toBe(missing.status);
      expect({ ...other.body, requestId: '' }, what).toEqual({ ...missing.body, requestId: '' });
    }
  });

  it('tells a farmer of a neighbour’s rows what it tells of missing ones', async () => {
    const rows = guarded().filter(({ path }) => /:id/.test(path) && !path.includes('/weather/'));
    for (const route of rows) {
      const missing = await attempt(as('farmer'), route, withId(route, {}));
      const other = await attempt(as('farmer'), route, withId(route, neighbour));
      const what = `${route.method} ${route.path} -> ${other.status}`;
      expect([403, 404], what).toContain(other.status);
      expect({ ...other.body, requestId: '' }, what).toEqual({ ...missing.body, requestId: '' });
    }
  });
});

describe('lists', () => {
  it.each(ROLES)('show %s nothing of another cooperative', async (role) => {
    const lists = guarded().filter(({ method, path }) => method === 'GET' && !path.includes(':id'));
    for (const route of lists) {
      const { text } = await as(role).get(route.path);
      expect(text, route.path).not.toMatch(/South/);
      for (const id of Object.values(foreign)) expect(text, route.path).not.toContain(id);
    }
  });

  it('show a farmer the own farm alone', async () => {
    for (const path of ['/api/farms', '/api/fields', '/api/desk']) {
      const { text } = await as('farmer').get(path);
      if (path !== '/api/desk') expect(text).toContain(own[path.split('/')[2]]);
      expect(text).not.toMatch(/Moosgut/);
    }
  });

  it('refuse to put a row into another cooperative', async () => {
    const admin = as('admin');
    const field = { farmId: foreign.farms, name: 'Intruder', pin: [12.85, 48.68] };
    expect((await admin.post('/api/fields', field)).status).toBe(404);
    const season = {
      cropId: 'spinach',
      sowing: '2027-04-01',
      harvest: '2027-05-01',
      canopyHeightM: 0.2,
    };
    const address = `/api/fields/${foreign.fields}/seasons`;
    expect((await admin.post(address, season)).status).toBe(404);
  });
});

describe('the rules themselves', () => {
  it('give visitors with a link no permission of members, and the other way round', () => {
    const visitor = {
      kind: 'review-link',
      reviewId: 'r',
      cooperativeId: 'c',
      fieldId: 'f',
      scenarioIds: [],
    } as const;
    for (const permission of Object.keys(MEMBER_PERMISSIONS) as Permission[]) {
      expect(holds(visitor, permission)).toBe(false);
    }
    expect(holds(visitor, 'review-page:read')).toBe(true);
    for (const role of ROLES) expect(holds(north.members[role], 'review-page:read')).toBe(false);
  });

  it('stop the start when a handler names no permission', async () => {
    @Controller('leak')
    class LeakController {
      @Access('farms:read')
      @Get('fine')
      fine(): string {
        return 'guarded';
      }

      @Get()
      leak(): string {
        return 'everything';
      }
    }
    const module = await Test.createTestingModule({
      imports: [DiscoveryModule],
      controllers: [LeakController],
      providers: [AccessCheck],
    }).compile();
    await expect(module.createNestApplication().init()).rejects.toThrow(/LeakController\.leak$/);
  });
});
