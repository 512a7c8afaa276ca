import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type {
  Weather,
  WeatherInput,
  WeatherPreview,
  WeatherPreviewRequest,
} from '@furrowlight/shared/contract/weather';
import type { HourlyYear } from '@furrowlight/shared/light/weather-year';
import { Injectable } from '@nestjs/common';
import { AuditService } from '../audit/audit.service.js';
import { Clock } from '../common/clock.js';
import { DomainError, notFound } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { Database } from '../database/database.js';
import { buildYear } from './build-year.js';
import { hashYear, packYear, unpackYear } from './hours-blob.js';
import { readWeather, summarise } from './reading/read-weather.js';
import { WeatherYearEntity } from './weather-year.entity.js';

const toContract = (row: WeatherYearEntity): Weather => ({
  id: row.id,
  kind: row.kind,
  name: row.name,
  latitude: row.latitude,
  longitude: row.longitude,
  elevationM: row.elevationM,
  utcOffsetHours: row.utcOffsetHours,
  source: row.source,
  fileName: row.fileName,
  findings: row.findings,
  summary: row.summary,
  createdAt: row.createdAt,
});

/** Weather years of a cooperative. */
@Injectable()
export class WeatherService {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly audit: AuditService,
  ) {}

  /** How a file would be read; stores nothing. */
  preview(input: WeatherPreviewRequest): WeatherPreview {
    const place = { latitude: input.latitude ?? null, longitude: input.longitude ?? null };
    return readWeather(input.content, input.mapping ?? null, place).preview;
  }

  async list({ cooperativeId }: MemberPrincipal): Promise<Weather[]> {
    const rows = await this.database.read.find(WeatherYearEntity, {
      where: { cooperativeId },
      order: { createdAt: 'DESC' },
    });
    return rows.map(toContract);
  }

  /** @throws DomainError not-found for everyone outside the principal's cooperative */
  async get({ cooperativeId }: { cooperativeId: string }, id: string): Promise<Weather> {
    const row = await this.database.read.findOneBy(WeatherYearEntity, { id, cooperativeId });
    if (!row) throw notFound('weather year');
    return toContract(row);
  }

  /** The hours themselves, with the hash that names them. */
  async year(
    { cooperativeId }: { cooperativeId: string },
    id: string,
  ): Promise<{ year: HourlyYear; hash: string }> {
    const row = await this.database.read.findOne(WeatherYearEntity, {
      where: { id, cooperativeId },
      select: { id: true, hours: true, contentHash: true },
    });
    if (!row) throw notFound('weather year');
    return { year: unpackYear(row.hours), hash: row.contentHash };
  }

  /** Store a year; the same hours for the same place are stored once and returned again. */
  async create(principal: MemberPrincipal, input: WeatherInput): Promise<Weather> {
    const { cooperativeId } = principal;
    const { year, findings, source, fileName } = buildYear(input);
    const contentHash = hashYear(year, input.latitude, input.longitude);
    return this.database.write(async (manager) => {
      const same = await manager.findOneBy(WeatherYearEntity, { cooperativeId, contentHash });
      if (same) return toContract(same);
      const row = manager.create(WeatherYearEntity, {
        id: this.ids.next(),
        cooperativeId,
        kind: input.kind,
        name: input.name,
        latitude: input.latitude,
        longitude: input.longitude,
        elevationM: input.elevationM,
        utcOffsetHours: year.utcOffsetHours,
        source,
        fileName,
        findings,
        summary: summarise(year),
        contentHash,
        hours: packYear(year),
        createdAt: this.clock.instant(),
      });
      await manager.insert(WeatherYearEntity, row);
      await this.audit.record(manager, principal, 'created', {
        kind: 'weather',
        id: row.id,
        name: row.name,
      });
      return toContract(row);
    });
  }

  /** @throws DomainError conflict while a scenario rests on it */
  async remove(principal: MemberPrincipal, id: string): Promise<void> {
    const { cooperativeId } = principal;
    const weather = await this.get(principal, id);
    await this.database.write(async (manager) => {
      const users: { name: string }[] = await manager.query(
        'SELECT name FROM scenarios WHERE weather_id = ? AND cooperative_id = ? LIMIT 3',
        [id, cooperativeId],
      );
      if (users.length > 0) {
        const names = users.map(({ name }) => `“${name}”`).join(', ');
        throw new DomainError('conflict', `Scenarios rest on this weather year: ${names}.`);
      }
      await manager.delete(WeatherYearEntity, { id, cooperativeId });
      await this.audit.record(manager, principal, 'removed', {
        kind: 'weather',
        id,
        name: weather.name,
      });
    });
  }
}
