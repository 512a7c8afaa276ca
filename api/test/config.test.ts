import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { ConfigError, loadConfig } from '../src/config/app-config.js';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-config-'));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const load = (settings: Record<string, string> = {}) =>
  loadConfig({ DATA_DIR: folder, ...settings });

describe('settings', () => {
  it('have defaults that fit a first start', () => {
    const config = load();
    expect(config).toMatchObject({ port: 4180, publicUrl: 'http://localhost:4180', demo: true });
    expect(config.secureCookies).toBe(false);
    expect(config.databaseFile).toBe(path.join(folder, 'furrowlight.sqlite'));
  });

  it('take empty variables as unset', () => {
    expect(load({ PORT: '', PUBLIC_URL: '' }).port).toBe(4180);
  });

  it('make cookies secure where the public address is https', () => {
    expect(load({ PUBLIC_URL: 'https://light.example.org/' })).toMatchObject({
      publicUrl: 'https://light.example.org',
      secureCookies: true,
    });
    expect(load({ PUBLIC_URL: 'https://a.example', COOKIE_SECURE: 'false' }).secureCookies).toBe(
      false,
    );
  });

  it('keep one secret beside the data, readable by the server alone', () => {
    const { jwtSecret } = load();
    const file = path.join(folder, 'secret');
    expect(load().jwtSecret).toBe(jwtSecret);
    expect(readFileSync(file, 'utf8')).toBe(jwtSecret);
    expect(statSync(file).mode & 0o777).toBe(0o600);
    expect(jwtSecret.length).toBeGreaterThanOrEqual(64);
  });

  it('refuse a damaged secret', () => {
    writeFileSync(path.join(folder, 'secret'), 'short');
    expect(() => load()).toThrow(/secret is damaged/);
  });

  it.each([
    ['PORT', 'eighty'],
    ['PORT', '70000'],
    ['PUBLIC_URL', 'light.example.org'],
    ['PUBLIC_URL', 'ftp://light.example.org'],
    ['COOKIE_SECURE', 'yes'],
    ['JWT_SECRET', 'too short'],
    ['TILE_LAYERS', 'not json'],
    ['TILE_LAYERS', '[{"name":"x"}]'],
    ['LOG_LEVEL', 'loud'],
    ['DEMO', 'perhaps'],
    ['TRUST_PROXY', '-1'],
  ])('stop the start with the name of the wrong one: %s=%s', (name, value) => {
    expect(() => load({ [name]: value })).toThrow(ConfigError);
    expect(() => load({ [name]: value })).toThrow(new RegExp(`^.*\\n${name} `));
  });

  it('name every wrong one at once, and never their values', () => {
    const secret = 'shh';
    try {
      load({ PORT: 'x', JWT_SECRET: secret });
      expect.unreachable();
    } catch (error) {
      expect(String(error)).toMatch(/PORT/);
      expect(String(error)).toMatch(/JWT_SECRET/);
      expect(String(error)).not.toMatch(secret);
    }
  });
});
