import { Checkbox } from '@mantine/core';
import type { LayoutDraft } from './design';
import classes from './designer.module.css';
import { SliderNumber } from './slider-number';

interface Props {
  gaps: LayoutDraft['gaps'];
  message?: string;
  disabled: boolean;
  onChange: (gaps: LayoutDraft['gaps']) => void;
}

/** Gaps between modules along the row, and whether they alternate from row to row. */
export function GapControls({ gaps, message, disabled, onChange }: Props) {
  return (
    <div className={classes.group}>
      <Checkbox
        label="Gaps between modules along the row"
        checked={gaps !== null}
        onChange={(event) =>
          onChange(event.currentTarget.checked ? { gapM: 0.5, checkerboard: false } : null)
        }
        disabled={disabled}
      />
      {gaps && (
        <>
          <SliderNumber
            path="layout.gaps.gapM"
            label="Gap"
            unit="m"
            min={0.05}
            max={4}
            step={0.05}
            value={gaps.gapM}
            onChange={(gapM) => onChange({ ...gaps, gapM })}
            error={message}
            disabled={disabled}
          />
          <Checkbox
            label="Checkerboard: gaps alternate from row to row"
            checked={gaps.checkerboard}
            onChange={(event) => onChange({ ...gaps, checkerboard: event.currentTarget.checked })}
            disabled={disabled}
          />
        </>
      )}
    </div>
  );
}
