import { holds, type MemberPrincipal } from '@furrowlight/shared/access/may';
import type { DeskItem } from '@furrowlight/shared/contract/desk';
import type { Field } from '@furrowlight/shared/contract/fields';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import { IsNull, MoreThan } from 'typeorm';
import { Clock } from '../common/clock.js';
import { Database } from '../database/database.js';
import { DeskSources, type DeskShare } from '../desk/desk-sources.js';
import { ReviewEntity } from './review.entity.js';

const DAY_MS = 24 * 3600_000;
const TOLD_FOR_MS = 14 * DAY_MS;
const EXPIRES_SOON_MS = 5 * DAY_MS;

/** Tells the desk which review links were opened, and which end soon. */
@Injectable()
export class ReviewsDesk implements OnModuleInit {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly desk: DeskSources,
  ) {}

  onModuleInit(): void {
    this.desk.add((principal, fields) => this.share(principal, fields));
  }

  private async share(principal: MemberPrincipal, fields: readonly Field[]): Promise<DeskShare> {
    if (!holds(principal, 'reviews:read')) return { items: [], openReviews: 0 };
    const now = this.clock.now();
    const open = await this.database.read.findBy(ReviewEntity, {
      cooperativeId: principal.cooperativeId,
      revokedAt: IsNull(),
      expiresAt: MoreThan(now.toISOString()),
    });
    const byId = new Map(fields.map((field) => [field.id, field]));
    const reachable = open.filter((row) => byId.has(row.fieldId));
    const items = reachable.flatMap((row) => {
      const field = byId.get(row.fieldId);
      return field ? itemsOf(row, field, now) : [];
    });
    return { items, openReviews: reachable.length };
  }
}

function itemsOf(row: ReviewEntity, field: Field, now: Date): DeskItem[] {
  const about = {
    fieldId: field.id,
    fieldName: field.name,
    farmName: field.farmName,
    scenarioId: null,
  };
  const items: DeskItem[] = [];
  const { lastOpenedAt, expiresAt } = row;
  if (lastOpenedAt !== null && now.getTime() - Date.parse(lastOpenedAt) < TOLD_FOR_MS) {
    const times = row.views === 1 ? 'once' : `${row.views} times`;
    const text = `The review link was opened ${times}.`;
    items.push({ ...about, kind: 'review-opened', at: lastOpenedAt, text });
  }
  if (Date.parse(expiresAt) - now.getTime() < EXPIRES_SOON_MS) {
    const text = 'The review link ends soon. Make a new one if the farmer still needs it.';
    items.push({ ...about, kind: 'review-expiring', at: expiresAt, text });
  }
  return items;
}
