import { holds, type MemberPrincipal } from '@furrowlight/shared/access/may';
import type { DeskItem } from '@furrowlight/shared/contract/desk';
import type { Field } from '@furrowlight/shared/contract/fields';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import { Clock } from '../common/clock.js';
import { Database } from '../database/database.js';
import { DeskSources, type DeskShare } from '../desk/desk-sources.js';
import { RunsService } from '../runs/runs.service.js';
import { ScenarioEntity } from './scenario.entity.js';

const TOLD_FOR_MS = 14 * 24 * 3600_000;

/** Tells the desk which runs ended lately. */
@Injectable()
export class ScenariosDesk implements OnModuleInit {
  constructor(
    private readonly database: Database,
    private readonly clock: Clock,
    private readonly runs: RunsService,
    private readonly desk: DeskSources,
  ) {}

  onModuleInit(): void {
    this.desk.add((principal, fields) => this.share(principal, fields));
  }

  private async share(principal: MemberPrincipal, fields: readonly Field[]): Promise<DeskShare> {
    if (!holds(principal, 'runs:start')) return { items: [], openReviews: 0 };
    const { cooperativeId } = principal;
    const since = new Date(this.clock.now().getTime() - TOLD_FOR_MS).toISOString();
    const ended = await this.runs.endedSince(cooperativeId, since);
    const rows = await this.database.read.find(ScenarioEntity, {
      select: { id: true, name: true, fieldId: true },
      where: { cooperativeId, archived: false },
    });
    const scenarios = new Map(rows.map((row) => [row.id, row]));
    const byId = new Map(fields.map((field) => [field.id, field]));
    const items = ended.flatMap(({ scenarioId, status, finishedAt, problem }): DeskItem[] => {
      const scenario = scenarios.get(scenarioId);
      const field = scenario && byId.get(scenario.fieldId);
      if (!field) return [];
      const done = status === 'done';
      const about = { fieldId: field.id, fieldName: field.name, farmName: field.farmName };
      return [
        {
          ...about,
          kind: done ? 'run-finished' : 'run-failed',
          at: finishedAt,
          scenarioId,
          text: done
            ? `“${scenario.name}” has its light budget.`
            : `“${scenario.name}” did not run. ${problem ?? ''}`.trim(),
        },
      ];
    });
    return { items, openReviews: 0 };
  }
}
