import type { Crop } from '@furrowlight/shared/contract/crops';
import { Injectable } from '@nestjs/common';
import { readCropTable } from './crop-table.js';

@Injectable()
export class CropsService {
  private readonly table: readonly Crop[] = readCropTable();
  private readonly byId = new Map(this.table.map((crop) => [crop.id, crop]));

  list(): readonly Crop[] {
    return this.table;
  }

  find(id: string): Crop | null {
    return this.byId.get(id) ?? null;
  }

  /** A season may name a crop that has left the table since. */
  nameOf(id: string): string {
    return this.byId.get(id)?.name ?? id;
  }
}
