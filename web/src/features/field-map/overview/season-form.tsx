import { SeasonInput, type FieldSeason } from '@furrowlight/shared/contract/fields';
import { Button, Select, type ComboboxItem, type ComboboxItemGroup } from '@mantine/core';
import { DatePickerInput } from '@mantine/dates';
import '@mantine/dates/styles.layer.css';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState, type FormEvent } from 'react';
import { ErrorPanel } from '../../../components/error-panel';
import { ErrorSummary } from '../../../components/error-summary';
import { NumberField } from '../../../components/number-field';
import { ApiProblem, newIdempotencyKey } from '../../../lib/api';
import { fieldMessages } from '../../../lib/field-messages';
import { useBasedDraft } from '../../../lib/use-based-draft';
import { cropListQuery } from '../../../queries/crops';
import { changeSeason, createSeason } from '../../../queries/seasons';
import classes from './overview.module.css';
import { daysBetween, usualDates } from './season-dates';

interface Props {
  fieldId: string;
  /** The season to change; null for a new one. */
  season: FieldSeason | null;
  onDone: () => void;
}

const idOf = (path: string) => `season-${path}`;

function valuesOf(season: FieldSeason | null) {
  return {
    cropId: season?.cropId ?? null,
    sowing: season?.sowing ?? null,
    harvest: season?.harvest ?? null,
    canopyHeightM: season?.canopyHeightM ?? null,
  } as {
    cropId: string | null;
    sowing: string | null;
    harvest: string | null;
    canopyHeightM: number | null;
  };
}

function check(values: ReturnType<typeof valuesOf>): Record<string, string> {
  const found = fieldMessages(SeasonInput, values);
  if (!values.cropId) found.cropId = 'Choose a crop.';
  if (values.sowing && values.harvest) {
    const days = daysBetween(values.sowing, values.harvest);
    if (days < 1) found.harvest = 'Harvest must come after sowing.';
    else if (days > 366) found.harvest = 'A season may last 366 days at most.';
  }
  return found;
}

export function SeasonForm({ fieldId, season, onDone }: Props) {
  const client = useQueryClient();
  const crops = useQuery(cropListQuery);
  const create = useMutation(createSeason(client, fieldId));
  const change = useMutation(changeSeason(client, fieldId));
  const [key] = useState(newIdempotencyKey);
  const current = useMemo(() => valuesOf(season), [season]);
  const draft = useBasedDraft(
    `season:${fieldId}:${season?.id ?? 'new'}`,
    current,
    season?.version ?? 0,
  );
  const [messages, setMessages] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<unknown>(null);
  const values = draft.value;

  const groups = useMemo(() => {
    const byGroup = new Map<string, ComboboxItemGroup<ComboboxItem>>();
    for (const crop of crops.data ?? []) {
      const name = crop.group.charAt(0).toUpperCase() + crop.group.slice(1);
      const group = byGroup.get(crop.group) ?? { group: name, items: [] };
      group.items.push({ value: crop.id, label: crop.name });
      byGroup.set(crop.group, group);
    }
    return [...byGroup.values()];
  }, [crops.data]);

  const chooseCrop = (cropId: string | null) => {
    const crop = crops.data?.find(({ id }) => id === cropId);
    const usual = crop && usualDates(crop, new Date().toISOString().slice(0, 10));
    draft.set({
      cropId,
      sowing: season ? values.sowing : (usual?.sowing ?? values.sowing),
      harvest: season ? values.harvest : (usual?.harvest ?? values.harvest),
      canopyHeightM: crop?.designHeightM ?? values.canopyHeightM,
    });
  };
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const found = check(values);
    setMessages(found);
    setProblem(null);
    if (Object.keys(found).length > 0) return;
    const input = SeasonInput.parse(values);
    try {
      if (season)
        await change.mutateAsync({ id: season.id, version: draft.base.version, patch: input });
      else await create.mutateAsync({ input, idempotencyKey: key });
      draft.clear();
      onDone();
    } catch (error) {
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
      setProblem(error);
    }
  };
  const date = (name: 'sowing' | 'harvest') => ({
    id: idOf(name),
    value: values[name],
    onChange: (value: string | null) => draft.set({ ...values, [name]: value }),
    error: messages[name],
    valueFormat: 'D MMM YYYY',
    clearable: false,
  });
  const length =
    values.sowing && values.harvest ? daysBetween(values.sowing, values.harvest) : null;

  return (
    <form className={classes.form} onSubmit={(event) => void submit(event)} noValidate>
      <ErrorSummary messages={messages} idOf={idOf} />
      {problem !== null && Object.keys(messages).length === 0 && <ErrorPanel error={problem} />}
      <Select
        id={idOf('cropId')}
        label="Crop"
        placeholder="Type a name"
        searchable
        comboboxProps={{ withinPortal: false }}
        data={groups}
        value={values.cropId}
        onChange={chooseCrop}
        error={messages.cropId}
        nothingFoundMessage="No crop has that name"
        data-autofocus
      />
      <div className={classes.grid}>
        <DatePickerInput label="Sowing" {...date('sowing')} />
        <DatePickerInput label="Harvest" {...date('harvest')} />
      </div>
      <NumberField
        id={idOf('canopyHeightM')}
        label="Canopy height"
        description="Top of the grown crop, where its light is counted."
        unit="m"
        step={0.1}
        min={0}
        max={8}
        value={values.canopyHeightM}
        onChange={(canopyHeightM) => draft.set({ ...values, canopyHeightM })}
        error={messages.canopyHeightM}
      />
      <p className={classes.hint}>
        {length !== null && length > 0 ? `${length} days from sowing to harvest. ` : ''}
        Dates proposed for a crop are common practice; the farmer&apos;s own are better.
      </p>
      <div className={classes.foot}>
        <Button type="submit" loading={create.isPending || change.isPending}>
          {season ? 'Save the season' : 'Add the season'}
        </Button>
        <Button variant="subtle" onClick={onDone}>
          Close
        </Button>
      </div>
    </form>
  );
}
