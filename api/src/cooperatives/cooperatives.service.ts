import type { ClientConfig } from '@furrowlight/shared/contract/config';
import type { Session } from '@furrowlight/shared/contract/session';
import { Injectable } from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { notFound } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { CooperativeEntity } from './cooperative.entity.js';

export interface NewCooperative {
  name: string;
  /** IANA zone of the office; fields have their own. */
  timeZone: string;
  demo: boolean;
  /** Sign-ins shown to visitors of a demo server; empty otherwise. */
  demoAccounts?: ClientConfig['demoAccounts'];
}

export type Cooperative = Session['cooperative'];

const toContract = ({ id, name, timeZone, demo }: CooperativeEntity): Cooperative => ({
  id,
  name,
  timeZone,
  demo,
});

@Injectable()
export class CooperativesService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
  ) {}

  /** For the seed and the first run. */
  async create(input: NewCooperative): Promise<Cooperative> {
    return this.database.write(async (manager) => {
      const row = manager.create(CooperativeEntity, {
        id: this.ids.next(),
        name: input.name,
        timeZone: input.timeZone,
        demo: input.demo,
        demoAccounts: input.demo ? (input.demoAccounts ?? []) : [],
        createdAt: this.clock.instant(),
      });
      await manager.insert(CooperativeEntity, row);
      return toContract(row);
    });
  }

  async get(id: string): Promise<Cooperative> {
    const row = await this.database.read.findOneBy(CooperativeEntity, { id });
    if (!row) throw notFound('cooperative');
    return toContract(row);
  }

  /** Sign-ins of the demo; empty unless the demo cooperative is the server's only one. */
  async demoAccounts(): Promise<ClientConfig['demoAccounts']> {
    const rows = await this.database.read.find(CooperativeEntity, { take: 2 });
    return rows.length === 1 && rows[0].demo ? rows[0].demoAccounts : [];
  }
}
