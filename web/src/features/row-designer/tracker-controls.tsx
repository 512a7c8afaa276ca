import { Button, Select, TextInput } from '@mantine/core';
import { NumberField } from '../../components/number-field';
import type { TrackerDraft } from './design';
import classes from './designer.module.css';
import { inputId, SliderNumber } from './slider-number';

interface Props {
  tracker: TrackerDraft;
  messages: Record<string, string>;
  disabled: boolean;
  onChange: (tracker: TrackerDraft) => void;
}

type Window = TrackerDraft['cropFirst'][number];

const PROGRAMMES = [
  { value: 'true', label: 'Follow the sun' },
  { value: 'backtracking', label: 'Turn back before rows shade rows' },
  { value: 'crop-first', label: 'Crop first in chosen windows' },
] as const;

const NEW_WINDOW: Window = {
  from: '05-01',
  to: '06-30',
  startHour: 6,
  endHour: 11,
  belowPpfd: null,
};

/** Stops, programme and the windows in which the crop comes before the meter. */
export function TrackerControls({ tracker, messages, disabled, onChange }: Props) {
  const change = (index: number, patch: Partial<Window>) =>
    onChange({
      ...tracker,
      cropFirst: tracker.cropFirst.map((window, i) =>
        i === index ? { ...window, ...patch } : window,
      ),
    });
  return (
    <div className={classes.group}>
      <SliderNumber
        path="layout.tracker.maxAngleDeg"
        label="Largest rotation"
        unit="°"
        min={10}
        max={90}
        step={1}
        value={tracker.maxAngleDeg}
        onChange={(maxAngleDeg) => onChange({ ...tracker, maxAngleDeg })}
        error={messages['layout.tracker.maxAngleDeg']}
        disabled={disabled}
      />
      <Select
        label="Programme"
        data={PROGRAMMES.map(({ value, label }) => ({ value, label }))}
        value={tracker.programme}
        onChange={(value) => {
          const found = PROGRAMMES.find((programme) => programme.value === value);
          if (!found) return;
          const first = found.value === 'crop-first' && tracker.cropFirst.length === 0;
          onChange({
            ...tracker,
            programme: found.value,
            cropFirst: first ? [NEW_WINDOW] : tracker.cropFirst,
          });
        }}
        allowDeselect={false}
        disabled={disabled}
      />
      {tracker.programme === 'crop-first' && (
        <>
          {tracker.cropFirst.map((window, i) => (
            <WindowFields
              key={i}
              index={i}
              window={window}
              messages={messages}
              disabled={disabled}
              onChange={(patch) => change(i, patch)}
              onRemove={() =>
                onChange({ ...tracker, cropFirst: tracker.cropFirst.filter((_, n) => n !== i) })
              }
            />
          ))}
          <Button
            variant="default"
            size="compact-sm"
            disabled={disabled || tracker.cropFirst.length >= 12}
            onClick={() => onChange({ ...tracker, cropFirst: [...tracker.cropFirst, NEW_WINDOW] })}
          >
            Add a window
          </Button>
        </>
      )}
    </div>
  );
}

interface WindowProps {
  index: number;
  window: Window;
  messages: Record<string, string>;
  disabled: boolean;
  onChange: (patch: Partial<Window>) => void;
  onRemove: () => void;
}

function WindowFields({ index, window, messages, disabled, onChange, onRemove }: WindowProps) {
  const path = `layout.tracker.cropFirst.${index}`;
  const text = (key: 'from' | 'to', label: string) => (
    <TextInput
      id={inputId(`${path}.${key}`)}
      label={label}
      placeholder="MM-DD"
      value={window[key]}
      onChange={(event) => onChange({ [key]: event.currentTarget.value })}
      error={messages[`${path}.${key}`]}
      disabled={disabled}
    />
  );
  const number = (key: 'startHour' | 'endHour' | 'belowPpfd', label: string, unit: string) => (
    <NumberField
      id={inputId(`${path}.${key}`)}
      label={label}
      unit={unit}
      value={window[key]}
      onChange={(value) => onChange({ [key]: value })}
      error={messages[`${path}.${key}`]}
      disabled={disabled}
    />
  );
  return (
    <fieldset className={classes.window}>
      <legend className={classes.legend}>Window {index + 1}</legend>
      {text('from', 'From (month-day)')}
      {text('to', 'To (month-day)')}
      {number('startHour', 'From hour', 'h')}
      {number('endHour', 'To hour', 'h')}
      {number('belowPpfd', 'Only below, empty for always', 'µmol m⁻² s⁻¹')}
      <Button
        variant="subtle"
        color="danger"
        size="compact-sm"
        onClick={onRemove}
        disabled={disabled}
      >
        Remove window {index + 1}
      </Button>
    </fieldset>
  );
}
