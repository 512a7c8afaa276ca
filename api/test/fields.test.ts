import type { Boundary } from '@furrowlight/shared/contract/fields';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { boxAt, foundCooperative, signedIn, type Cooperative } from './support/world.js';

let server: TestServer;
let cooperative: Cooperative;
let advisor: Visitor;

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  advisor = await signedIn(server, cooperative, 'advisor');
});
afterAll(() => server.close());

const polygon = (...rings: [number, number][][]): Boundary => ({
  type: 'Polygon',
  coordinates: rings,
});
/** Corners in steps of about 100 m around the valley. */
const ring = (...corners: [number, number][]): [number, number][] =>
  corners.map(([x, y]) => [12.85 + x * 0.00136, 48.68 + y * 0.0009]);

const draw = (boundary: Boundary | null, pin: [number, number] = [12.851, 48.681]) =>
  advisor.post('/api/fields', {
    farmId: cooperative.own.farm.id,
    name: 'Drawn',
    pin,
    boundary,
  });

async function refused(boundary: Boundary, message: RegExp): Promise<void> {
  const { status, body } = await draw(boundary);
  expect(status, JSON.stringify(body)).toBe(400);
  expect(body.code).toBe('invalid-input');
  expect(body.errors[0].path).toMatch(/^boundary/);
  expect(body.errors[0].message).toMatch(message);
}

describe('a boundary', () => {
  it('is measured on the ellipsoid', async () => {
    const { status, body } = await draw(boxAt(12.85, 48.68, 0.002));
    expect(status).toBe(201);
    // Radii of curvature of WGS 84 at 48.681 degrees (Snyder 1987, eq. 4-18 to 4-20), by hand:
    // M = 6371490 m, N = 6390214 m; sides 0.002 degrees: 222.41 m north, 147.28 m east.
    expect(body.geometry.areaM2).toBeCloseTo(222.41 * 147.28, -1.5);
    expect(body.geometry.perimeterM).toBeCloseTo(2 * (222.41 + 147.28), 0);
    expect(body.geometry.longestSideM).toBeCloseTo(222.41, 1);
    expect(body.geometry.longestSideBearingDeg % 180).toBeCloseTo(0, 3);
    expect(body.timeZone).toBe('Europe/Berlin');
  });

  it('subtracts its cut-outs', async () => {
    const whole = ring([0, 0], [3, 0], [3, 3], [0, 3], [0, 0]);
    const pond = ring([1, 1], [2, 1], [2, 2], [1, 2], [1, 1]);
    const full = (await draw(polygon(whole))).body.geometry.areaM2;
    const cut = (await draw(polygon(whole, pond))).body.geometry.areaM2;
    expect(cut / full).toBeCloseTo(8 / 9, 4);
  });

  it('draws the pin inside', async () => {
    const { body } = await draw(boxAt(), [12.9, 48.7]);
    expect(body.pin[0]).toBeCloseTo(12.85075, 5);
    expect(body.pin[1]).toBeCloseTo(48.68075, 5);
  });

  it('may be missing as long as there is a pin', async () => {
    const { status, body } = await draw(null);
    expect(status).toBe(201);
    expect(body).toMatchObject({ boundary: null, geometry: null, timeZone: 'Europe/Berlin' });
  });

  it('is refused when it is not closed', () =>
    refused(polygon(ring([0, 0], [1, 0], [1, 1], [0, 1])), /not closed/));

  it('is refused when it crosses itself, and says where', () =>
    refused(
      polygon(ring([0, 0], [2, 2], [2, 0], [0, 2], [0, 0])),
      /crosses itself at latitude 48\.68\d+, longitude 12\.85\d+/,
    ));

  it('is refused when a corner lies on another side', () =>
    refused(polygon(ring([0, 0], [2, 0], [2, 2], [1, 0], [0, 2], [0, 0])), /touches itself/));

  it('is refused when it doubles back on itself', () =>
    refused(polygon(ring([0, 0], [3, 0], [2, 0], [2, 2], [0, 2], [0, 0])), /touches itself/));

  it('is refused with one corner set twice', () =>
    refused(polygon(ring([0, 0], [2, 0], [2, 0], [2, 2], [0, 0])), /one spot/));

  it('is refused with fewer than three corners', () =>
    refused(polygon(ring([0, 0], [1, 1], [0, 0])), /three corners/));

  it('is refused when too small or too large, with its size', async () => {
    await refused(boxAt(12.85, 48.68, 0.00003), /0\.0007 ha; a field has at least 0\.01 ha/);
    await refused(boxAt(12.85, 48.68, 0.05), /20\d\d ha; a field has at most 500 ha/);
    await refused(
      polygon([
        [0, 40],
        [20, 40],
        [20, 60],
        [0, 60],
        [0, 40],
      ]),
      /at most 500 ha/,
    );
  });

  it('is refused when a cut-out reaches out, or lies in another', async () => {
    const whole = ring([0, 0], [3, 0], [3, 3], [0, 3], [0, 0]);
    const outside = ring([4, 4], [5, 4], [5, 5], [4, 4]);
    const pond = ring([1, 1], [2, 1], [2, 2], [1, 2], [1, 1]);
    const island = ring([1.2, 1.2], [1.5, 1.2], [1.5, 1.5], [1.2, 1.2]);
    await refused(polygon(whole, outside), /outside the field/);
    await refused(polygon(whole, pond, island), /inside another cut-out/);
  });

  it('is refused with latitude and longitude swapped, and the swap is offered', async () => {
    const swapped = boxAt().coordinates[0].map(([x, y]): [number, number] => [y, x]);
    await refused(polygon(swapped), /Swap them/);
    const { body } = await draw(null, [48.68, 12.85]);
    expect(body.errors[0]).toMatchObject({ path: 'pin', message: expect.stringMatching(/Swap/) });
  });

  it('is taken far from the others when it is far either way', async () => {
    expect((await draw(boxAt(-3.7, 40.4))).body.timeZone).toBe('Europe/Madrid');
  });

  it('is refused beyond the latitudes of the light model', async () => {
    await refused(boxAt(25.7, 66.5), /beyond ±66/);
    expect((await draw(null, [25.7, 66.5])).body.errors[0].path).toBe('pin');
  });

  it.each([
    ['no array', { type: 'Polygon', coordinates: 'x' }],
    ['another shape', { type: 'MultiPolygon', coordinates: [] }],
    [
      'numbers that are none',
      {
        type: 'Polygon',
        coordinates: [
          [
            [null, 1],
            [1, 1],
            [1, 1],
            [1, 1],
          ],
        ],
      },
    ],
    [
      'projected metres',
      polygon([
        [4500000, 5400000],
        [4500100, 5400000],
        [4500100, 5400100],
        [4500000, 5400000],
      ]),
    ],
    ['no rings', { type: 'Polygon', coordinates: [] }],
    ['unknown members', { ...boxAt(), crs: { type: 'name' } }],
  ])('is refused, never a server error: %s', async (_, boundary) => {
    const { status, body } = await draw(boundary as Boundary);
    expect(status).toBe(400);
    expect(body.errors.every(({ path }: { path: string }) => path.startsWith('boundary'))).toBe(
      true,
    );
  });

  it('keeps the stored one when a change is refused', async () => {
    const { body: field } = await draw(boxAt());
    const crossed = polygon(ring([0, 0], [2, 2], [2, 0], [0, 2], [0, 0]));
    const address = `/api/fields/${field.id}`;
    expect((await advisor.patch(address, 1, { boundary: crossed })).status).toBe(400);
    expect((await advisor.get(address)).body).toEqual(field);
  });
});

describe('the field list', () => {
  it('can be narrowed to a farm', async () => {
    const { farm, field } = cooperative.neighbour;
    const { body } = await advisor.get(`/api/fields?farmId=${farm.id}`);
    expect(body.items.map((item: { id: string }) => item.id)).toEqual([field.id]);
    expect(body.items[0]).toMatchObject({ farmName: farm.name, seasonCount: 1, scenarioCount: 0 });
  });

  it('refuses a query it does not know', async () => {
    expect((await advisor.get('/api/fields?farm=x')).status).toBe(400);
    expect((await advisor.get('/api/fields?farmId=%27%20OR%201')).status).toBe(400);
  });
});

describe('the bin', () => {
  it('takes a field out of every list and gives it back whole', async () => {
    const { field, farm } = cooperative.neighbour;
    const address = `/api/fields/${field.id}`;
    expect((await advisor.delete(address, 1)).status).toBe(204);
    expect((await advisor.get(address)).status).toBe(404);
    expect((await advisor.get(`${address}/seasons`)).status).toBe(404);
    expect((await advisor.get(`/api/farms/${farm.id}`)).body.fieldCount).toBe(0);
    const [item] = (await advisor.get('/api/bin')).body.items;
    expect(item).toMatchObject({ kind: 'field', id: field.id, farmName: farm.name });
    const days = (Date.parse(item.keptUntil) - Date.parse(item.deletedAt)) / 86_400_000;
    expect(days).toBe(30);
    const back = await advisor.post(`${address}/restore`, undefined);
    expect(back.status).toBe(200);
    expect(back.body).toMatchObject({ id: field.id, version: 3, seasonCount: 1 });
  });

  it('takes a farm with its fields and gives both back', async () => {
    const { farm, field } = cooperative.neighbour;
    expect((await advisor.delete(`/api/farms/${farm.id}`, 1)).status).toBe(204);
    expect((await advisor.get(`/api/fields/${field.id}`)).status).toBe(404);
    expect((await advisor.post(`/api/farms/${farm.id}/restore`, undefined)).status).toBe(200);
    expect((await advisor.get(`/api/fields/${field.id}`)).status).toBe(200);
  });
});
