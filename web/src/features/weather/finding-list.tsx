import type { WeatherFinding } from '@furrowlight/shared/contract/weather';
import classes from './weather.module.css';

const WORDS = { refuse: 'Cannot be used', warn: 'Look at this', note: 'Note' };

/** What was found in a file, gravest first, with line numbers. */
export function FindingList({ findings }: { findings: readonly WeatherFinding[] }) {
  return (
    <ul className={classes.findings}>
      {findings.map((finding) => (
        <li key={finding.code} data-severity={finding.severity}>
          <strong>{WORDS[finding.severity]}</strong> {finding.message}
          {finding.rows.length > 0 && (
            <span className={classes.rows}>
              {finding.count === 1 ? 'line' : `${finding.count} lines:`} {finding.rows.join(', ')}
              {finding.count > finding.rows.length ? ' …' : ''}
            </span>
          )}
        </li>
      ))}
    </ul>
  );
}
