import { Slider } from '@mantine/core';
import { NumberField } from '../../components/number-field';
import classes from './designer.module.css';

export interface SliderNumberProps {
  /** Dotted path, for messages and the input's id. */
  path: string;
  label: string;
  unit: string;
  value: number | null;
  /** Reach of the slider; the number may go beyond it. */
  min: number;
  max: number;
  step: number;
  /** What the number is shown times: 100 shows a share as per cent. */
  scale?: number;
  error?: string;
  disabled: boolean;
  onChange: (value: number | null) => void;
}

export const inputId = (path: string) => `design-${path.replaceAll('.', '-')}`;

/** One quantity under a slider and as a number at once. */
export function SliderNumber(props: SliderNumberProps) {
  const { path, label, unit, value, min, max, step, scale = 1, error, disabled, onChange } = props;
  const shown = value === null ? null : Number((value * scale).toFixed(4));
  const take = (next: number | null) =>
    onChange(next === null ? null : Number((next / scale).toFixed(6)));
  return (
    <div className={classes.quantity}>
      <NumberField
        id={inputId(path)}
        label={label}
        unit={unit}
        step={step}
        value={shown}
        onChange={take}
        error={error}
        disabled={disabled}
        size="sm"
      />
      <Slider
        thumbLabel={`${label}, slider`}
        min={min}
        max={max}
        step={step}
        value={Math.min(Math.max(shown ?? min, min), max)}
        onChange={take}
        disabled={disabled}
        label={null}
        size="sm"
        className={classes.slider}
        classNames={{ thumb: classes.thumb }}
      />
    </div>
  );
}
