import { createHmac, createSign, generateKeyPairSync } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import { foundCooperative, signedIn, type Cooperative } from './support/world.js';

const SECRET = 'a secret for tests that is long enough to sign with';
const COOKIE = '__Host-furrowlight';

type Json = Record<string, unknown>;

const encode = (value: unknown) => Buffer.from(JSON.stringify(value)).toString('base64url');
const decode = (part: string) => JSON.parse(Buffer.from(part, 'base64url').toString()) as Json;

function signed(header: Json, payload: Json, secret = SECRET, hash = 'sha256'): string {
  const text = `${encode(header)}.${encode(payload)}`;
  return `${text}.${createHmac(hash, secret).update(text).digest('base64url')}`;
}

let server: TestServer;
let cooperative: Cooperative;
let genuine: string;
let header: Json;
let payload: Json;

beforeAll(async () => {
  server = await startServer({ JWT_SECRET: SECRET });
  cooperative = await foundCooperative(server, 'North');
  const visitor = await signedIn(server, cooperative, 'advisor');
  genuine = visitor.cookies.get(COOKIE) ?? '';
  const parts = genuine.split('.');
  header = decode(parts[0]);
  payload = decode(parts[1]);
});
afterAll(() => server.close());

async function statusOf(token: string): Promise<number> {
  const visitor = server.visitor();
  visitor.setCookie(COOKIE, token);
  return (await visitor.get('/api/session')).status;
}

function rs256(): string {
  const { privateKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
  const text = `${encode({ alg: 'RS256', typ: 'JWT' })}.${encode(payload)}`;
  return `${text}.${createSign('RSA-SHA256').update(text).sign(privateKey, 'base64url')}`;
}

const now = Math.floor(Date.now() / 1000);
const FORGERIES: [string, () => string][] = [
  ['no signature', () => genuine.split('.').slice(0, 2).join('.')],
  ['an empty signature', () => `${genuine.split('.').slice(0, 2).join('.')}.`],
  ['alg none', () => `${encode({ ...header, alg: 'none' })}.${encode(payload)}.`],
  ['alg None', () => `${encode({ ...header, alg: 'None' })}.${encode(payload)}.`],
  ['alg none, signed all the same', () => signed({ ...header, alg: 'none' }, payload)],
  ['HS384 with our secret', () => signed({ ...header, alg: 'HS384' }, payload, SECRET, 'sha384')],
  ['HS512 with our secret', () => signed({ ...header, alg: 'HS512' }, payload, SECRET, 'sha512')],
  ['RS256 with a made-up key', rs256],
  ['another secret', () => signed(header, payload, 'another secret, as long as the real one is')],
  ['an empty secret', () => signed(header, payload, '')],
  [
    'a key named in the header',
    () => signed({ ...header, jwk: { kty: 'oct', k: 'AA' } }, payload, 'AA'),
  ],
  [
    'a changed payload under the old signature',
    () => {
      const [head, , signature] = genuine.split('.');
      return `${head}.${encode({ ...payload, gen: 2 })}.${signature}`;
    },
  ],
  ['an expired token', () => signed(header, { ...payload, exp: now - 10 })],
  ['no expiry', () => signed(header, { ...payload, exp: undefined })],
  ['a token from the future', () => signed(header, { ...payload, nbf: now + 3600 })],
  ['another issuer', () => signed(header, { ...payload, iss: 'elsewhere' })],
  ['no issuer', () => signed(header, { ...payload, iss: undefined })],
  ['another audience', () => signed(header, { ...payload, aud: 'furrowlight-letters' })],
  ['no audience', () => signed(header, { ...payload, aud: undefined })],
  ['an unknown session', () => signed(header, { ...payload, jti: 'AAAAAAAAAAAAAAAAAAAA' })],
  ['no session', () => signed(header, { ...payload, jti: undefined })],
  [
    'another member’s session',
    () => signed(header, { ...payload, sub: cooperative.members.admin.memberId }),
  ],
  ['no member', () => signed(header, { ...payload, sub: undefined })],
  ['a later generation', () => signed(header, { ...payload, gen: 7 })],
  ['a generation that is no number', () => signed(header, { ...payload, gen: '1' })],
  ['no generation', () => signed(header, { ...payload, gen: undefined })],
  ['text', () => 'not.a.token'],
  ['nothing at all', () => ''],
  ['a very long text', () => 'a'.repeat(6000)],
];

describe('a forged token', () => {
  it('has a genuine one to compare with', async () => {
    expect(header).toMatchObject({ alg: 'HS256' });
    expect(signed(header, payload)).toBe(genuine);
    expect(await statusOf(genuine)).toBe(200);
  });

  it.each(FORGERIES)('is refused: %s', async (_, forge) => {
    expect(await statusOf(forge())).toBe(401);
  });
});
