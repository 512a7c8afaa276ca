import classes from './row-slice.module.css';

interface Place {
  /** Drawing units of the middle of its feet. */
  x: number;
  y: number;
  perMetre: number;
}

const at = ({ x, y, perMetre }: Place) => `translate(${x} ${y}) scale(${perMetre} ${-perMetre})`;

/** Someone 1.75 m tall. */
export function Person(place: Place) {
  return (
    <g transform={at(place)} className={classes.figure}>
      <circle cx="0" cy="1.62" r="0.13" />
      <path d="M-0.22 1.38Q0 1.52 0.22 1.38L0.17 0.82H0.13L0.12 0H0.02L0 0.75L-0.02 0H-0.12L-0.13 0.82H-0.17Z" />
    </g>
  );
}

/** A tractor from behind: 2.5 m wide, 3.0 m high. */
export function Tractor(place: Place & { passes: boolean }) {
  return (
    <g
      transform={at(place)}
      className={classes.figure}
      data-blocked={place.passes ? undefined : true}
    >
      <rect x="-1.25" y="0" width="0.52" height="1.75" rx="0.14" />
      <rect x="0.73" y="0" width="0.52" height="1.75" rx="0.14" />
      <path d="M-0.73 0.62H0.73V1.35H-0.73Z" />
      <path
        fillRule="evenodd"
        d="M-0.82 1.35L-0.7 2.92Q0 3.06 0.7 2.92L0.82 1.35ZM-0.66 1.5H0.66L0.57 2.72H-0.57Z"
      />
    </g>
  );
}
