import type { MemberPrincipal } from '@furrowlight/shared/access/may';
import type { DeskItem } from '@furrowlight/shared/contract/desk';
import type { Field } from '@furrowlight/shared/contract/fields';
import { Injectable } from '@nestjs/common';

/** What a room puts on the desk. */
export interface DeskShare {
  items: DeskItem[];
  openReviews: number;
}

/** `fields` are all the principal may see; a share speaks of no others. */
type Source = (principal: MemberPrincipal, fields: readonly Field[]) => Promise<DeskShare>;

/** Where rooms above the desk hand in what wants attention. */
@Injectable()
export class DeskSources {
  private readonly sources: Source[] = [];

  /** Called once at start by each room that has something to say. */
  add(source: Source): void {
    this.sources.push(source);
  }

  collect(principal: MemberPrincipal, fields: readonly Field[]): Promise<DeskShare[]> {
    return Promise.all(this.sources.map((source) => source(principal, fields)));
  }
}
