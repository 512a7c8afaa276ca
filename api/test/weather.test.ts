import type { WeatherFinding, WeatherPreview } from '@furrowlight/shared/contract/weather';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startServer, type TestServer } from './support/server.js';
import type { Visitor } from './support/visitor.js';
import { asEpw, changed, demoLines, PLACE } from './support/weather-files.js';
import { foundCooperative, signedIn, type Cooperative } from './support/world.js';
import { LAYOUT } from './support/plan.js';

let server: TestServer;
let cooperative: Cooperative;
let advisor: Visitor;

beforeAll(async () => {
  server = await startServer();
  cooperative = await foundCooperative(server, 'North');
  advisor = await signedIn(server, cooperative, 'advisor');
});
afterAll(() => server.close());

const { latitude, longitude } = PLACE;

async function preview(content: string, more = {}): Promise<WeatherPreview> {
  const body = { fileName: 'year.csv', content, latitude, longitude, ...more };
  const response = await advisor.post('/api/weather/preview', body);
  expect(response.status, response.text).toBe(200);
  return response.body;
}

const refusals = (read: WeatherPreview): WeatherFinding[] =>
  read.findings.filter((finding) => finding.severity === 'refuse');

/** The mapping the reader guesses for the demo file, ready to be changed. */
const guessed = async () => (await preview(demoLines().join('\n'))).mapping;

describe('reading a weather file', () => {
  it('guesses columns, units, decimal comma and clock, and shows sums to check', async () => {
    const read = await preview(demoLines().join('\n'));
    expect(read.mapping).toMatchObject({ delimiter: ';', decimal: ',', stamp: 'ending' });
    expect(refusals(read)).toEqual([]);
    expect(read.summary).toMatchObject({ hours: 8760, year: 2025 });
    // The file's own column, added up without the reader.
    const sum = demoLines()
      .slice(2)
      .reduce((total, line) => total + Number(line.split(';')[2]), 0);
    expect(read.summary?.ghiKwhM2).toBeCloseTo(sum / 1000, 6);
  });

  it('reads the same year from EPW', async () => {
    const csv = await preview(demoLines().join('\n'));
    const epw = await preview(asEpw(), { latitude: null, longitude: null });
    expect(epw).toMatchObject({ format: 'epw', latitude, longitude, utcOffsetHours: 1 });
    expect(refusals(epw)).toEqual([]);
    expect(epw.summary?.ghiKwhM2).toBeCloseTo(csv.summary?.ghiKwhM2 ?? 0, 6);
    expect(epw.summary?.monthlyMjM2[5]).toBeCloseTo(csv.summary?.monthlyMjM2[5] ?? 0, 6);
  });

  it('refuses a file that is cut off, and says from where on hours are missing', async () => {
    const read = await preview(
      demoLines()
        .slice(0, 2 + 24 * 200)
        .join('\n'),
    );
    expect(read.summary).toBeNull();
    expect(refusals(read).length).toBeGreaterThan(0);
  });

  it('fills an hour or two and says in which line, refuses a missing day', async () => {
    const noon = 24 * 150 + 12;
    const short = await preview(changed((cells, hour) => (hour === noon ? null : cells)));
    expect(refusals(short)).toEqual([]);
    const filled = short.findings.find((finding) => finding.code === 'filled-ghi');
    expect(filled?.rows[0]).toBe(noon + 2);
    const long = await preview(
      changed((cells, hour) => (hour >= noon && hour < noon + 24 ? null : cells)),
    );
    expect(refusals(long)[0].message).toMatch(/24 hours are missing from 05-31 12:00/);
  });

  it('refuses hours that appear twice, with their lines', async () => {
    const lines = demoLines();
    lines.splice(500, 0, lines[499]);
    const [finding] = refusals(await preview(lines.join('\n')));
    expect(finding).toMatchObject({ code: 'duplicate-hours', rows: [501] });
  });

  it('notices a wrong unit and names the right one', async () => {
    const kilojoules = changed((cells) =>
      cells.map((cell, i) =>
        i >= 2 && i <= 4 ? (Number(cell) * 3.6).toFixed(1).replace('.', ',') : cell,
      ),
    );
    const [finding] = refusals(await preview(kilojoules, { mapping: await guessed() }));
    expect(finding.message).toMatch(/looks like kJ\/m2/);
  });

  it('notices stamps read at the wrong end of their hours', async () => {
    const mapping = await guessed();
    const right = await preview(demoLines().join('\n'), { mapping });
    const wrong = await preview(demoLines().join('\n'), {
      mapping: { ...mapping, utcOffsetHours: 3 },
    });
    const shifted = (read: WeatherPreview) =>
      read.findings.some(({ code }) => code === 'clock-shift');
    expect([shifted(right), shifted(wrong)]).toEqual([false, true]);
  });

  it('refuses impossible light by the physical limits', async () => {
    const negative = changed((cells, hour) =>
      cells.map((cell, i) => (i === 2 && hour === 24 * 170 + 12 ? '-400' : cell)),
    );
    expect(refusals(await preview(negative))[0].code).toBe('negative-ghi');
  });

  it.each([
    ['a picture', Buffer.from([137, 80, 78, 71, 13, 10, 26, 10, 0, 0, 0, 13]).toString('latin1')],
    ['a sentence', 'Dear advisor, please find attached the weather.'],
    ['a web page', '<!doctype html><html><body>503 Service Unavailable</body></html>'],
    ['numbers without time', '1;2;3\n4;5;6\n7;8;9'],
    ['only a header', 'date;time;global W/m2'],
    ['an EPW header alone', 'LOCATION,X,-,-,-,0,48,12,1,300'],
    ['open quotes', '"date;time\n"01.01.2025;"1'],
    ['many commas', ','.repeat(5000)],
    ['formulas', '=cmd|calc;=1+1\n=2;=3'],
  ])('refuses %s with findings, never with a server error', async (_, content) => {
    const body = { fileName: 'x', content, latitude, longitude };
    const response = await advisor.post('/api/weather/preview', body);
    expect([200, 400], response.text).toContain(response.status);
    if (response.status === 200) {
      expect(response.body.summary).toBeNull();
      expect(refusals(response.body).length).toBeGreaterThan(0);
    }
    const upload = { kind: 'file', name: 'X', ...body, ...PLACE };
    expect((await advisor.post('/api/weather', upload)).status).toBe(400);
  });

  it('refuses an empty file and a file beyond the limit', async () => {
    const empty = await advisor.post('/api/weather/preview', { fileName: 'x', content: '' });
    expect(empty.body.errors[0].message).toMatch(/empty/);
    const huge = { fileName: 'x', content: 'x'.repeat(12_000_001) };
    const large = await advisor.post('/api/weather/preview', huge);
    expect(large.status).toBe(400);
    expect(large.body.errors[0].path).toBe('content');
  });
});

describe('a stored weather year', () => {
  const upload = (name: string) => ({
    kind: 'file',
    name,
    fileName: 'lindental.csv',
    content: demoLines().join('\n'),
    ...PLACE,
  });

  it('is kept once per place, and gives its hours back', async () => {
    const first = await advisor.post('/api/weather', upload('Lindental'));
    expect(first.status, first.text).toBe(201);
    const again = await advisor.post('/api/weather', upload('Lindental again'));
    expect(again.body.id).toBe(first.body.id);
    const { body } = await advisor.get(`/api/weather/${first.body.id}/year`);
    expect(body.ghi).toHaveLength(8760);
    const noon = demoLines()[2 + 24 * 171 + 11].split(';');
    expect(body.ghi[24 * 171 + 11]).toBeCloseTo(Number(noon[2]), 9);
  });

  it('can be made from twelve monthly means, whose radiation it keeps', async () => {
    const monthlyMjM2 = [3.5, 6, 10, 15, 18, 20, 19.5, 17, 12, 7, 4, 2.8];
    const climate = {
      kind: 'climate',
      name: 'From a table',
      ...PLACE,
      utcOffsetHours: 1,
      monthlyMjM2,
      monthlyMinC: [-4, -4, 0, 3, 8, 11, 13, 13, 9, 5, 1, -2],
      monthlyMaxC: [2, 4, 9, 14, 19, 22, 24, 24, 19, 13, 6, 3],
      source: 'typed in',
    };
    const { status, body } = await advisor.post('/api/weather', climate);
    expect(status).toBe(201);
    body.summary.monthlyMjM2.forEach((value: number, month: number) => {
      expect(value / monthlyMjM2[month], `month ${month + 1}`).toBeCloseTo(1, 2);
    });
  });

  it('of a clear sky is brighter than the real one', async () => {
    const sky = { kind: 'clear-sky', name: 'Clear', ...PLACE, utcOffsetHours: 1 };
    const { body } = await advisor.post('/api/weather', sky);
    const real = (await advisor.get('/api/weather')).body.items.find(
      (item: { kind: string }) => item.kind === 'file',
    );
    expect(body.summary.ghiKwhM2).toBeGreaterThan(real.summary.ghiKwhM2);
    expect(body.summary.ghiKwhM2).toBeLessThan(2600);
  });

  it('stays as long as a scenario rests on it', async () => {
    const sky = { kind: 'clear-sky', name: 'Used', ...PLACE, latitude: 48.7, utcOffsetHours: 1 };
    const weatherId = (await advisor.post('/api/weather', sky)).body.id;
    const scenario = {
      fieldId: cooperative.own.field.id,
      name: 'On it',
      weatherId,
      layout: LAYOUT,
    };
    expect((await advisor.post('/api/scenarios', scenario)).status).toBe(201);
    const refused = await advisor.delete(`/api/weather/${weatherId}`);
    expect(refused.status).toBe(409);
    expect(refused.body.detail).toMatch(/On it/);
  });
});
