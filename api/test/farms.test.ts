import path from 'node:path';
import Sqlite from 'better-sqlite3';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, signedIn, type Cooperative } from './support/world.js';

let server: TestServer;
let north: Cooperative;
let south: Cooperative;
let admin: Visitor;

beforeAll(async () => {
  server = await startServer();
  north = await foundCooperative(server, 'North');
  south = await foundCooperative(server, 'South');
  admin = await signedIn(server, north, 'admin');
});
afterAll(() => server.close());

describe('a farm', () => {
  it('names its advisor and counts its land', async () => {
    const advisorId = north.members.advisor.memberId;
    const address = `/api/farms/${north.own.farm.id}`;
    const { body } = await admin.patch(address, 1, { advisorId });
    expect(body).toMatchObject({ advisorId, advisorName: 'North advisor', fieldCount: 1 });
    expect(body.areaM2).toBeCloseTo(north.own.field.geometry?.areaM2 ?? 0, 3);
  });

  it('takes only an advisor of its own cooperative', async () => {
    const others = [
      south.members.advisor.memberId,
      north.members.farmer.memberId,
      'AAAAAAAAAAAAAAAAAAAA',
    ];
    for (const advisorId of others) {
      const { status, body } = await admin.post('/api/farms', {
        name: 'F',
        holder: 'H',
        advisorId,
      });
      expect(status).toBe(400);
      expect(body.errors[0].path).toBe('advisorId');
    }
  });

  it('is not entered twice', async () => {
    const farm = { name: 'Doppelhof', holder: 'Twice' };
    expect((await admin.post('/api/farms', farm)).status).toBe(201);
    const { status, body } = await admin.post('/api/farms', farm);
    expect(status).toBe(409);
    expect(body.errors[0].path).toBe('name');
  });

  it('trims what was typed and says at which field something is missing', async () => {
    const { body } = await admin.post('/api/farms', { name: '  Hof  ', holder: 'H ' });
    expect(body).toMatchObject({ name: 'Hof', holder: 'H', notes: '' });
    const bad = await admin.post('/api/farms', { name: '   ' });
    const paths = bad.body.errors.map((error: { path: string }) => error.path);
    expect(paths).toEqual(expect.arrayContaining(['name', 'holder']));
  });
});

describe('the audit log', () => {
  it('tells who did what, newest first, page by page', async () => {
    const { body } = await admin.post('/api/farms', { name: 'Logged', holder: 'H' });
    const first = (await admin.get('/api/audit?size=2')).body;
    expect(first.items[0]).toMatchObject({
      actorName: 'North admin',
      action: 'created',
      subjectKind: 'farm',
      subjectId: body.id,
      subjectName: 'Logged',
    });
    expect(first.brokenAt).toBeNull();
    const second = (await admin.get(`/api/audit?size=2&before=${first.next}`)).body;
    expect(second.items[0].seq).toBeLessThan(first.items[1].seq);
  });

  it('shows a cooperative its own deeds only', async () => {
    const { items } = (await admin.get('/api/audit?size=200')).body;
    expect(items.every((item: { actorName: string }) => item.actorName.startsWith('North'))).toBe(
      true,
    );
  });

  it('writes nothing for a refused change', async () => {
    const before = (await admin.get('/api/audit')).body.items[0].seq;
    await admin.patch(`/api/farms/${north.neighbour.farm.id}`, 99, { place: 'X' });
    await admin.post('/api/farms', { name: 'Hof', holder: 'H' });
    expect((await admin.get('/api/audit')).body.items[0].seq).toBe(before);
  });

  it('notices an entry that was changed behind its back', async () => {
    const file = path.join(server.dataDir, 'furrowlight.sqlite');
    const [entry] = (await admin.get('/api/audit?size=1')).body.items;
    const db = new Sqlite(file);
    db.exec('DROP TRIGGER audit_log_stands');
    db.prepare('UPDATE audit_log SET actor_name = ? WHERE seq = ?').run('Nobody', entry.seq);
    db.close();
    expect((await admin.get('/api/audit')).body.brokenAt).toBe(entry.seq);
  });
});
