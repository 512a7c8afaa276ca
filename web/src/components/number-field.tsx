import { TextInput, type TextInputProps } from '@mantine/core';
import { useState, type KeyboardEvent } from 'react';
import { parseNumber } from '../lib/parse-number';
import classes from './number-field.module.css';

export interface NumberFieldProps extends Omit<
  TextInputProps,
  'value' | 'onChange' | 'type' | 'inputMode' | 'step' | 'min' | 'max'
> {
  value: number | null;
  /** Gets null while the text is empty or no number. */
  onChange: (value: number | null) => void;
  unit?: string;
  /** Arrow-key step. */
  step?: number;
  min?: number;
  max?: number;
}

function textOf(value: number | null): string {
  return value === null ? '' : String(Number(value.toFixed(6)));
}

/** A number typed with comma or point, its unit always in sight. */
export function NumberField({
  value,
  onChange,
  unit,
  step = 1,
  min,
  max,
  ...rest
}: NumberFieldProps) {
  const [text, setText] = useState(() => textOf(value));
  const shown = parseNumber(text) === value ? text : textOf(value);
  const unreadable = text.trim() !== '' && parseNumber(text) === null && value === null;

  const take = (next: string) => {
    setText(next);
    onChange(parseNumber(next));
  };
  const nudge = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
    event.preventDefault();
    const move = (event.key === 'ArrowUp' ? step : -step) * (event.shiftKey ? 10 : 1);
    const next = Math.min(max ?? Infinity, Math.max(min ?? -Infinity, (value ?? 0) + move));
    take(textOf(next));
  };

  return (
    <TextInput
      {...rest}
      inputMode="decimal"
      autoComplete="off"
      value={shown}
      onChange={(event) => take(event.currentTarget.value)}
      onKeyDown={nudge}
      error={rest.error ?? (unreadable ? 'This is not a number.' : undefined)}
      rightSection={
        unit ? (
          <span className={classes.unit} aria-hidden>
            {unit}
          </span>
        ) : undefined
      }
      rightSectionWidth={unit ? `${Math.max(2.2, unit.length * 0.62 + 1.2)}rem` : undefined}
      rightSectionPointerEvents="none"
      aria-label={rest['aria-label']}
      label={
        unit && typeof rest.label === 'string' ? (
          <>
            {rest.label}
            <span className={classes.spoken}> in {unit}</span>
          </>
        ) : (
          rest.label
        )
      }
      classNames={{ input: classes.input }}
    />
  );
}
