import { Injectable } from '@nestjs/common';
import { Supplied } from '../common/supplied.js';

/** Living scenarios by field id of one cooperative; answered by the scenarios' room. */
@Injectable()
export class ScenarioCounts extends Supplied<[cooperativeId: string], ReadonlyMap<string, number>> {
  protected readonly unanswered = new Map<string, number>();
}
