import type { ReactNode } from 'react';
import classes from './figure.module.css';

interface FigureProps {
  label: ReactNode;
  value: string;
  unit?: string;
  /** Where the number comes from or what it means here. */
  note?: ReactNode;
}

/** One number with its unit, under its name. */
export function Figure({ label, value, unit, note }: FigureProps) {
  return (
    <div className={classes.figure}>
      <dt>{label}</dt>
      <dd>
        <span className={classes.value}>{value}</span>
        {unit && <span className={classes.unit}>{unit}</span>}
        {note && <div className={classes.note}>{note}</div>}
      </dd>
    </div>
  );
}

/** Numbers side by side, parted by furrow lines. */
export function FigureRow({ children }: { children: ReactNode }) {
  return <dl className={classes.row}>{children}</dl>;
}
