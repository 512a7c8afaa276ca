import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { Desk, DeskItem } from '@furrowlight/shared/contract/desk';
import type { Field } from '@furrowlight/shared/contract/fields';
import { Injectable } from '@nestjs/common';
import { DateTime } from 'luxon';
import { Clock } from '../common/clock.js';
import { FieldsService } from '../fields/fields.service.js';
import { SeasonsService } from '../fields/seasons.service.js';
import { FarmsService } from '../farms/farms.service.js';
import { DeskSources } from './desk-sources.js';

const SOON_DAYS = 28;
const MOST_ITEMS = 60;

function itemOf(field: Field, kind: DeskItem['kind'], at: string, text: string): DeskItem {
  const { id, name, farmName } = field;
  return { kind, at, fieldId: id, fieldName: name, farmName, scenarioId: null, text };
}

/** Fields that still miss what a run needs. */
function unfinished(fields: readonly Field[]): DeskItem[] {
  return fields.flatMap((field) => {
    if (field.boundary === null) {
      const text = 'The field has no boundary yet: draw it to lay rows over it.';
      return [itemOf(field, 'field-without-boundary', field.updatedAt, text)];
    }
    if (field.seasonCount > 0) return [];
    const text = 'No crop is entered yet: add one to judge its light.';
    return [itemOf(field, 'field-without-crop', field.updatedAt, text)];
  });
}

@Injectable()
export class DeskService {
  constructor(
    private readonly farms: FarmsService,
    private readonly fields: FieldsService,
    private readonly seasons: SeasonsService,
    private readonly sources: DeskSources,
    private readonly clock: Clock,
  ) {}

  /** What wants the member's attention, the newest first. */
  async of(principal: MemberPrincipal): Promise<Desk> {
    const farms = await this.farms.reachableFacts(principal);
    const fields = await this.fields.list(principal, null);
    const shares = await this.sources.collect(principal, fields);
    const items = [
      ...unfinished(fields),
      ...(await this.startingSoon(principal, fields)),
      ...shares.flatMap((share) => share.items),
    ];
    return {
      counts: {
        farms: farms.size,
        fields: fields.length,
        scenarios: fields.reduce((sum, field) => sum + field.scenarioCount, 0),
        openReviews: shares.reduce((sum, share) => sum + share.openReviews, 0),
      },
      items: items.sort((a, b) => b.at.localeCompare(a.at)).slice(0, MOST_ITEMS),
    };
  }

  private async startingSoon(
    principal: MemberPrincipal,
    fields: readonly Field[],
  ): Promise<DeskItem[]> {
    const today = DateTime.fromJSDate(this.clock.now(), { zone: 'utc' });
    const from = today.toISODate() ?? '';
    const to = today.plus({ days: SOON_DAYS }).toISODate() ?? '';
    const seasons = await this.seasons.sownBetween(principal, from, to);
    const byId = new Map(fields.map((field) => [field.id, field]));
    return seasons.flatMap((season) => {
      const field = byId.get(season.fieldId);
      if (!field) return [];
      const text = `${season.cropName} is to be sown on ${season.sowing}.`;
      return [itemOf(field, 'season-starts', `${season.sowing}T00:00:00.000Z`, text)];
    });
  }
}
