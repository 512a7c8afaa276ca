import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Run } from '@furrowlight/shared/contract/run';
import { RunResult } from '@furrowlight/shared/contract/result';
import { MODEL_VERSION } from '@furrowlight/shared/run/model-version';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Database } from '../src/database/database.js';
import { RunEntity } from '../src/runs/run.entity.js';
import { startServer, type TestServer } from './support/server.js';
import { LAYOUT } from './support/plan.js';
import type { Visitor } from './support/visitor.js';
import { foundCooperative, PASSWORD, signedIn, type Cooperative } from './support/world.js';

const BUILT = existsSync(path.resolve(import.meta.dirname, '../dist/runs/run.worker.js'));

let server: TestServer;
let cooperative: Cooperative;
let advisor: Visitor;
let weatherId: string;

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  advisor = await signedIn(server, cooperative, 'advisor');
  weatherId = await addWeather(advisor);
});
afterAll(() => server.close());

async function addWeather(visitor: Visitor): Promise<string> {
  const place = { latitude: 48.68, longitude: 12.85, elevationM: 380, utcOffsetHours: 1 };
  const { body } = await visitor.post('/api/weather', { kind: 'clear-sky', name: 'Sky', ...place });
  return body.id;
}

async function addScenario(name: string, more = {}): Promise<string> {
  const fieldId = cooperative.own.field.id;
  const input = { fieldId, name, weatherId, layout: LAYOUT, ...more };
  const { status, body } = await advisor.post('/api/scenarios', input);
  expect(status, JSON.stringify(body)).toBe(201);
  return body.id;
}

const start = (id: string) => advisor.post(`/api/scenarios/${id}/runs`, undefined);

async function finished(visitor: Visitor, runId: string): Promise<Run> {
  const deadline = Date.now() + 60_000;
  for (;;) {
    const { body } = await visitor.get(`/api/runs/${runId}`);
    if (!['queued', 'running'].includes(body.status)) return body;
    if (Date.now() > deadline) throw new Error(`Still ${body.status} after a minute.`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

describe('a scenario', () => {
  it('keeps a layout that can stand, and refuses rows that collide', async () => {
    const layout = { ...LAYOUT, pitchM: 3, collectorWidthM: 3.4, tiltDeg: 10 };
    const input = { fieldId: cooperative.own.field.id, name: 'Tight', layout };
    const { status, body } = await advisor.post('/api/scenarios', input);
    expect(status).toBe(400);
    expect(body.errors[0]).toMatchObject({ path: 'layout.pitchM' });
    expect(body.errors[0].message).toMatch(/collide/);
  });

  it('counts its rows over the boundary', async () => {
    const { body } = await advisor.get(`/api/scenarios/${await addScenario('Counted')}`);
    expect(body.figures.rowCount).toBeGreaterThan(5);
    expect(body.figures.groundCoverRatio).toBeCloseTo(0.34, 6);
    const { moduleAreaM2, kwp, fieldAreaM2 } = body.figures;
    expect(kwp).toBeCloseTo((moduleAreaM2 * LAYOUT.module.powerWm2) / 1000, 6);
    const measured = cooperative.own.field.geometry?.areaM2 ?? 0;
    expect(fieldAreaM2 / measured).toBeCloseTo(1, 4);
  });

  it('does not take weather of others, and does not run without any', async () => {
    const input = { fieldId: cooperative.own.field.id, name: 'X', layout: LAYOUT };
    const foreign = { ...input, weatherId: 'AAAAAAAAAAAAAAAAAAAA' };
    expect((await advisor.post('/api/scenarios', foreign)).body.errors[0].path).toBe('weatherId');
    const { body } = await advisor.post('/api/scenarios', input);
    const run = await start(body.id);
    expect(run.status).toBe(400);
    expect(run.body.errors[0].path).toBe('weatherId');
  });

  it('is renamed, archived and copied', async () => {
    const id = await addScenario('First name');
    const { body } = await advisor.patch(`/api/scenarios/${id}`, 1, {
      name: 'Second',
      archived: true,
    });
    expect(body).toMatchObject({ name: 'Second', archived: true, version: 2 });
    const fieldList = `/api/fields/${cooperative.own.field.id}/scenarios`;
    const names = async (query = '') =>
      (await advisor.get(fieldList + query)).body.items.map((item: { name: string }) => item.name);
    expect(await names()).not.toContain('Second');
    expect(await names('?archived=true')).toContain('Second');
    const copy = await advisor.post(`/api/scenarios/${id}/copy`, { name: 'Third' });
    expect(copy.body).toMatchObject({ name: 'Third', archived: false, version: 1, weatherId });
    expect(copy.body.layout).toEqual(body.layout);
  });
});

describe.skipIf(!BUILT)('a run (needs the built worker)', () => {
  it('freezes its inputs, ends in a result and closes the layout', async () => {
    const id = await addScenario('To be run', { layout: { ...LAYOUT, pitchM: 9 } });
    const begun = await start(id);
    expect(begun.status).toBe(202);
    const run = await finished(advisor, begun.body.id);
    expect(run, run.problem ?? '').toMatchObject({ status: 'done', progress: 1, problem: null });
    const { body } = await advisor.get(`/api/scenarios/${id}/result`);
    expect(body).toMatchObject({ scenarioId: id, runId: run.id, inputHash: run.inputHash });
    const result = RunResult.parse(body.result);
    expect(result.modelVersion).toBe(MODEL_VERSION);
    expect(result.crops.map((crop) => crop.cropId)).toEqual(['lettuce']);
    const { electricity, panelHeat, reflected, cropPar, otherOnCrop } = result.sunSplit.year;
    expect(electricity + panelHeat + reflected + cropPar + otherOnCrop).toBeCloseTo(100, 6);

    const scenario = (await advisor.get(`/api/scenarios/${id}`)).body;
    expect(scenario.frozen.layout.pitchM).toBe(9);
    const closed = await advisor.patch(`/api/scenarios/${id}`, 1, { layout: LAYOUT });
    expect(closed.status).toBe(409);
    expect(closed.body.detail).toMatch(/Copy it/);
    expect((await advisor.patch(`/api/scenarios/${id}`, 1, { notes: 'fine' })).status).toBe(200);
  });

  it('gives its tables as CSV that add up', async () => {
    const id = await addScenario('As a table', { layout: { ...LAYOUT, pitchM: 9 } });
    await finished(advisor, (await start(id)).body.id);
    const { headers, text } = await advisor.get(`/api/scenarios/${id}/result.csv?table=months`);
    expect(headers['content-type']).toMatch(/^text\/csv/);
    expect(headers['content-disposition']).toMatch(/filename\*=UTF-8''As-a-table-months\.csv/);
    const lines = text.trimEnd().split('\r\n');
    expect(lines).toHaveLength(1 + 12);
    expect((await advisor.get(`/api/scenarios/${id}/result.csv?table=secrets`)).status).toBe(400);
  });

  it('of the very same input is done at once', async () => {
    const layout = { ...LAYOUT, pitchM: 11 };
    const first = (await start(await addScenario('Once', { layout }))).body;
    const done = await finished(advisor, first.id);
    const again = (await start(await addScenario('Twice', { layout }))).body;
    expect(again).toMatchObject({ status: 'done', inputHash: done.inputHash });
    const other = (await start(await addScenario('Other', { layout: { ...layout, tiltDeg: 21 } })))
      .body;
    expect(other.inputHash).not.toBe(done.inputHash);
    await finished(advisor, other.id);
  });

  it('is refused a second time while it is under way, and can be cancelled', async () => {
    const id = await addScenario('Stopped', { layout: { ...LAYOUT, pitchM: 12 } });
    const begun = (await start(id)).body;
    const second = await start(id);
    expect(second.status).toBe(409);
    const stopped = Date.now();
    await advisor.post(`/api/runs/${begun.id}/cancel`, undefined);
    const run = await finished(advisor, begun.id);
    expect(run.status).toBe('cancelled');
    expect(Date.now() - stopped).toBeLessThan(30_000);
    expect((await advisor.get(`/api/scenarios/${id}/result`)).status).toBe(404);
    const retried = await finished(advisor, (await start(id)).body.id);
    expect(retried.status).toBe('done');
  });

  it('says what failed and what to do, and the queue goes on', async () => {
    const id = await addScenario('Doomed', { layout: { ...LAYOUT, pitchM: 13 } });
    const begun = (await start(id)).body;
    await server.app
      .get(Database)
      .write((manager) =>
        manager.update(RunEntity, { id: begun.id }, { attempts: 3, status: 'queued' }),
      );
    const run = await finished(advisor, begun.id);
    if (run.status === 'failed') expect(run.problem).toMatch(/run it again/i);
    const next = await addScenario('After it', { layout: { ...LAYOUT, pitchM: 14 } });
    expect((await finished(advisor, (await start(next)).body.id)).status).toBe('done');
  });

  it('survives a restart: what was cut off runs again, what was cut off too often fails', async () => {
    const dataDir = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-restart-'));
    try {
      const before = await startServer({ DATA_DIR: dataDir });
      const coop = await foundCooperative(before, 'Restart');
      const person = await signedIn(before, coop, 'advisor');
      const sky = await addWeather(person);
      const ids: string[] = [];
      for (const pitchM of [8, 9]) {
        const input = {
          fieldId: coop.own.field.id,
          name: `${pitchM} m`,
          weatherId: sky,
          layout: { ...LAYOUT, pitchM },
        };
        const scenario = (await person.post('/api/scenarios', input)).body.id;
        ids.push((await person.post(`/api/scenarios/${scenario}/runs`, undefined)).body.id);
        await finished(person, ids[ids.length - 1]);
      }
      // As a crash leaves them: in work, without a result.
      await before.app.get(Database).write(async (manager) => {
        await manager.query('DELETE FROM results');
        const cutOff = { status: 'running', finishedAt: null, progress: 0.4 } as const;
        await manager.update(RunEntity, { id: ids[0] }, { ...cutOff, attempts: 1 });
        await manager.update(RunEntity, { id: ids[1] }, { ...cutOff, attempts: 3 });
      });
      await before.app.close();

      const after = await startServer({ DATA_DIR: dataDir });
      const same = await after.visitor().signIn(coop.members.advisor.email, PASSWORD);
      expect((await finished(same, ids[0])).status).toBe('done');
      const given = await finished(same, ids[1]);
      expect(given.status).toBe('failed');
      expect(given.problem).toMatch(/cut off several times/);
      await after.app.close();
    } finally {
      rmSync(dataDir, { recursive: true, force: true });
    }
  });
});
