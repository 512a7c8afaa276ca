import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { PUBLIC_URL, startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, signedIn } from './support/world.js';

let server: TestServer;
let admin: Visitor;

beforeAll(async () => {
  server = await startServer();
  admin = await signedIn(server, await foundCooperative(server, 'North'), 'admin');
});
afterAll(() => server.close());

const farm = (name: string) => ({ name, holder: 'H' });

describe('a changing request', () => {
  it.each([
    ['another site', { Origin: 'https://evil.example' }],
    ['a sandboxed frame', { Origin: 'null' }],
    ['a look-alike host', { Origin: `${PUBLIC_URL}.evil.example` }],
    ['another scheme', { Origin: PUBLIC_URL.replace('https', 'http') }],
    ['nowhere', { Origin: '' }],
    ['cross-site by Fetch Metadata', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a sibling domain', { 'Sec-Fetch-Site': 'same-site' }],
  ])('from %s is refused and changes nothing', async (name, headers) => {
    const response = await admin.post('/api/farms', farm(name), { headers });
    expect(response.status).toBe(403);
    expect(response.body.code).toBe('cross-site');
    const farms = (await admin.get('/api/farms')).body.items as { name: string }[];
    expect(farms.map((item) => item.name)).not.toContain(name);
  });

  it.each(['PATCH', 'DELETE', 'PUT', 'POST'])(
    '%s is held to it on every address',
    async (method) => {
      const headers = { 'Sec-Fetch-Site': 'cross-site' };
      const response = await admin.send(method, '/api/anything', { headers });
      expect(response.status).toBe(403);
    },
  );

  it.each([
    ['by Origin', {}],
    ['by Fetch Metadata', { 'Sec-Fetch-Site': 'same-origin', Origin: 'http://localhost:5180' }],
  ])('from our own pages is taken %s', async (name, headers) => {
    expect((await admin.post('/api/farms', farm(name), { headers })).status).toBe(201);
  });

  it.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x'])(
    'must be JSON, not %s, which a form of another site could send',
    async (type) => {
      const response = await admin.send('POST', '/api/farms', {
        body: JSON.stringify(farm('form')),
        headers: { 'Content-Type': type },
      });
      expect(response.status).toBe(415);
      expect(response.body.code).toBe('not-json');
    },
  );

  it('cannot sign someone else in from another site', async () => {
    const body = { email: 'admin@north.example', password: 'x' };
    const headers = { Origin: 'https://evil.example' };
    expect((await server.visitor().post('/api/session', body, { headers })).status).toBe(403);
  });
});

describe('reading', () => {
  it('changes nothing: no GET writes to the audit log', async () => {
    const before = (await admin.get('/api/audit')).body.items[0].seq;
    for (const path of [
      'farms',
      'fields',
      'crops',
      'desk',
      'bin',
      'members',
      'session',
      'config',
    ]) {
      expect((await admin.get(`/api/${path}`)).status).toBe(200);
    }
    expect((await admin.get('/api/audit')).body.items[0].seq).toBe(before);
  });
});
