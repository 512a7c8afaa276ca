// Lays the made-up cooperative into an empty data folder, through the product's own services: what
// the demo shows has passed the same checks as anyone's data.
import 'reflect-metadata';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { createAppContext } from '../api/dist/app.js';
import { CooperativesService } from '../api/dist/cooperatives/cooperatives.service.js';
import { FarmsService } from '../api/dist/farms/farms.service.js';
import { FieldsService } from '../api/dist/fields/fields.service.js';
import { SeasonsService } from '../api/dist/fields/seasons.service.js';
import { MembersService } from '../api/dist/members/members.service.js';
import { ReviewsService } from '../api/dist/reviews/reviews.service.js';
import { ScenariosService } from '../api/dist/scenarios/scenarios.service.js';
import { WeatherService } from '../api/dist/weather/weather.service.js';
import { layoutFamilies } from './layouts.mjs';

const PASSWORD = 'furrow-and-light-demo';
const here = import.meta.dirname;
const read = (file) => readFileSync(path.join(here, file), 'utf8');
const say = (text) => process.stdout.write(`${text}\n`);

const app = await createAppContext();
const cooperativeFile = JSON.parse(read('cooperative.json'));
const { features } = JSON.parse(read('fields.geojson'));

const cooperative = await app.get(CooperativesService).create({
  name: cooperativeFile.name,
  timeZone: cooperativeFile.timeZone,
  demo: true,
  demoAccounts: cooperativeFile.members
    .filter(({ key }) => ['admin', 'advisor-1', 'farmer-1'].includes(key))
    .map(({ role, email }) => ({ role, email, password: PASSWORD })),
});

const memberIds = new Map();
for (const { key, name, email, role } of cooperativeFile.members) {
  const member = await app.get(MembersService).create({
    cooperativeId: cooperative.id,
    name,
    email,
    role,
    password: PASSWORD,
  });
  memberIds.set(key, member.id);
}
const advisor = await app.get(MembersService).activePrincipal(memberIds.get('advisor-1'));

const farmIds = new Map();
for (const { key, advisor: advisorKey, ...farm } of cooperativeFile.farms) {
  const holder = cooperativeFile.members.find((member) => member.farm === key);
  const created = await app
    .get(FarmsService)
    .create(
      advisor,
      { ...farm, advisorId: memberIds.get(advisorKey) },
      holder ? memberIds.get(holder.key) : null,
    );
  farmIds.set(key, created.id);
}

const fieldIds = new Map();
for (const { geometry, properties } of features) {
  const { key, farm, seasons, ...field } = properties;
  const created = await app
    .get(FieldsService)
    .create(advisor, { ...field, farmId: farmIds.get(farm), boundary: geometry });
  fieldIds.set(key, created.id);
  for (const season of seasons) await app.get(SeasonsService).create(advisor, created.id, season);
}
say(`${farmIds.size} farms and ${fieldIds.size} fields laid out.`);

const weather = await app.get(WeatherService).create(advisor, {
  kind: 'file',
  name: 'Lindental, typical year',
  fileName: 'lindental-typical-year.csv',
  content: read('weather/lindental-typical-year.csv'),
  mapping: null,
  latitude: 48.62,
  longitude: 12.93,
  elevationM: 350,
});

const scenarios = app.get(ScenariosService);
const runsOf = new Map();
for (const { field, name, notes, layout } of layoutFamilies) {
  const fieldId = fieldIds.get(field);
  const scenario = await scenarios.create(advisor, { fieldId, name, notes, weatherId: weather.id, layout });
  const run = await scenarios.run(advisor, scenario.id);
  runsOf.set(run.id, { fieldId, scenarioId: scenario.id });
}
say(`${runsOf.size} scenarios are being run over a year of light ...`);
for (const id of runsOf.keys()) {
  for (;;) {
    const run = await scenarios.getRun(advisor, id);
    if (run.status === 'done') break;
    if (run.status === 'failed') throw new Error(`A demo run failed: ${run.problem}`);
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
}

const first = [...runsOf.values()].filter(({ fieldId }) => fieldId === fieldIds.get('field-01'));
await app.get(ReviewsService).create(advisor, {
  fieldId: fieldIds.get('field-01'),
  scenarioIds: first.slice(0, 2).map(({ scenarioId }) => scenarioId),
  message: 'Dear Anna, these are the two layouts we walked through on your field. Have a look at the light for your wheat, and tell me what you think.',
  expiresInDays: 60,
});
say('The demo is ready.');
await app.close();
