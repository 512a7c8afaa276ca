import classes from './wordmark.module.css';

/** The mark: furrows running to a low sun. Light is brightest in the middle furrow. */
export function Mark({ size = 28 }: { size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 32 32" aria-hidden focusable="false">
      <path d="M9 14.5a7 7 0 0 1 14 0z" className={classes.sun} />
      <path d="M2 14.5h28" className={classes.horizon} />
      <path d="M16 18v11" className={classes.bright} />
      <path d="M12.3 18 8.5 28.5M19.7 18l3.8 10.5" className={classes.half} />
      <path d="M8.6 18 1.8 26M23.4 18l6.8 8" className={classes.dim} />
    </svg>
  );
}

export function Wordmark({ size = 28 }: { size?: number }) {
  return (
    <span className={classes.wordmark}>
      <Mark size={size} />
      <span className={classes.name}>Furrowlight</span>
    </span>
  );
}
