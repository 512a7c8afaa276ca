import { existsSync } from 'node:fs';
import path from 'node:path';
import { ReviewPage } from '@furrowlight/shared/contract/reviews';
import Sqlite from 'better-sqlite3';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import { LAYOUT } from './support/plan.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, signedIn, type Cooperative } from './support/world.js';

const BUILT = existsSync(path.resolve(import.meta.dirname, '../dist/runs/run.worker.js'));
const START = new Date('2026-12-01T08:00:00Z');
const DAY = 86_400_000;

let server: TestServer;
let cooperative: Cooperative;
let advisor: Visitor;
let scenarioId: string;
let notRun: string;

const later = (ms: number) => server.setNow(new Date(START.getTime() + ms));

beforeAll(async () => {
  if (!BUILT) return;
  server = await startServer();
  server.setNow(START);
  cooperative = await foundCooperative(server, 'North');
  advisor = await signedIn(server, cooperative, 'advisor');
  const place = { latitude: 48.68, longitude: 12.85, elevationM: 380, utcOffsetHours: 1 };
  const sky = { kind: 'clear-sky', name: 'Sky', ...place };
  const weatherId = (await advisor.post('/api/weather', sky)).body.id;
  const input = { fieldId: cooperative.own.field.id, weatherId, layout: LAYOUT };
  scenarioId = (await advisor.post('/api/scenarios', { ...input, name: 'Rows' })).body.id;
  notRun = (await advisor.post('/api/scenarios', { ...input, name: 'Not run' })).body.id;
  const run = (await advisor.post(`/api/scenarios/${scenarioId}/runs`, undefined)).body;
  while ((await advisor.get(`/api/runs/${run.id}`)).body.status !== 'done') {
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}, 120_000);
beforeEach(async () => {
  if (!BUILT) return;
  later(0);
  advisor = await signedIn(server, cooperative, 'advisor');
});
afterAll(() => server?.close());

async function makeLink(more = {}): Promise<{ id: string; token: string; url: string }> {
  const input = { fieldId: cooperative.own.field.id, scenarioIds: [scenarioId], ...more };
  const { status, body } = await advisor.post('/api/reviews', input);
  expect(status, JSON.stringify(body)).toBe(201);
  return { id: body.review.id, token: body.url.split('#')[1], url: body.url };
}

const enter = (visitor: Visitor, token: string) => visitor.post('/api/review-session', { token });

async function entered(token: string): Promise<Visitor> {
  const visitor = server.visitor();
  expect((await enter(visitor, token)).status).toBe(204);
  return visitor;
}

describe.skipIf(!BUILT)('a review link (needs the built worker)', () => {
  it('opens one page, with frozen numbers, for someone without an account', async () => {
    const { token, url } = await makeLink({ message: 'Have a look, please.' });
    expect(url).toMatch(/^https:\/\/light\.example\.org\/r#[\w-]{43}$/);
    const farmer = await entered(token);
    const { status, body } = await farmer.get('/api/review');
    expect(status).toBe(200);
    const page = ReviewPage.parse(body);
    expect(page).toMatchObject({
      message: 'Have a look, please.',
      farmName: cooperative.own.farm.name,
      advisorName: 'North advisor',
    });
    expect(page.scenarios).toHaveLength(1);
    const shown = (await advisor.get(`/api/scenarios/${scenarioId}/result`)).body;
    expect(page.scenarios[0].inputHash).toBe(shown.inputHash);
    expect(page.scenarios[0].result).toEqual(shown.result);
    expect(JSON.stringify(body)).not.toMatch(/Moosgut|@north\.example/);
  });

  it('opens nothing else', async () => {
    const farmer = await entered((await makeLink()).token);
    const addresses = [
      'session',
      'farms',
      'fields',
      'desk',
      'crops',
      `scenarios/${scenarioId}/result`,
    ];
    for (const address of addresses) {
      expect((await farmer.get(`/api/${address}`)).status, address).toBe(401);
    }
  });

  it('hands out a cookie scripts cannot read, and keeps token and cookie as hashes only', async () => {
    const { token } = await makeLink();
    const visitor = server.visitor();
    const response = await enter(visitor, token);
    const [cookie] = response.headers['set-cookie'] as unknown as string[];
    expect(cookie).toMatch(/^__Host-furrowlight-review=[^;]+; .*HttpOnly; Secure; SameSite=Lax/);
    const db = new Sqlite(path.join(server.dataDir, 'furrowlight.sqlite'), { readonly: true });
    const tables = db.prepare(`SELECT name FROM sqlite_master WHERE type = 'table'`).pluck().all();
    const everything = tables
      .map((name) => JSON.stringify(db.prepare(`SELECT * FROM "${String(name)}"`).all()))
      .join('\n');
    db.close();
    expect(everything).not.toContain(token);
    expect(everything).not.toContain([...visitor.cookies.values()][0]);
  });

  it('keeps the token out of the answer kept for a repeated request', async () => {
    const key = 'one-link-please';
    const input = { fieldId: cooperative.own.field.id, scenarioIds: [scenarioId] };
    const first = await advisor.post('/api/reviews', input, { key });
    const again = await advisor.post('/api/reviews', input, { key });
    expect(again.body).toEqual(first.body);
    const db = new Sqlite(path.join(server.dataDir, 'furrowlight.sqlite'), { readonly: true });
    const kept = JSON.stringify(db.prepare('SELECT * FROM idempotency_keys').all());
    db.close();
    expect(kept).not.toContain(first.body.url.split('#')[1]);
    expect(kept).not.toContain(key);
  });

  it('counts its visits, and looking at it changes nothing else', async () => {
    const { id, token } = await makeLink();
    const farmer = await entered(token);
    await farmer.get('/api/review');
    await farmer.get('/api/review');
    const address = `/api/fields/${cooperative.own.field.id}/reviews`;
    const find = async () =>
      (await advisor.get(address)).body.items.find((item: { id: string }) => item.id === id);
    expect(await find()).toMatchObject({
      views: 1,
      state: 'open',
      lastOpenedAt: START.toISOString(),
    });
  });

  it('ends on its day: 410 with a sentence for the farmer, for token and cookie', async () => {
    const { token } = await makeLink({ expiresInDays: 7 });
    const farmer = await entered(token);
    later(7 * DAY - 1000);
    expect((await farmer.get('/api/review')).status).toBe(200);
    later(7 * DAY);
    expect((await farmer.get('/api/review')).status).toBe(410);
    const refused = await enter(server.visitor(), token);
    expect(refused.status).toBe(410);
    expect(refused.body).toMatchObject({
      code: 'expired',
      detail: expect.stringMatching(/North advisor/),
    });
    expect(refused.headers['set-cookie']).toBeUndefined();
  });

  it('lasts thirty days unless told otherwise, and a half year at most', async () => {
    const { token } = await makeLink();
    later(29 * DAY);
    expect((await enter(server.visitor(), token)).status).toBe(204);
    later(31 * DAY);
    expect((await enter(server.visitor(), token)).status).toBe(410);
    later(0);
    const input = { fieldId: cooperative.own.field.id, scenarioIds: [scenarioId] };
    for (const expiresInDays of [0, 181, 1.5]) {
      const { status, body } = await advisor.post('/api/reviews', { ...input, expiresInDays });
      expect([status, body.errors[0].path]).toEqual([400, 'expiresInDays']);
    }
  });

  it('ends at once when it is revoked', async () => {
    const { id, token } = await makeLink();
    const farmer = await entered(token);
    const { body } = await advisor.post(`/api/reviews/${id}/revoke`, undefined);
    expect(body.state).toBe('revoked');
    expect((await farmer.get('/api/review')).status).toBe(410);
    expect((await enter(server.visitor(), token)).status).toBe(410);
  });

  it('does not tell an unknown token from an ended one by status', async () => {
    const refused = await enter(server.visitor(), 'x'.repeat(43));
    expect([refused.status, refused.body.code]).toEqual([410, 'expired']);
  });

  it('shows only scenarios that have run, of its own field', async () => {
    const fieldId = cooperative.own.field.id;
    const unfinished = { fieldId, scenarioIds: [scenarioId, notRun] };
    const first = await advisor.post('/api/reviews', unfinished);
    expect(first.body.errors[0]).toMatchObject({ path: 'scenarioIds.1' });
    const elsewhere = { fieldId: cooperative.neighbour.field.id, scenarioIds: [scenarioId] };
    const second = await advisor.post('/api/reviews', elsewhere);
    expect(second.body.errors[0]).toMatchObject({ path: 'scenarioIds.0' });
    const five = { fieldId, scenarioIds: Array<string>(5).fill(scenarioId) };
    expect((await advisor.post('/api/reviews', five)).status).toBe(400);
  });

  it('ends with its field', async () => {
    const { token } = await makeLink();
    const farmer = await entered(token);
    const address = `/api/fields/${cooperative.own.field.id}`;
    const { version } = (await advisor.get(address)).body;
    expect((await advisor.delete(address, version)).status).toBe(204);
    expect((await farmer.get('/api/review')).status).toBe(410);
    await advisor.post(`${address}/restore`, undefined);
    expect((await farmer.get('/api/review')).status).toBe(200);
  });

  it('shows on the desk when it was opened and when it ends soon', async () => {
    const { token } = await makeLink({ expiresInDays: 3 });
    await entered(token);
    const { body } = await advisor.get('/api/desk');
    expect(body.counts.openReviews).toBeGreaterThan(0);
    const kinds = new Set(body.items.map((item: { kind: string }) => item.kind));
    for (const kind of ['review-opened', 'review-expiring', 'run-finished']) {
      expect(kinds).toContain(kind);
    }
    const finished = body.items.find((item: { kind: string }) => item.kind === 'run-finished');
    expect(finished).toMatchObject({ scenarioId, fieldId: cooperative.own.field.id });
    const farmer = await signedIn(server, cooperative, 'farmer');
    const own = (await farmer.get('/api/desk')).body;
    expect(own.items.filter((item: { kind: string }) => /run|review/.test(item.kind))).toEqual([]);
  });
});
