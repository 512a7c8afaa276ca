import { readFileSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openApiDocument } from '../src/common/openapi.js';
import { startServer, type TestServer } from './support/server.js';

const FILE = path.resolve(import.meta.dirname, '../../docs/openapi.json');
let server: TestServer;

beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.close());

describe('the OpenAPI document', () => {
  it('is of version 3.1 and names every answer and refusal', () => {
    const document = openApiDocument(server.app);
    expect(document.openapi).toBe('3.1.0');
    const problem = { $ref: '#/components/schemas/Problem' };
    for (const [address, item] of Object.entries(document.paths)) {
      for (const [method, operation] of Object.entries(item)) {
        const what = `${method} ${address}`;
        expect(operation.summary, what).toBeTruthy();
        expect(operation.responses.default.content['application/problem+json'].schema).toEqual(
          problem,
        );
        const good = Object.keys(operation.responses).filter((status) => /^2/.test(status));
        expect(good, what).toHaveLength(1);
        if (['patch', 'put'].includes(method)) expect(operation.requestBody, what).toBeTruthy();
      }
    }
  });

  it('is the committed one (npm run generate)', () => {
    const committed: unknown = JSON.parse(readFileSync(FILE, 'utf8'));
    expect(committed).toEqual(JSON.parse(JSON.stringify(openApiDocument(server.app))));
  });

  it('is served with pages to read it, without signing in', async () => {
    const visitor = server.visitor();
    expect((await visitor.get('/api/docs/openapi.json')).body.info.title).toBe('Furrowlight');
    const page = await visitor.get('/api/docs');
    expect(page.status).toBe(200);
    expect(page.text).not.toMatch(/<script(?![^>]*\bsrc=)[^>]*>\s*\S/);
  });
});

describe('what is public', () => {
  it('says whether the server lives and is ready', async () => {
    const visitor = server.visitor();
    expect((await visitor.get('/api/health/livez')).body).toEqual({ status: 'ok' });
    const ready = await visitor.get('/api/health/readyz');
    expect(ready.body).toMatchObject({ status: 'ok', info: { database: { status: 'up' } } });
  });

  it('shows the demo’s sign-ins only where the demo is alone', async () => {
    const { body } = await server.visitor().get('/api/config');
    expect(body).toMatchObject({ demo: false, demoAccounts: [] });
    expect(body.tileLayers[0].attribution).toMatch(/OpenStreetMap/);
  });
});
