import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { Database } from '../src/database/database.js';
import { MemberEntity } from '../src/members/member.entity.js';
import { MembersService } from '../src/members/members.service.js';
import { startServer, type TestServer } from './support/server.js';
import { foundCooperative, PASSWORD, signedIn, type Cooperative } from './support/world.js';

let server: TestServer;
let north: Cooperative;
const MINUTE = 60_000;
const HOUR = 60 * MINUTE;

beforeAll(async () => {
  server = await startServer();
  north = await foundCooperative(server, 'North');
});
afterAll(() => server.close());
beforeEach(() => server.setNow(new Date('2026-12-01T08:00:00Z')));

const later = (ms: number) => server.setNow(new Date(Date.parse('2026-12-01T08:00:00Z') + ms));

describe('signing in', () => {
  it('says who is signed in', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    const { status, body } = await advisor.get('/api/session');
    expect(status).toBe(200);
    expect(body).toEqual({
      memberId: north.members.advisor.memberId,
      name: 'North advisor',
      email: 'advisor@north.example',
      role: 'advisor',
      cooperative: { id: north.id, name: 'North', timeZone: 'Europe/Berlin', demo: false },
      expiresAt: '2026-12-01T20:00:00.000Z',
    });
  });

  it('takes the address in any case', async () => {
    const visitor = server.visitor();
    await visitor.signIn('Advisor@North.Example', PASSWORD);
    expect(visitor.cookies.size).toBe(1);
  });

  it('sets a cookie that scripts and other sites cannot use', async () => {
    const body = { email: north.members.reader.email, password: PASSWORD };
    const response = await server.visitor().post('/api/session', body);
    const [cookie] = response.headers['set-cookie'] as unknown as string[];
    expect(cookie).toMatch(/^__Host-furrowlight=/);
    for (const flag of ['Secure', 'HttpOnly', 'SameSite=Lax', 'Path=/']) {
      expect(cookie.split('; ')).toContain(flag);
    }
    expect(cookie).not.toMatch(/Domain=/i);
    expect(response.headers['strict-transport-security']).toMatch(/max-age=63072000/);
  });

  it('gives unknown address, wrong password and disabled account one answer', async () => {
    const members = server.app.get(MembersService);
    const disabled = await members.create({
      cooperativeId: north.id,
      name: 'Gone',
      email: 'gone@north.example',
      role: 'reader',
      password: PASSWORD,
    });
    await server.app
      .get(Database)
      .write((manager) => manager.update(MemberEntity, { id: disabled.id }, { active: false }));
    await members.create({
      cooperativeId: north.id,
      name: 'Invited',
      email: 'invited@north.example',
      role: 'reader',
      password: null,
    });
    const tries = [
      { email: 'nobody@north.example', password: PASSWORD },
      { email: 'admin@north.example', password: 'wrong' },
      { email: 'gone@north.example', password: PASSWORD },
      { email: 'invited@north.example', password: PASSWORD },
    ];
    const bodies = [];
    for (const attempt of tries) {
      const response = await server.visitor().post('/api/session', attempt);
      expect(response.status).toBe(401);
      expect(response.headers['set-cookie']).toBeUndefined();
      bodies.push({ ...response.body, requestId: '' });
    }
    for (const body of bodies) expect(body).toEqual(bodies[0]);
  });

  it('tells passwords apart that agree in their first 72 bytes', async () => {
    const long = 'furrow '.repeat(12);
    await server.app.get(MembersService).create({
      cooperativeId: north.id,
      name: 'Long',
      email: 'long@north.example',
      role: 'reader',
      password: `${long}A`,
    });
    const wrong = { email: 'long@north.example', password: `${long}B` };
    expect((await server.visitor().post('/api/session', wrong)).status).toBe(401);
    await server.visitor().signIn('long@north.example', `${long}A`);
  });

  it('lets an account rest after ten failures, from that place only', async () => {
    const email = north.members.farmer.email;
    const wrong = { email, password: 'guess' };
    const visitor = server.visitor();
    const statuses: number[] = [];
    for (let i = 0; i < 11; i += 1) {
      // A forged forwarding header must not open a new account of attempts.
      const headers = { 'X-Forwarded-For': `203.0.113.${i}` };
      statuses.push((await visitor.post('/api/session', wrong, { headers })).status);
    }
    expect(statuses).toEqual([...Array<number>(10).fill(401), 429]);
    const right = await visitor.post('/api/session', { email, password: PASSWORD });
    expect(right.status).toBe(429);
    expect(Number(right.headers['retry-after'])).toBeGreaterThan(0);
    await visitor.signIn(north.members.reader.email, PASSWORD);
    later(16 * MINUTE);
    await visitor.signIn(email, PASSWORD);
  });

  it('counts guesses that arrive together', async () => {
    later(HOUR);
    const wrong = { email: north.members.admin.email, password: 'guess' };
    const answers = await Promise.all(
      Array.from({ length: 25 }, () => server.visitor().post('/api/session', wrong)),
    );
    expect(answers.filter((answer) => answer.status === 401)).toHaveLength(10);
    expect(answers.filter((answer) => answer.status === 429)).toHaveLength(15);
    later(2 * HOUR);
  });

  it('ends the session before, when someone signs in anew', async () => {
    const visitor = await signedIn(server, north, 'reader');
    const before = [...visitor.cookies][0];
    await visitor.signIn(north.members.reader.email, PASSWORD);
    const old = server.visitor();
    old.setCookie(...before);
    expect((await old.get('/api/session')).status).toBe(401);
  });
});

describe('a session', () => {
  it('ends on the server when its owner signs out', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    const copy = server.visitor();
    copy.setCookie(...[...advisor.cookies][0]);
    expect((await copy.get('/api/session')).status).toBe(200);
    expect((await advisor.delete('/api/session')).status).toBe(204);
    expect(advisor.cookies.size).toBe(0);
    expect((await copy.get('/api/session')).status).toBe(401);
  });

  it('ends after twelve idle hours', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    later(12 * HOUR + MINUTE);
    expect((await advisor.get('/api/session')).status).toBe(401);
  });

  it('goes on while it is used, but not beyond two weeks', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    for (let hours = 10; hours < 14 * 24; hours += 10) {
      later(hours * HOUR);
      expect((await advisor.get('/api/session')).status, `after ${hours} h`).toBe(200);
    }
    later(14 * 24 * HOUR + MINUTE);
    expect((await advisor.get('/api/session')).status).toBe(401);
  });

  it('changes its token now and then, and ends when an old one comes back', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    const first = [...advisor.cookies][0];
    await advisor.get('/api/session');
    later(20 * MINUTE);
    await advisor.get('/api/session');
    expect([...advisor.cookies][0]).not.toEqual(first);

    const thief = server.visitor();
    thief.setCookie(...first);
    later(20 * MINUTE + 30_000);
    await advisor.get('/api/session');
    expect((await thief.get('/api/session')).status, 'requests under way').toBe(200);
    later(25 * MINUTE);
    expect((await thief.get('/api/session')).status, 'a copy').toBe(401);
    expect((await advisor.get('/api/session')).status, 'its owner too').toBe(401);
  });

  it('survives an answer that was lost with its new token', async () => {
    const advisor = await signedIn(server, north, 'advisor');
    const first = [...advisor.cookies][0];
    await advisor.get('/api/session');
    later(20 * MINUTE);
    await advisor.get('/api/session');
    advisor.setCookie(...first);
    later(40 * MINUTE);
    expect((await advisor.get('/api/session')).status).toBe(200);
    expect([...advisor.cookies][0]).not.toEqual(first);
    expect((await advisor.get('/api/session')).status).toBe(200);
  });

  it('follows the member: a new role counts at once, a disabled account is out', async () => {
    const reader = await signedIn(server, north, 'reader');
    const { memberId } = north.members.reader;
    const database = server.app.get(Database);
    const set = (change: Partial<MemberEntity>) =>
      database.write((manager) => manager.update(MemberEntity, { id: memberId }, change));
    const farm = { name: 'Promoted', holder: 'R' };
    expect((await reader.post('/api/farms', farm)).status).toBe(403);
    await set({ role: 'advisor' });
    expect((await reader.post('/api/farms', farm)).status).toBe(201);
    await set({ role: 'reader' });
    expect((await reader.post('/api/farms', farm)).status).toBe(403);
    await set({ active: false });
    expect((await reader.get('/api/farms')).status).toBe(401);
    await set({ active: true });
  });
});

describe('on plain http', () => {
  it('uses a cookie without the prefix that needs https', async () => {
    const plain = await startServer({ PUBLIC_URL: 'http://192.168.1.20:4180' });
    try {
      const cooperative = await foundCooperative(plain, 'Plain');
      const visitor = await signedIn(plain, cooperative, 'admin');
      expect([...visitor.cookies.keys()]).toEqual(['furrowlight']);
      const { headers } = await visitor.get('/api/session');
      expect(headers['strict-transport-security']).toBeUndefined();
      expect(headers['content-security-policy']).not.toMatch(/upgrade-insecure/);
    } finally {
      await plain.close();
    }
  });
});
