import { FarmInput, type Farm, type FarmPatch } from '@furrowlight/shared/contract/farms';
import { Button, Group, Select, Textarea, TextInput } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo, useState, type FormEvent } from 'react';
import { ConflictPanel } from '../../components/conflict-panel';
import { DraftNote } from '../../components/draft-note';
import { ErrorPanel } from '../../components/error-panel';
import { ErrorSummary } from '../../components/error-summary';
import { showUndo } from '../../components/undo-notice';
import { ApiProblem, newIdempotencyKey } from '../../lib/api';
import { fieldMessages } from '../../lib/field-messages';
import { changesOf } from '../../lib/merge';
import { showRefusal } from '../../lib/show-refusal';
import { useBasedDraft } from '../../lib/use-based-draft';
import { restore } from '../../queries/bin';
import { changeFarm, createFarm, farmListQuery, farmQuery, removeFarm } from '../../queries/farms';
import { memberListQuery } from '../../queries/members';
import classes from './farms.module.css';

const idOf = (path: string) => `farm-${path}`;

function valuesOf(farm: Farm | null) {
  return {
    name: farm?.name ?? '',
    holder: farm?.holder ?? '',
    farmNumber: farm?.farmNumber ?? '',
    place: farm?.place ?? '',
    advisorId: farm?.advisorId ?? null,
    notes: farm?.notes ?? '',
  };
}

function useFarmWrites(farm: Farm | null) {
  const client = useQueryClient();
  const create = useMutation(createFarm(client));
  const change = useMutation(changeFarm(client));
  const remove = useMutation(removeFarm(client));
  const bringBack = useMutation(restore(client));
  const [key] = useState(newIdempotencyKey);
  const save = (input: FarmInput, patch: FarmPatch, version: number) =>
    farm
      ? change.mutateAsync({ id: farm.id, version, patch })
      : create.mutateAsync({ input, idempotencyKey: key });
  return { client, save, remove, bringBack, saving: create.isPending || change.isPending };
}

export function FarmForm({ farm, onDone }: { farm: Farm | null; onDone: () => void }) {
  const { client, save, remove, bringBack, saving } = useFarmWrites(farm);
  const members = useQuery(memberListQuery);
  const current = useMemo(() => valuesOf(farm), [farm]);
  const draft = useBasedDraft(`farm:${farm?.id ?? 'new'}`, current, farm?.version ?? 0);
  const [messages, setMessages] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<unknown>(null);
  const values = draft.value;
  const text = (name: 'name' | 'holder' | 'farmNumber' | 'place') => ({
    id: idOf(name),
    value: values[name],
    onChange: (event: { currentTarget: { value: string } }) =>
      draft.set({ ...values, [name]: event.currentTarget.value }),
    error: messages[name],
  });
  const conflict = problem instanceof ApiProblem && problem.status === 412;

  const submit = async (version = draft.base.version) => {
    const found = fieldMessages(FarmInput, values);
    setMessages(found);
    setProblem(null);
    if (Object.keys(found).length > 0) return;
    try {
      await save(values, changesOf(draft.base.value, values), version);
      draft.clear();
      notifications.show({
        message: farm ? `${values.name} is saved.` : `${values.name} is added.`,
      });
      onDone();
    } catch (error) {
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
      setProblem(error);
    }
  };
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    void submit();
  };
  const takeTheirs = async () => {
    await client.invalidateQueries({ queryKey: farmListQuery.queryKey });
    draft.clear();
    setProblem(null);
  };
  const keepMine = async () => {
    if (!farm) return;
    const theirs = await client.fetchQuery({ ...farmQuery(farm.id), staleTime: 0 });
    await submit(theirs.version);
  };
  const putAway = (doomed: Farm) =>
    remove
      .mutateAsync({ id: doomed.id, version: doomed.version })
      .then(() => {
        showUndo(`${doomed.name} is in the bin for 30 days.`, () =>
          bringBack
            .mutateAsync({ kind: 'farm', id: doomed.id })
            .catch((error: unknown) => showRefusal(`${doomed.name} stays in the bin`, error)),
        );
        onDone();
      })
      .catch(setProblem);

  return (
    <form onSubmit={onSubmit} noValidate className={classes.form}>
      <ErrorSummary messages={messages} idOf={idOf} />
      {conflict && (
        <ConflictPanel
          what="this farm"
          busy={saving}
          onTheirs={() => void takeTheirs()}
          onMine={() => void keepMine()}
        />
      )}
      {problem !== null && !conflict && Object.keys(messages).length === 0 && (
        <ErrorPanel error={problem} />
      )}
      <TextInput label="Farm name" data-autofocus {...text('name')} />
      <TextInput
        label="Holder"
        description="The person who farms it, as letters should name them."
        {...text('holder')}
      />
      <TextInput label="Place" {...text('place')} />
      <TextInput label="Farm number" {...text('farmNumber')} />
      <Select
        id={idOf('advisorId')}
        label="Advisor in charge"
        placeholder="Nobody yet"
        clearable
        searchable
        data={(members.data ?? [])
          .filter((member) => member.active && ['advisor', 'admin'].includes(member.role))
          .map((member) => ({ value: member.id, label: member.name }))}
        value={values.advisorId}
        onChange={(advisorId) => draft.set({ ...values, advisorId })}
        error={messages.advisorId}
      />
      <Textarea
        id={idOf('notes')}
        label="Notes"
        autosize
        minRows={3}
        value={values.notes}
        onChange={(event) => draft.set({ ...values, notes: event.currentTarget.value })}
        error={messages.notes}
      />
      <DraftNote {...draft} onDrop={draft.clear} />
      <div className={classes.foot}>
        <Group gap="xs">
          <Button type="submit" loading={saving}>
            {farm ? 'Save' : 'Add the farm'}
          </Button>
          <Button variant="subtle" onClick={onDone}>
            Close
          </Button>
        </Group>
        {farm && (
          <Button
            variant="subtle"
            color="danger"
            loading={remove.isPending}
            onClick={() => void putAway(farm)}
          >
            Remove
          </Button>
        )}
      </div>
    </form>
  );
}
