import type { SunSplit } from '@furrowlight/shared/contract/result';
import { formatNumber } from '../lib/format';
import classes from './sun-split-bar.module.css';

/** Parts of the split in the order light meets them. */
export const SPLIT_PARTS = [
  { key: 'electricity', label: 'Electricity', note: 'to the grid' },
  { key: 'panelHeat', label: 'Panel heat', note: 'kept by panels and structure' },
  { key: 'reflected', label: 'Reflected', note: 'back to the sky' },
  { key: 'cropPar', label: 'Crop PAR', note: 'light the crop grows on' },
  { key: 'otherOnCrop', label: 'Other light on the crop', note: 'warmth, mostly near infrared' },
] as const satisfies readonly { key: keyof SunSplit; label: string; note: string }[];

/** Where 100 units of sunlight on the land go, as one band of 100 threads. */
export function SunSplitBar({ split, compact = false }: { split: SunSplit; compact?: boolean }) {
  const spoken = SPLIT_PARTS.map(
    ({ key, label }) => `${label} ${formatNumber(split[key], 1)} of 100`,
  ).join(', ');
  return (
    <div className={classes.split} data-compact={compact || undefined}>
      <svg
        viewBox="0 0 1000 120"
        preserveAspectRatio="none"
        role="img"
        aria-label={`Sun split: ${spoken}.`}
        className={classes.band}
      >
        <Parts split={split} />
      </svg>
      {!compact && (
        <dl className={classes.key}>
          {SPLIT_PARTS.map(({ key, label, note }) => (
            <div key={key}>
              <dt>
                <span className={classes.swatch} data-part={key} aria-hidden />
                {label}
              </dt>
              <dd>
                <span className={classes.value}>{formatNumber(split[key], 1)}</span> of 100
                <span className={classes.note}>{note}</span>
              </dd>
            </div>
          ))}
        </dl>
      )}
    </div>
  );
}

function Parts({ split }: { split: SunSplit }) {
  let from = 0;
  return SPLIT_PARTS.map(({ key }) => {
    const x = from * 10;
    from += split[key];
    return (
      <rect
        key={key}
        x={x}
        y={0}
        width={Math.max(split[key] * 10 - 2, 0)}
        height={120}
        data-part={key}
        className={classes.part}
      />
    );
  });
}
