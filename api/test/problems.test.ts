import { Problem } from '@furrowlight/shared/contract/common';
import type { Response } from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { toDomainError } from '../src/common/problem-filter.js';
import { Database } from '../src/database/database.js';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, PASSWORD, signedIn, type Cooperative } from './support/world.js';

let server: TestServer;
let cooperative: Cooperative;
let admin: Visitor;

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  admin = await signedIn(server, cooperative, 'admin');
});
afterAll(() => server.close());

/** The answer is problem details with the request's id, and tells nothing of our insides. */
function problemOf(response: Response, status: number, code: string): Problem {
  expect(response.status, response.text).toBe(status);
  expect(response.headers['content-type']).toMatch(/^application\/problem\+json/);
  const problem = Problem.parse(response.body);
  expect(problem).toMatchObject({ status, code });
  expect(problem.requestId).toBe(response.headers['x-request-id']);
  expect(response.text).not.toMatch(/SQLITE|node_modules|\.ts|\.js|at \w+ \(/);
  return problem;
}

describe('every refusal is a problem with a request id', () => {
  it('for JSON that cannot be read', async () => {
    const headers = { 'Content-Type': 'application/json' };
    const broken = await admin.send('POST', '/api/farms', { body: '{"name":', headers });
    problemOf(broken, 400, 'malformed-request');
  });

  it('for an address that does not exist', async () => {
    problemOf(await admin.get('/api/nothing/here'), 404, 'not-found');
    problemOf(await admin.send('PUT', '/api/farms', { body: {} }), 404, 'not-found');
  });

  it('for whoever is not signed in', async () => {
    problemOf(await server.visitor().get('/api/farms'), 401, 'not-signed-in');
  });

  it('for a body beyond the limit, which is larger for weather files', async () => {
    const body = { name: 'x'.repeat(1_100_000), holder: 'H' };
    problemOf(await admin.post('/api/farms', body), 413, 'too-large');
    const weather = await admin.post('/api/weather', body);
    problemOf(weather, 400, 'invalid-input');
  });

  it('for a compressed body that is none', async () => {
    const headers = { 'Content-Type': 'application/json', 'Content-Encoding': 'gzip' };
    const response = await admin.send('POST', '/api/farms', { body: '{}', headers });
    problemOf(response, 400, 'malformed-request');
  });

  it('for a character set we do not speak', async () => {
    const headers = { 'Content-Type': 'application/json; charset=ebcdic' };
    const response = await admin.send('POST', '/api/farms', { body: '{}', headers });
    problemOf(response, 415, 'not-json');
  });

  it.each(['%00', '%ff', '..%2f..', "' OR 1=1", 'a'.repeat(3000), '__proto__', 'null'])(
    'for the row id %s',
    async (id) => {
      const response = await admin.get(`/api/fields/${encodeURI(decodeSafe(id))}`);
      expect([400, 404]).toContain(response.status);
      Problem.parse(response.body);
    },
  );

  it('and bodies that are no objects', async () => {
    for (const body of ['[]', '"text"', 'null', '7', '{"__proto__":{"admin":true}}']) {
      const headers = { 'Content-Type': 'application/json' };
      const response = await admin.send('POST', '/api/farms', { body, headers });
      expect(response.status, body).toBe(400);
      Problem.parse(response.body);
    }
  });
});

function decodeSafe(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}

describe('a database that fails', () => {
  const fault = (code: string) => Object.assign(new Error(`${code}: /secret/path`), { code });

  it('is never taken for a wrong password or a missing session', async () => {
    const database = server.app.get(Database);
    const write = database.write.bind(database);
    database.write = () => Promise.reject(fault('SQLITE_IOERR_WRITE'));
    try {
      const { email } = cooperative.members.admin;
      const response = await server.visitor().post('/api/session', { email, password: PASSWORD });
      problemOf(response, 503, 'database-unavailable');
      expect(response.headers['retry-after']).toBe('5');
      expect(response.headers['set-cookie']).toBeUndefined();
      problemOf(
        await admin.post('/api/farms', { name: 'F', holder: 'H' }),
        503,
        'database-unavailable',
      );
    } finally {
      database.write = write;
    }
  });

  it.each([
    ['SQLITE_BUSY', 'database-unavailable'],
    ['SQLITE_CORRUPT', 'database-unavailable'],
    ['SQLITE_READONLY', 'database-unavailable'],
    ['SQLITE_FULL', 'storage-full'],
    ['SQLITE_CONSTRAINT_FOREIGNKEY', 'unexpected'],
  ])('%s is %s', (code, problem) => {
    expect(toDomainError(fault(code)).code).toBe(problem);
    const wrapped = Object.assign(new Error('Query failed'), { driverError: fault(code) });
    expect(toDomainError(wrapped).code).toBe(problem);
  });

  it('hides what we did not foresee', () => {
    expect(toDomainError(new TypeError('x is undefined')).message).not.toMatch(/undefined/);
    expect(toDomainError(null).code).toBe('unexpected');
  });
});

describe('headers', () => {
  it('allow no inline script and no framing, and keep answers private', async () => {
    const { headers } = await admin.get('/api/session');
    const policy = headers['content-security-policy'];
    expect(policy).toMatch(/script-src 'self';/);
    expect(policy).toMatch(/frame-ancestors 'none'/);
    expect(policy).toMatch(/object-src 'none'/);
    expect(policy).toMatch(/img-src 'self' data: blob: https:\/\/tile\.openstreetmap\.org/);
    expect(headers['cache-control']).toBe('private, no-store');
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
  });
});

describe('the pages', () => {
  it('are one page for every address of the app, asked for anew each time', async () => {
    for (const address of ['/', '/fields', '/fields/abc/scenarios', '/r']) {
      const response = await server.visitor().get(address);
      expect(response.status).toBe(200);
      expect(response.text).toMatch('<title>app</title>');
      expect(response.headers['cache-control']).toBe('no-cache');
    }
  });

  it('have assets that are kept, and a missing asset is never a page', async () => {
    const asset = await server.visitor().get('/assets/app-1a2b.js');
    expect(asset.headers['cache-control']).toMatch(/immutable/);
    const missing = await server.visitor().get('/assets/app-0000.js');
    expect(missing.status).toBe(404);
    expect(missing.text).not.toMatch('<title>');
  });

  it('do not lead out of their folder', async () => {
    for (const address of ['/..%2fsecret', '/assets/..%2f..%2fsecret', '/%2e%2e/secret']) {
      const response = await server.visitor().get(address);
      expect(response.text).not.toMatch(/^[\w-]{40,}/);
    }
  });
});
