import { http, HttpResponse } from 'msw';
import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { server } from '../testing/server';
import { ApiProblem, call, onSignedOut, request } from './api';

const Thing = z.object({ id: z.string() });

describe('api', () => {
  it('sends JSON with the row version and the idempotency key', async () => {
    let seen: Record<string, string | null> = {};
    server.use(
      http.patch('*/api/things/1', async ({ request: sent }) => {
        seen = {
          match: sent.headers.get('if-match'),
          key: sent.headers.get('idempotency-key'),
          type: sent.headers.get('content-type'),
          body: await sent.text(),
        };
        return HttpResponse.json({ id: '1' });
      }),
    );
    await request(Thing, '/api/things/1', {
      method: 'PATCH',
      body: { name: 'x' },
      version: 7,
      idempotencyKey: 'k',
    });
    expect(seen).toEqual({
      match: '"7"',
      key: 'k',
      type: 'application/json',
      body: '{"name":"x"}',
    });
  });

  it('turns problem details into an error with messages at their fields', async () => {
    server.use(
      http.post('*/api/things', () =>
        HttpResponse.json(
          {
            type: 'about:blank',
            title: 'Not accepted',
            status: 422,
            code: 'invalid',
            detail: 'Two fields are not right.',
            requestId: 'req-1',
            errors: [{ path: 'boundary.coordinates', message: 'Sides 1 and 3 cross.' }],
          },
          { status: 422 },
        ),
      ),
    );
    const error = await call('/api/things', { method: 'POST', body: {} }).catch((e: unknown) => e);
    expect(error).toBeInstanceOf(ApiProblem);
    expect(error).toMatchObject({
      status: 422,
      code: 'invalid',
      requestId: 'req-1',
      fieldErrors: { 'boundary.coordinates': 'Sides 1 and 3 cross.' },
    });
  });

  it('survives an answer that is no problem document, and no answer at all', async () => {
    server.use(
      http.get('*/api/broken', () => new HttpResponse('<h1>Bad gateway</h1>', { status: 502 })),
      http.get('*/api/gone', () => HttpResponse.error()),
    );
    await expect(call('/api/broken')).rejects.toMatchObject({
      status: 502,
      code: 'unexpected-answer',
    });
    await expect(call('/api/gone')).rejects.toMatchObject({ status: 0, code: 'offline' });
  });

  it('refuses an answer that does not fit the contract instead of passing it on', async () => {
    server.use(http.get('*/api/things/1', () => HttpResponse.json({ id: 1 })));
    await expect(request(Thing, '/api/things/1')).rejects.toMatchObject({
      code: 'contract-mismatch',
    });
  });

  it('tells everyone when nobody is signed in any more', async () => {
    server.use(http.get('*/api/things', () => new HttpResponse(null, { status: 401 })));
    const told = vi.fn();
    const stop = onSignedOut(told);
    await call('/api/things').catch(() => undefined);
    stop();
    await call('/api/things').catch(() => undefined);
    expect(told).toHaveBeenCalledTimes(1);
  });
});
