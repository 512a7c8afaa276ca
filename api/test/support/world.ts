import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Farm } from '@furrowlight/shared/contract/farms';
import type { Boundary, Field, FieldSeason } from '@furrowlight/shared/contract/fields';
import type { Role } from '@furrowlight/shared/contract/session';
import { CooperativesService } from '../../src/cooperatives/cooperatives.service.js';
import { FarmsService } from '../../src/farms/farms.service.js';
import { FieldsService } from '../../src/fields/fields.service.js';
import { SeasonsService } from '../../src/fields/seasons.service.js';
import { MembersService } from '../../src/members/members.service.js';
import type { TestServer } from './server.js';
import type { Visitor } from './visitor.js';

export const ROLES: readonly Role[] = ['admin', 'advisor', 'farmer', 'reader'];
export const PASSWORD = 'long light over the furrow';

/** A four-sided field, about 200 m by 110 m, at a place in a made-up valley. */
export function boxAt(longitude = 12.85, latitude = 48.68, size = 0.0015): Boundary {
  const [w, s, e, n] = [longitude, latitude, longitude + size, latitude + size];
  return {
    type: 'Polygon',
    coordinates: [
      [
        [w, s],
        [e, s],
        [e, n],
        [w, n],
        [w, s],
      ],
    ],
  };
}

/** A piece of land with everything that hangs on it. */
export interface Land {
  farm: Farm;
  field: Field;
  season: FieldSeason;
}

/** One cooperative: a member of each role, the farmer's own farm and a neighbour's. */
export interface Cooperative {
  id: string;
  name: string;
  members: Record<Role, MemberPrincipal & { email: string }>;
  own: Land;
  neighbour: Land;
}

async function layLand(
  server: TestServer,
  admin: MemberPrincipal,
  name: string,
  farmer: MemberPrincipal | null,
): Promise<Land> {
  const { app } = server;
  const farm = await app
    .get(FarmsService)
    .create(admin, { name, holder: `Holder of ${name}` }, farmer?.memberId ?? null);
  const boundary = boxAt();
  const field = await app.get(FieldsService).create(admin, {
    farmId: farm.id,
    name: `${name} home field`,
    pin: [12.8507, 48.6807],
    boundary,
  });
  const season = await app.get(SeasonsService).create(admin, field.id, {
    cropId: 'lettuce',
    sowing: '2026-04-01',
    harvest: '2026-06-10',
    canopyHeightM: 0.3,
  });
  return { farm, field, season };
}

export async function foundCooperative(server: TestServer, name: string): Promise<Cooperative> {
  const { app } = server;
  const { id } = await app
    .get(CooperativesService)
    .create({ name, timeZone: 'Europe/Berlin', demo: false });
  const members = app.get(MembersService);
  const join = async (role: Role) => {
    const email = `${role}@${name.toLowerCase()}.example`;
    const made = { cooperativeId: id, name: `${name} ${role}`, email, role, password: PASSWORD };
    const principal = await members.activePrincipal((await members.create(made)).id);
    if (!principal) throw new Error('A new member is active.');
    return { ...principal, email };
  };
  const people = {
    admin: await join('admin'),
    advisor: await join('advisor'),
    farmer: await join('farmer'),
    reader: await join('reader'),
  };
  return {
    id,
    name,
    members: people,
    own: await layLand(server, people.admin, `${name} Birkenhof`, people.farmer),
    neighbour: await layLand(server, people.admin, `${name} Moosgut`, null),
  };
}

/** A signed-in member of a cooperative. */
export function signedIn(
  server: TestServer,
  cooperative: Cooperative,
  role: Role,
): Promise<Visitor> {
  return server.visitor().signIn(cooperative.members[role].email, PASSWORD);
}
