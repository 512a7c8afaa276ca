import type { ScenarioResult } from '@furrowlight/shared/contract/result';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { Link } from 'react-router-dom';
import { Section } from '../../components/section';
import { formatNumber, instantIn } from '../../lib/format';
import classes from './results.module.css';

/** What the numbers rest on, so that anyone can make them again. */
export function DataSheet({
  scenario,
  stored,
  timeZone,
}: {
  scenario: Scenario;
  stored: ScenarioResult;
  timeZone: string;
}) {
  const options = scenario.frozen?.options;
  const rows: [string, string][] = [
    ['Weather year', scenario.weatherName ?? 'removed since'],
    ['Model version', stored.result.modelVersion],
    ['Suns', options ? `every ${options.sunStepMinutes} minutes of the year` : ''],
    ['Strips of ground', options ? `${options.positions} across one pitch` : ''],
    ['Worked out', `${instantIn(stored.finishedAt, timeZone)} (${timeZone})`],
    ['Time taken', `${formatNumber(stored.durationMs / 1000, 1)} s`],
    ['Input hash (SHA-256)', stored.inputHash],
  ];
  return (
    <Section
      title="Data and version sheet"
      intro={
        <>
          All figures on this page are modelled.{' '}
          <Link to="/how-we-know">How we know that the model is right.</Link>
        </>
      }
    >
      <dl className={classes.sheet}>
        {rows
          .filter(([, value]) => value !== '')
          .map(([name, value]) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>{value}</dd>
            </div>
          ))}
      </dl>
      <ul className={classes.notes}>
        {stored.result.notes.map((note) => (
          <li key={note}>{note}</li>
        ))}
        <li>
          This plans light. Structure, electrics and law are for licensed people and the authority.
        </li>
      </ul>
    </Section>
  );
}
