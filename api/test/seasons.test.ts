import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, signedIn, type Cooperative } from './support/world.js';

let server: TestServer;
let cooperative: Cooperative;
let advisor: Visitor;

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  advisor = await signedIn(server, cooperative, 'advisor');
});
afterAll(() => server.close());

// The field's first season: lettuce from 2026-04-01 to 2026-06-10.
const sow = (sowing: string, harvest: string, more = {}) =>
  advisor.post(`/api/fields/${cooperative.own.field.id}/seasons`, {
    cropId: 'spinach',
    sowing,
    harvest,
    canopyHeightM: 0.3,
    ...more,
  });

async function refused(attempt: ReturnType<typeof sow>, path: string, message: RegExp) {
  const { status, body } = await attempt;
  expect(status).toBe(400);
  expect(body.errors[0].path).toBe(path);
  expect(body.errors[0].message).toMatch(message);
}

describe('a crop season', () => {
  it('may begin on the day the one before is harvested', async () => {
    const { status, body } = await sow('2026-06-10', '2026-09-01');
    expect(status).toBe(201);
    expect(body).toMatchObject({ cropName: 'Spinach', version: 1 });
  });

  it('may cross New Year', async () => {
    expect((await sow('2026-10-01', '2027-07-20')).status).toBe(201);
  });

  it('may not stand on ground that another holds, on either side', async () => {
    await refused(sow('2026-03-01', '2026-04-20'), 'harvest', /Lettuce.*2026-04-01 to 2026-06-10/);
    await refused(sow('2026-05-01', '2026-05-20'), 'sowing', /Lettuce/);
    await refused(sow('2025-09-01', '2026-12-01'), 'harvest', /stands on this field/);
  });

  it('ends after it begins, within eighteen months', async () => {
    await refused(sow('2028-05-01', '2028-05-01'), 'harvest', /after sowing/);
    await refused(sow('2028-05-01', '2028-03-01'), 'harvest', /after sowing/);
    await refused(sow('2028-05-01', '2029-11-02'), 'harvest', /18 months/);
    expect((await sow('2028-05-01', '2029-11-01')).status).toBe(201);
  });

  it('names a crop of the table and real dates', async () => {
    await refused(sow('2031-01-01', '2031-02-01', { cropId: 'unobtainium' }), 'cropId', /table/);
    await refused(sow('2031-02-30', '2031-03-01'), 'sowing', /year-month-day/);
    await refused(sow('2031-02-01', '1.3.2031'), 'harvest', /year-month-day/);
  });

  it('is checked against the others when it moves', async () => {
    const { season } = cooperative.own;
    const address = `/api/seasons/${season.id}`;
    const moved = await advisor.patch(address, 1, { harvest: '2026-07-01' });
    expect(moved.status).toBe(400);
    const fine = await advisor.patch(address, 1, { sowing: '2026-03-20' });
    expect(fine.body).toMatchObject({ sowing: '2026-03-20', harvest: '2026-06-10', version: 2 });
  });

  it('is listed with its field, the latest first, and can be removed', async () => {
    const address = `/api/fields/${cooperative.neighbour.field.id}/seasons`;
    const [season] = (await advisor.get(address)).body.items;
    expect(season.id).toBe(cooperative.neighbour.season.id);
    expect((await advisor.delete(`/api/seasons/${season.id}`, 1)).status).toBe(204);
    expect((await advisor.get(address)).body.items).toEqual([]);
    const own = (await advisor.get(`/api/fields/${cooperative.own.field.id}/seasons`)).body.items;
    const sowings = own.map((item: { sowing: string }) => item.sowing);
    expect(sowings).toEqual([...sowings].sort().reverse());
  });
});

describe('the crop table', () => {
  it('keeps blanks as null and normalises the shade class', async () => {
    const crops = (await advisor.get('/api/crops')).body.items as Record<string, unknown>[];
    expect(crops.length).toBeGreaterThan(30);
    const spinach = crops.find((crop) => crop.id === 'spinach');
    expect(spinach).toMatchObject({ dliMinMol: 12, dliGoodLowMol: null, shadeClass: 'tolerant' });
    for (const crop of crops) {
      expect(['benefiting', 'tolerant', 'susceptible', 'unknown']).toContain(crop.shadeClass);
    }
  });
});

describe('the desk', () => {
  it('tells of fields that miss something and of sowings to come', async () => {
    server.setNow(new Date('2026-03-10T08:00:00Z'));
    await advisor.signIn(cooperative.members.advisor.email, 'long light over the furrow');
    await advisor.post('/api/fields', {
      farmId: cooperative.own.farm.id,
      name: 'Only a pin',
      pin: [12.85, 48.68],
    });
    const { body } = await advisor.get('/api/desk');
    expect(body.counts).toEqual({ farms: 2, fields: 3, scenarios: 0, openReviews: 0 });
    const about = (kind: string) =>
      body.items.filter((item: { kind: string }) => item.kind === kind);
    expect(about('field-without-boundary')[0]).toMatchObject({ fieldName: 'Only a pin' });
    expect(about('field-without-crop')[0].fieldId).toBe(cooperative.neighbour.field.id);
    expect(about('season-starts')[0].text).toMatch(/Lettuce.*2026-03-20/);
  });

  it('shows a farmer the own farm only', async () => {
    const farmer = await signedIn(server, cooperative, 'farmer');
    const { body } = await farmer.get('/api/desk');
    expect(body.counts).toMatchObject({ farms: 1, fields: 2 });
    expect(
      body.items.every((item: { farmName: string }) => item.farmName === cooperative.own.farm.name),
    ).toBe(true);
  });
});
