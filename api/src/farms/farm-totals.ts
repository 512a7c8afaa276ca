import { Injectable } from '@nestjs/common';
import { Supplied } from '../common/supplied.js';

export interface LandTotal {
  fieldCount: number;
  areaM2: number;
}

/** Fields and area by farm id of one cooperative; answered by the fields' room. */
@Injectable()
export class FarmTotals extends Supplied<[cooperativeId: string], ReadonlyMap<string, LandTotal>> {
  protected readonly unanswered = new Map<string, LandTotal>();
}
