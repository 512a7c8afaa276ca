import { Injectable } from '@nestjs/common';

/** The only source of "now"; tests put their own in its place. */
@Injectable()
export class Clock {
  now(): Date {
    return new Date();
  }

  /** Now as the contract writes instants. */
  instant(): string {
    return this.now().toISOString();
  }
}
