import { createHash } from 'node:crypto';
import type { LinkPrincipal, MemberPrincipal } from '@furrowlight/shared/access/may';
import type {
  Review,
  ReviewCreated,
  ReviewInput,
  ReviewPage,
} from '@furrowlight/shared/contract/reviews';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import { AuditService } from '../audit/audit.service.js';
import { LinkPrincipals } from '../auth/link-principals.js';
import { Clock } from '../common/clock.js';
import { DomainError, invalid, notFound } from '../common/domain-error.js';
import { Ids } from '../common/ids.js';
import { AppConfig } from '../config/app-config.js';
import { CooperativesService } from '../cooperatives/cooperatives.service.js';
import { Database } from '../database/database.js';
import { FieldsService } from '../fields/fields.service.js';
import { RunsService } from '../runs/runs.service.js';
import { ScenariosService } from '../scenarios/scenarios.service.js';
import { WeatherService } from '../weather/weather.service.js';
import { ReviewCookie } from './review-cookie.js';
import { ReviewVisitEntity } from './review-visit.entity.js';
import { ReviewEntity, type ShownPage } from './review.entity.js';

const DAY_MS = 86_400_000;
const DEFAULT_DAYS = 30;

const hashOf = (token: string): string => createHash('sha256').update(token).digest('hex');

const subject = (id: string, name: string) => ({ kind: 'review', id, name });

/** Links through which a farmer sees frozen scenarios of one field without an account. */
@Injectable()
export class ReviewsService implements OnModuleInit {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly audit: AuditService,
    private readonly config: AppConfig,
    private readonly cooperatives: CooperativesService,
    private readonly fields: FieldsService,
    private readonly scenarios: ScenariosService,
    private readonly runs: RunsService,
    private readonly weather: WeatherService,
    private readonly links: LinkPrincipals,
    private readonly cookie: ReviewCookie,
  ) {}

  onModuleInit(): void {
    this.links.recogniseBy(async (request) => {
      const token = this.cookie.read(request);
      return token ? this.visitor(token) : null;
    });
  }

  /** Links of a field, newest first. */
  async list(principal: MemberPrincipal, fieldId: string): Promise<Review[]> {
    const field = await this.fields.get(principal, fieldId);
    const rows = await this.database.read.find(ReviewEntity, {
      where: { fieldId: field.id },
      order: { createdAt: 'DESC' },
    });
    return rows.map((row) => this.toContract(row));
  }

  /**
   * Make a link. Its address is told this once.
   *
   * @throws DomainError not-found, invalid-input naming a scenario without a finished run
   */
  async create(principal: MemberPrincipal, input: ReviewInput): Promise<ReviewCreated> {
    const days = input.expiresInDays ?? DEFAULT_DAYS;
    const expiresAt = new Date(this.clock.now().getTime() + days * DAY_MS).toISOString();
    const shown = await this.compose(principal, input, expiresAt);
    const token = this.ids.secret();
    return this.database.write(async (manager) => {
      const row = manager.create(ReviewEntity, {
        id: this.ids.next(),
        cooperativeId: principal.cooperativeId,
        fieldId: input.fieldId,
        message: input.message ?? '',
        tokenHash: hashOf(token),
        shown,
        createdAt: this.clock.instant(),
        createdById: principal.memberId,
        createdByName: principal.name,
        expiresAt,
        revokedAt: null,
        lastOpenedAt: null,
        views: 0,
      });
      await manager.insert(ReviewEntity, row);
      await this.audit.record(manager, principal, 'created', subject(row.id, shown.fieldName));
      // Behind the # the token reaches no server log on its way.
      return { review: this.toContract(row), url: `${this.config.publicUrl}/r#${token}` };
    });
  }

  /** End a link at once; visitors are out with their next request. */
  async revoke(principal: MemberPrincipal, id: string): Promise<Review> {
    const { cooperativeId } = principal;
    return this.database.write(async (manager) => {
      const row = await manager.findOneBy(ReviewEntity, { id, cooperativeId });
      if (!row || !(await this.fields.isReachable(principal, row.fieldId))) {
        throw notFound('review link');
      }
      row.revokedAt ??= this.clock.instant();
      await manager.save(ReviewEntity, row);
      await this.audit.record(manager, principal, 'revoked', subject(id, row.shown.fieldName));
      return this.toContract(row);
    });
  }

  /**
   * Swap a link's token for a visitor's cookie and count the view.
   *
   * @throws DomainError expired, with a sentence for the farmer
   */
  async enter(token: string): Promise<{ cookie: string; expiresAt: string }> {
    return this.database.write(async (manager) => {
      const row = await manager.findOneBy(ReviewEntity, { tokenHash: hashOf(token) });
      if (!row || this.stateOf(row) !== 'open') throw gone(row?.createdByName ?? null);
      const cookie = this.ids.secret();
      const now = this.clock.instant();
      await manager.insert(ReviewVisitEntity, {
        tokenHash: hashOf(cookie),
        reviewId: row.id,
        createdAt: now,
      });
      await manager.update(
        ReviewEntity,
        { id: row.id },
        { views: row.views + 1, lastOpenedAt: now },
      );
      return { cookie, expiresAt: row.expiresAt };
    });
  }

  /** The page a visitor came for. */
  async page(visitor: LinkPrincipal): Promise<ReviewPage> {
    const row = await this.database.read.findOneBy(ReviewEntity, { id: visitor.reviewId });
    if (!row) throw gone(null);
    const scenarios = await Promise.all(
      row.shown.scenarios.map(async (scenario) => ({
        ...scenario,
        result: await this.runs.stored(row.cooperativeId, scenario.inputHash),
      })),
    );
    return { ...row.shown, scenarios };
  }

  private async visitor(token: string): Promise<LinkPrincipal | null> {
    const visit = await this.database.read.findOneBy(ReviewVisitEntity, {
      tokenHash: hashOf(token),
    });
    const row = visit && (await this.database.read.findOneBy(ReviewEntity, { id: visit.reviewId }));
    if (!row || this.stateOf(row) !== 'open') return null;
    if (!(await this.fields.stands(row.cooperativeId, row.fieldId))) return null;
    return {
      kind: 'review-link',
      reviewId: row.id,
      cooperativeId: row.cooperativeId,
      fieldId: row.fieldId,
      scenarioIds: row.shown.scenarios.map(({ id }) => id),
    };
  }

  private async compose(
    principal: MemberPrincipal,
    input: ReviewInput,
    expiresAt: string,
  ): Promise<ShownPage> {
    const field = await this.fields.get(principal, input.fieldId);
    const cooperative = await this.cooperatives.get(principal.cooperativeId);
    const scenarios = await Promise.all(
      input.scenarioIds.map((id, i) => this.frozen(principal, field.id, id, i)),
    );
    return {
      fieldName: field.name,
      farmName: field.farmName,
      cooperativeName: cooperative.name,
      advisorName: principal.name,
      message: input.message ?? '',
      expiresAt,
      timeZone: field.timeZone,
      pin: field.pin,
      boundary: field.boundary,
      slopePercent: field.slopePercent,
      site: { latitude: field.pin[1], longitude: field.pin[0] },
      scenarios,
    };
  }

  private async frozen(principal: MemberPrincipal, fieldId: string, id: string, index: number) {
    const scenario = await this.scenarios.get(principal, id);
    const { latestRun: run, frozen, weatherId } = scenario;
    if (scenario.fieldId !== fieldId) {
      throw invalid({
        path: `scenarioIds.${index}`,
        message: 'This scenario is of another field.',
      });
    }
    if (run?.status !== 'done' || !frozen || weatherId === null) {
      throw invalid({
        path: `scenarioIds.${index}`,
        message: `“${scenario.name}” has no finished run. Run it first.`,
      });
    }
    const weather = await this.weather.get(principal, weatherId);
    return {
      id: scenario.id,
      name: scenario.name,
      layout: frozen.layout,
      figures: scenario.figures,
      inputHash: run.inputHash,
      modelVersion: run.modelVersion,
      weatherName: weather.name,
      utcOffsetHours: weather.utcOffsetHours,
    };
  }

  private stateOf(row: ReviewEntity): Review['state'] {
    if (row.revokedAt) return 'revoked';
    return row.expiresAt <= this.clock.instant() ? 'expired' : 'open';
  }

  private toContract(row: ReviewEntity): Review {
    return {
      id: row.id,
      fieldId: row.fieldId,
      scenarioIds: row.shown.scenarios.map(({ id }) => id),
      message: row.message,
      createdAt: row.createdAt,
      createdByName: row.createdByName,
      expiresAt: row.expiresAt,
      revokedAt: row.revokedAt,
      lastOpenedAt: row.lastOpenedAt,
      views: row.views,
      state: this.stateOf(row),
    };
  }
}

const gone = (advisor: string | null) =>
  new DomainError(
    'expired',
    `This link is no longer open. Ask ${advisor ?? 'your advisor'} for a new one.`,
  );
