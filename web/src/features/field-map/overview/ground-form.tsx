import { FieldPatch, type Field } from '@furrowlight/shared/contract/fields';
import { Button, Textarea, TextInput } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMemo, type FormEvent } from 'react';
import { DraftNote } from '../../../components/draft-note';
import { ErrorSummary } from '../../../components/error-summary';
import { NumberField } from '../../../components/number-field';
import { Term } from '../../../components/term';
import { fieldMessages } from '../../../lib/field-messages';
import { compassPoint } from '../../../lib/format';
import { changesOf } from '../../../lib/merge';
import { useMay } from '../../../lib/use-may';
import { useBasedDraft, type Base } from '../../../lib/use-based-draft';
import classes from './overview.module.css';
import { SaveAnswers } from './save-answers';
import { useFieldSave } from './use-field-save';

const idOf = (path: string) => `ground-${path}`;

function valuesOf(field: Field) {
  const { name, elevationM, slopePercent, aspectDeg, albedo, notes } = field;
  return { name, elevationM, slopePercent, aspectDeg, albedo, notes } as {
    name: string;
    elevationM: number | null;
    slopePercent: number | null;
    aspectDeg: number | null;
    albedo: number | null;
    notes: string;
  };
}

/** Name, lie of the land and how bright the ground is. */
export function GroundForm({ field }: { field: Field }) {
  const write = useFieldSave(field);
  const mayWrite = useMay('fields:write');
  const current = useMemo(() => valuesOf(field), [field]);
  const draft = useBasedDraft(`ground:${field.id}`, current, field.version);
  const values = draft.value;
  const set = (change: Partial<typeof values>) => draft.set({ ...values, ...change });
  const number = (name: 'elevationM' | 'slopePercent' | 'aspectDeg' | 'albedo') => ({
    id: idOf(name),
    value: values[name],
    onChange: (value: number | null) => set({ [name]: value }),
    error: write.messages[name],
  });
  const saved = () => {
    draft.clear();
    notifications.show({ message: `${values.name} is saved.` });
  };
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const found = fieldMessages(FieldPatch, values);
    write.setMessages(found);
    if (Object.keys(found).length > 0) return;
    const patch = FieldPatch.parse(changesOf(draft.base.value, values));
    if (await write.save(patch, draft.base as Base<Partial<Field>>)) saved();
  };

  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <fieldset disabled={!mayWrite} className={classes.form}>
        <ErrorSummary messages={write.messages} idOf={idOf} />
        <SaveAnswers write={write} onTheirs={draft.clear} onSaved={saved} />
        <TextInput
          id={idOf('name')}
          label="Field name"
          value={values.name}
          onChange={(event) => set({ name: event.currentTarget.value })}
          error={write.messages.name}
        />
        <div className={classes.grid}>
          <NumberField
            label="Slope"
            unit="%"
            step={0.5}
            min={0}
            max={60}
            {...number('slopePercent')}
          />
          <NumberField
            label="Falls towards"
            unit={values.aspectDeg === null ? '°' : `° ${compassPoint(values.aspectDeg)}`}
            step={5}
            min={0}
            max={360}
            {...number('aspectDeg')}
          />
          <NumberField label="Elevation" unit="m" step={10} {...number('elevationM')} />
          <NumberField label="Albedo" step={0.01} min={0.05} max={0.9} {...number('albedo')} />
        </div>
        <p className={classes.hint}>
          <Term of="aspect">Falls towards</Term> is clockwise from north.{' '}
          <Term of="albedo">Albedo</Term> is the share of light the ground throws back: green crops
          about 0.20, straw 0.30.
        </p>
        <Textarea
          id={idOf('notes')}
          label="Notes"
          autosize
          minRows={2}
          value={values.notes}
          onChange={(event) => set({ notes: event.currentTarget.value })}
          error={write.messages.notes}
        />
        {mayWrite && (
          <div className={classes.foot}>
            <Button type="submit" loading={write.saving} disabled={!draft.changed}>
              Save the ground
            </Button>
            <DraftNote {...draft} onDrop={draft.clear} />
          </div>
        )}
      </fieldset>
    </form>
  );
}
