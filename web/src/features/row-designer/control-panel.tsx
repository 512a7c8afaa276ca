import type { Field } from '@furrowlight/shared/contract/fields';
import type { LayoutKind } from '@furrowlight/shared/contract/layout';
import type { Weather } from '@furrowlight/shared/contract/weather';
import { Accordion, Anchor, Button, Select, Textarea, TextInput } from '@mantine/core';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { DraftNote } from '../../components/draft-note';
import { ErrorSummary } from '../../components/error-summary';
import {
  GROUND_CONTROLS,
  MODULE_CONTROLS,
  POWER_CONTROLS,
  ROW_CONTROLS,
  type Control,
} from './controls';
import { azimuthAlong, usualAzimuth, type LayoutDraft, type ModuleDraft } from './design';
import classes from './designer.module.css';
import { GapControls } from './gap-controls';
import { KindPicker } from './kind-picker';
import { presetOf } from './presets';
import { inputId, SliderNumber } from './slider-number';
import { TrackerControls } from './tracker-controls';
import { TramlineLock } from './tramline-lock';
import type { DesignWork } from './use-design';

interface Props {
  work: DesignWork;
  field: Field;
  weather: readonly Weather[];
}

const SECTIONS = ['rows', 'ground', 'tracker', 'modules'];

/** Everything that can be decided about the rows. */
export function ControlPanel({ work, field, weather }: Props) {
  const { design, messages, locked: disabled, setLayout, set } = work;
  const { layout } = design;
  const [open, setOpen] = useState<string[]>(['rows']);
  const failed = work.asked && Object.keys(messages).length > 0;
  const latitude = field.pin[1];

  const quantity = <Key extends string>(
    { key, notFor, ...control }: Control<Key>,
    prefix: string,
    value: number | null,
    onChange: (value: number | null) => void,
  ) =>
    notFor?.includes(layout.kind) ? null : (
      <SliderNumber
        key={key}
        {...control}
        path={`${prefix}.${key}`}
        value={value}
        error={messages[`${prefix}.${key}`]}
        disabled={disabled}
        onChange={onChange}
      />
    );
  const ofLayout = (controls: typeof ROW_CONTROLS) =>
    controls.map((control) =>
      quantity(control, 'layout', layout[control.key], (value) =>
        setLayout({ [control.key]: value } as Partial<LayoutDraft>),
      ),
    );
  const setModule = (patch: Partial<ModuleDraft>) =>
    setLayout({ module: { ...layout.module, ...patch } });
  const chooseKind = (kind: LayoutKind) => {
    const { module, headlandM, sideMarginM, offsetM } = layout;
    set({
      ...design,
      layout: { ...presetOf(kind, latitude), module, headlandM, sideMarginM, offsetM },
    });
  };

  return (
    <div className={classes.panel}>
      {failed && <ErrorSummary messages={messages} idOf={inputId} />}
      <TextInput
        id={inputId('name')}
        label="Scenario name"
        placeholder="For example: raised, 11 m"
        value={design.name}
        onChange={(event) => set({ ...design, name: event.currentTarget.value })}
        error={messages.name}
      />
      <KindPicker value={layout.kind} onChange={chooseKind} disabled={disabled} />
      <Accordion
        multiple
        value={failed ? SECTIONS : open}
        onChange={setOpen}
        variant="default"
        chevronPosition="right"
        classNames={{ control: classes.sectionControl, content: classes.sectionContent }}
      >
        <Accordion.Item value="rows">
          <Accordion.Control>Rows</Accordion.Control>
          <Accordion.Panel>
            {ofLayout(ROW_CONTROLS)}
            {field.geometry && (
              <Button
                variant="default"
                size="compact-sm"
                disabled={disabled}
                onClick={() =>
                  setLayout({
                    azimuthDeg: azimuthAlong(
                      field.geometry?.longestSideBearingDeg ?? 0,
                      usualAzimuth(layout.kind, latitude),
                    ),
                  })
                }
              >
                Lay rows along the longest side
              </Button>
            )}
          </Accordion.Panel>
        </Accordion.Item>
        {layout.tracker && (
          <Accordion.Item value="tracker">
            <Accordion.Control>Tracker</Accordion.Control>
            <Accordion.Panel>
              <TrackerControls
                tracker={layout.tracker}
                messages={messages}
                disabled={disabled}
                onChange={(tracker) => setLayout({ tracker })}
              />
            </Accordion.Panel>
          </Accordion.Item>
        )}
        <Accordion.Item value="ground">
          <Accordion.Control>On the field</Accordion.Control>
          <Accordion.Panel>
            {ofLayout(GROUND_CONTROLS)}
            <TramlineLock
              layout={work.shown}
              disabled={disabled}
              onPitch={(pitchM) => setLayout({ pitchM })}
            />
          </Accordion.Panel>
        </Accordion.Item>
        <Accordion.Item value="modules">
          <Accordion.Control>Modules and power</Accordion.Control>
          <Accordion.Panel>
            {MODULE_CONTROLS.map((control) =>
              quantity(control, 'layout.module', layout.module[control.key], (value) =>
                setModule({ [control.key]: value }),
              ),
            )}
            {ofLayout(POWER_CONTROLS)}
            <GapControls
              gaps={layout.gaps}
              message={messages['layout.gaps.gapM']}
              disabled={disabled}
              onChange={(gaps) => setLayout({ gaps })}
            />
          </Accordion.Panel>
        </Accordion.Item>
      </Accordion>
      <Select
        id={inputId('weatherId')}
        label="Weather year"
        placeholder={weather.length > 0 ? 'Choose a weather year' : 'None on the shelf yet'}
        data={weather.map(({ id, name }) => ({ value: id, label: name }))}
        value={design.weatherId}
        onChange={(weatherId) => set({ ...design, weatherId })}
        error={messages.weatherId}
        disabled={disabled}
        description={
          <Anchor component={Link} to="/weather" size="xs">
            Add one on the weather shelf
          </Anchor>
        }
      />
      <Textarea
        id={inputId('notes')}
        label="Notes"
        autosize
        minRows={2}
        value={design.notes}
        onChange={(event) => set({ ...design, notes: event.currentTarget.value })}
        error={messages.notes}
      />
      <DraftNote {...work.draft} onDrop={work.dropDraft} />
    </div>
  );
}
