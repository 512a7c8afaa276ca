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

const newFarm = (name: string) => ({ name, holder: 'Anna Lindner' });

describe('changing a row', () => {
  it('names the version in the ETag and takes it back in If-Match', async () => {
    const { farm } = cooperative.neighbour;
    const read = await advisor.get(`/api/farms/${farm.id}`);
    expect(read.headers.etag).toBe(`"${farm.version}"`);
    const changed = await advisor.patch(`/api/farms/${farm.id}`, farm.version, { place: 'Oberau' });
    expect(changed.status).toBe(200);
    expect(changed.body).toMatchObject({ place: 'Oberau', version: farm.version + 1 });
    expect(changed.headers.etag).toBe(`"${farm.version + 1}"`);
  });

  it('asks for the version where it is missing', async () => {
    const { farm } = cooperative.own;
    const response = await advisor.patch(`/api/farms/${farm.id}`, undefined, { place: 'Au' });
    expect(response.status).toBe(428);
    expect(response.body.code).toBe('version-missing');
  });

  it('refuses a stale version and leaves the row alone', async () => {
    const { field } = cooperative.own;
    const address = `/api/fields/${field.id}`;
    const first = await advisor.patch(address, field.version, { notes: 'first' });
    expect(first.status).toBe(200);
    const second = await advisor.patch(address, field.version, { notes: 'second' });
    expect(second.status).toBe(412);
    expect(second.body.code).toBe('stale-version');
    expect((await advisor.get(address)).body.notes).toBe('first');
  });

  it('lets one of many writers from the same version through', async () => {
    const { season } = cooperative.neighbour;
    const answers = await Promise.all(
      Array.from({ length: 12 }, (_, i) =>
        advisor.patch(`/api/seasons/${season.id}`, season.version, { canopyHeightM: i / 10 }),
      ),
    );
    const statuses = answers.map((answer) => answer.status).sort();
    expect(statuses).toEqual([200, ...Array<number>(11).fill(412)]);
  });

  it('refuses unknown keys and values outside their limits, at the field concerned', async () => {
    const { field } = cooperative.own;
    const response = await advisor.patch(`/api/fields/${field.id}`, 2, { slopePercent: 90, x: 1 });
    expect(response.status).toBe(400);
    const paths = response.body.errors.map((error: { path: string }) => error.path);
    expect(paths).toEqual(expect.arrayContaining(['slopePercent', '']));
  });
});

describe('creating with an Idempotency-Key', () => {
  it('has one effect when sent ten times at once, and one answer', async () => {
    const key = 'ten-times-at-once';
    const answers = await Promise.all(
      Array.from({ length: 10 }, () => advisor.post('/api/farms', newFarm('Talmühle'), { key })),
    );
    expect(answers.map((answer) => answer.status)).toEqual(Array<number>(10).fill(201));
    expect(new Set(answers.map((answer) => answer.body.id)).size).toBe(1);
    const farms = (await advisor.get('/api/farms')).body.items as { name: string }[];
    expect(farms.filter((farm) => farm.name === 'Talmühle')).toHaveLength(1);
  });

  it('refuses the key for another request', async () => {
    const key = 'another-request';
    await advisor.post('/api/farms', newFarm('Auhof'), { key });
    const other = await advisor.post('/api/farms', newFarm('Berghof'), { key });
    expect(other.status).toBe(409);
    expect(other.body.code).toBe('key-reused');
  });

  it('keeps keys of different people apart', async () => {
    const key = 'the-same-key';
    const admin = await signedIn(server, cooperative, 'admin');
    const one = await advisor.post('/api/farms', newFarm('Seehof'), { key });
    const two = await admin.post('/api/farms', newFarm('Waldhof'), { key });
    expect([one.status, two.status]).toEqual([201, 201]);
  });

  it('does not remember a failed request', async () => {
    const key = 'failed-at-first';
    const bad = await advisor.post('/api/farms', { name: '', holder: 'X' }, { key });
    const good = await advisor.post('/api/farms', newFarm('Kirchhof'), { key });
    expect([bad.status, good.status]).toEqual([400, 201]);
  });

  it('forgets keys after a day', async () => {
    const key = 'kept-for-a-day';
    const body = newFarm('Tagwerk');
    const now = Date.now();
    await advisor.post('/api/farms', body, { key });
    server.setNow(new Date(now + 11 * 3600_000));
    expect((await advisor.post('/api/farms', body, { key })).status).toBe(201);
    server.setNow(new Date(now + 22 * 3600_000));
    await advisor.get('/api/session');
    server.setNow(new Date(now + 25 * 3600_000));
    const again = await advisor.post('/api/farms', body, { key });
    expect(again.status).toBe(409);
    expect(again.body.code).toBe('conflict');
    server.setNow(new Date());
  });
});
