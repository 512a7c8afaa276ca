import type { LayoutKind } from '@furrowlight/shared/contract/layout';
import classes from './layout-glyph.module.css';

/** One row of the layout seen from its end: ground, post, panel, crop. */
export function LayoutGlyph({ kind, size = 40 }: { kind: LayoutKind; size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 40 40" aria-hidden focusable="false">
      <path d="M2 35h36" className={classes.ground} />
      {kind === 'overhead-fixed' && (
        <>
          <path d="M13 35V14M27 35V9" className={classes.post} />
          <path d="M7 16.5 33 6.5" className={classes.panel} />
          <path
            d="M5 35v-6M10 35v-6M18 35v-6M22 35v-6M31 35v-6M36 35v-6"
            className={classes.crop}
          />
        </>
      )}
      {kind === 'between-fixed' && (
        <>
          <path d="M20 35V26" className={classes.post} />
          <path d="M12 30.5 28 21" className={classes.panel} />
          <path d="M3 35v-7M7 35v-7M33 35v-7M37 35v-7" className={classes.crop} />
        </>
      )}
      {kind === 'vertical-bifacial' && (
        <>
          <path d="M20 35V8" className={classes.post} />
          <path d="M20 28V8" className={classes.panel} />
          <path d="M5 35v-7M10 35v-7M30 35v-7M35 35v-7" className={classes.crop} />
        </>
      )}
      {kind === 'single-axis-tracker' && (
        <>
          <path d="M20 35V16" className={classes.post} />
          <path d="M9.5 21.5 30.5 10.5" className={classes.panel} />
          <path d="M9 12.5A13 13 0 0 1 15 6M31 19.5A13 13 0 0 1 25 26" className={classes.turn} />
          <path d="M5 35v-6M10 35v-6M30 35v-6M35 35v-6" className={classes.crop} />
        </>
      )}
    </svg>
  );
}
