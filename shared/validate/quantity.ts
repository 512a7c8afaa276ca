/** One line of the validation table: how far the engine is from the reference in one quantity. */
export interface Quantity {
  /** Group of reference files, e.g. `sun` or `raytraced endless`. */
  group: string;
  name: string;
  /** Number of compared values. */
  n: number;
  max: number;
  p95: number;
  rms: number;
  unit: string;
  limit: number;
  pass: boolean;
}

/** A group of reference files: which it wants, and how it compares the engine with them. */
export interface Group {
  name: string;
  /** Paths below the reference folder; a group runs when all of them are there. */
  files: string[];
  /** Published source of the reference values, in plain words. */
  source: string;
  compare(folder: string): Quantity[];
}

/** Gathers the errors of one quantity and judges their largest against the limit. */
export class ErrorTally {
  private readonly errors: number[] = [];

  constructor(
    readonly group: string,
    readonly name: string,
    readonly unit: string,
    readonly limit: number,
  ) {}

  /** Record one error (sign is dropped). NaN counts as infinitely wrong. */
  add(error: number): void {
    this.errors.push(Number.isNaN(error) ? Infinity : Math.abs(error));
  }

  /** Judge: passes when at least one value was compared and none exceeds the limit. */
  judge(): Quantity {
    const sorted = [...this.errors].sort((a, b) => a - b);
    const n = sorted.length;
    const max = n ? sorted[n - 1] : Infinity;
    const p95 = n ? sorted[Math.min(n - 1, Math.ceil(0.95 * n) - 1)] : Infinity;
    const rms = n ? Math.sqrt(sorted.reduce((sum, e) => sum + e * e, 0) / n) : Infinity;
    const { group, name, unit, limit } = this;
    return { group, name, n, max, p95, rms, unit, limit, pass: n > 0 && max <= limit };
  }
}
