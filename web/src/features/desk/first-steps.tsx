import type { Desk } from '@furrowlight/shared/contract/desk';
import { IconCheck } from '@tabler/icons-react';
import { Link } from 'react-router-dom';
import classes from './first-steps.module.css';

/** The advisor's path, with the next step marked, until the first scenario stands. */
export function FirstSteps({ counts }: { counts: Desk['counts'] }) {
  const steps = [
    {
      done: counts.farms > 0,
      title: 'Add a farm',
      text: 'Who farms there, and which advisor is in charge.',
      to: '/farms?add=1',
    },
    {
      done: counts.fields > 0,
      title: 'Draw its field',
      text: 'On the map, from typed corners, or from a GeoJSON file.',
      to: '/fields?add=draw',
    },
    {
      done: counts.scenarios > 0,
      title: 'Lay rows over it',
      text: 'Record the crop, choose a weather year, and see what light is left.',
      to: '/fields',
    },
  ];
  const next = steps.findIndex((step) => !step.done);
  return (
    <ol className={classes.steps} aria-label="First steps">
      {steps.map((step, i) => (
        <li key={step.title} data-state={step.done ? 'done' : i === next ? 'next' : 'later'}>
          <span className={classes.mark} aria-hidden>
            {step.done ? <IconCheck size={15} stroke={2.2} /> : i + 1}
          </span>
          <div>
            {i === next ? <Link to={step.to}>{step.title}</Link> : <span>{step.title}</span>}
            <p>{step.done ? 'Done.' : step.text}</p>
          </div>
        </li>
      ))}
    </ol>
  );
}
