import type { WeatherFinding } from '@furrowlight/shared/contract/weather';

/** Lines named in a finding; the count says how many there are in all. */
const LINES_SHOWN = 12;

/** Gathers what was found, one entry a kind, with the lines it was found on. */
export class Findings {
  private readonly found = new Map<string, WeatherFinding>();

  add(
    severity: WeatherFinding['severity'],
    code: string,
    message: string,
    lines: readonly number[] = [],
  ): void {
    const entry = this.found.get(code) ?? { severity, code, message, rows: [], count: 0 };
    entry.rows.push(...lines.slice(0, LINES_SHOWN - entry.rows.length));
    entry.count += Math.max(lines.length, 1);
    this.found.set(code, entry);
  }

  get refused(): boolean {
    return [...this.found.values()].some(({ severity }) => severity === 'refuse');
  }

  /** Gravest first. */
  list(): WeatherFinding[] {
    const order = { refuse: 0, warn: 1, note: 2 };
    return [...this.found.values()].sort((a, b) => order[a.severity] - order[b.severity]);
  }
}
