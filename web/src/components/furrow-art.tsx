import { lightColour } from '../app/theme/ramp';
import classes from './furrow-art.module.css';

const VANISH = { x: 300, y: 250 };
const BOTTOM = 800;
const PITCH = 300;
const STRIPS = 10;

/** Share of light across one pitch for the drawing: darkest under the panel, bright in the alley. */
function share(position: number): number {
  return 0.58 + 0.4 * Math.cos(2 * Math.PI * (position - 0.08));
}

function ray(x: number): string {
  return `${VANISH.x + x} ${BOTTOM}`;
}

function ground() {
  const strips = [];
  for (let row = -16; row < 16; row += 1) {
    for (let strip = 0; strip < STRIPS; strip += 1) {
      const from = (row + strip / STRIPS) * PITCH;
      const to = (row + (strip + 1) / STRIPS) * PITCH + 2;
      strips.push(
        <path
          key={`${row}-${strip}`}
          d={`M${VANISH.x} ${VANISH.y}L${ray(from)} ${ray(to)}z`}
          fill={lightColour(share((strip + 0.5) / STRIPS))}
        />,
      );
    }
  }
  return strips;
}

/** Point on the line from the vanishing point towards (x, bottom + y), `t` of the way. */
function along(x: number, y: number, t: number): string {
  return `${(VANISH.x + x * t).toFixed(1)} ${(VANISH.y + (BOTTOM - VANISH.y + y) * t).toFixed(1)}`;
}

function row(index: number) {
  const foot = index * PITCH;
  const side = 34;
  return (
    <g key={index}>
      {[0.14, 0.2, 0.29, 0.42, 0.61, 0.88].map((t) => (
        <path
          key={t}
          d={`M${along(foot, 0, t)}L${along(foot, -322, t)}`}
          className={classes.post}
        />
      ))}
      <path
        d={`M${along(foot - side, -300, 0.09)}L${along(foot - side, -300, 1.9)} ${along(foot + side, -345, 1.9)} ${along(foot + side, -345, 0.09)}z`}
        className={classes.panel}
      />
    </g>
  );
}

/** Panel rows over a lit field, the light between them drawn in the ramp of every chart. */
export function FurrowArt() {
  return (
    <svg
      className={classes.art}
      viewBox="0 0 600 800"
      preserveAspectRatio="xMidYMid slice"
      aria-hidden
      focusable="false"
    >
      <defs>
        <linearGradient id="furrow-sky" x1="0" y1="0" x2="0" y2="1">
          <stop offset="0" stopColor={lightColour(0.1)} />
          <stop offset="0.6" stopColor={lightColour(0.42)} />
          <stop offset="1" stopColor={lightColour(0.78)} />
        </linearGradient>
      </defs>
      <rect width="600" height={VANISH.y} fill="url(#furrow-sky)" />
      <circle cx={VANISH.x + 96} cy={VANISH.y} r="58" fill={lightColour(1)} />
      <rect y={VANISH.y} width="600" height={BOTTOM - VANISH.y} fill={lightColour(0.3)} />
      {ground()}
      {[-4.5, 4.5, -3.5, 3.5, -2.5, 2.5, -1.5, 1.5, -0.5, 0.5].map(row)}
    </svg>
  );
}
