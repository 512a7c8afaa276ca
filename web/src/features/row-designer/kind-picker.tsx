import type { LayoutKind } from '@furrowlight/shared/contract/layout';
import { LayoutGlyph } from '../../components/layout-glyph';
import { LAYOUT_KINDS } from '../../lib/layout-kinds';
import classes from './designer.module.css';

const KINDS = Object.keys(LAYOUT_KINDS) as LayoutKind[];

interface Props {
  value: LayoutKind;
  onChange: (kind: LayoutKind) => void;
  disabled: boolean;
}

/** How the panels stand, chosen from four drawings. */
export function KindPicker({ value, onChange, disabled }: Props) {
  return (
    <fieldset className={classes.kinds} disabled={disabled}>
      <legend className={classes.legend}>How the panels stand</legend>
      {KINDS.map((kind) => (
        <label key={kind} className={classes.kind} data-chosen={kind === value || undefined}>
          <input
            type="radio"
            name="layout-kind"
            checked={kind === value}
            onChange={() => onChange(kind)}
          />
          <LayoutGlyph kind={kind} size={44} />
          <span>{LAYOUT_KINDS[kind].short}</span>
        </label>
      ))}
    </fieldset>
  );
}
