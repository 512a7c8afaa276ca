import { lightColour, lightInk } from '../theme/ramp';
import classes from './styleguide.module.css';

const INKS = ['ink', 'ink-soft', 'leaf', 'soil', 'dusk', 'danger', 'warn'];
const GROUNDS = ['paper', 'sheet', 'sunk', 'haze', 'line', 'edge', 'straw'];

export function Swatches() {
  return (
    <>
      <ul className={classes.swatches}>
        {[...INKS, ...GROUNDS].map((name) => (
          <li key={name}>
            <span style={{ background: `var(--fl-${name})` }} />
            {name}
          </li>
        ))}
      </ul>
      <ol className={classes.ramp} aria-label="Light ramp, 0 to 100 % of open field">
        {Array.from({ length: 11 }, (_, i) => (
          <li key={i} style={{ background: lightColour(i / 10), color: lightInk(i / 10) }}>
            {i * 10}
          </li>
        ))}
      </ol>
    </>
  );
}
