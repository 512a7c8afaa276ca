import { FieldInput, type Boundary, type LonLat } from '@furrowlight/shared/contract/fields';
import { Anchor, Button, Select, TextInput } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { ErrorPanel } from '../../../components/error-panel';
import { ErrorSummary } from '../../../components/error-summary';
import { ApiProblem, newIdempotencyKey } from '../../../lib/api';
import { fieldMessages } from '../../../lib/field-messages';
import { useDraft } from '../../../lib/use-draft';
import { farmListQuery } from '../../../queries/farms';
import { createField } from '../../../queries/fields';
import classes from './add-panel.module.css';
import { middleOf } from './middle-of';

interface Props {
  boundary: Boundary | null;
  pin: LonLat | null;
  /** True while a ring is still being drawn. */
  unfinished: boolean;
  farmId: string | null;
  onSaved: () => void;
  onClose: () => void;
}

const idOf = (path: string) => `new-field-${path}`;
const EMPTY_FORM = { name: '', farmId: null as string | null };

export function NewFieldForm({ boundary, pin, unfinished, farmId, onSaved, onClose }: Props) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const farms = useQuery(farmListQuery);
  const create = useMutation(createField(client));
  const draft = useDraft('field:new', { ...EMPTY_FORM, farmId });
  const [key, setKey] = useState(newIdempotencyKey);
  const [messages, setMessages] = useState<Record<string, string>>({});
  const { name } = draft.value;
  const chosenFarm =
    draft.value.farmId ?? farmId ?? (farms.data?.length === 1 ? farms.data[0].id : null);

  const check = (): Record<string, string> => {
    const found: Record<string, string> = {};
    if (unfinished) found.boundary = 'The boundary is not finished: press Finish or take it back.';
    else if (!boundary && !pin) found.boundary = 'There is no boundary or pin on the map yet.';
    if (!chosenFarm) found.farmId = 'Choose the farm it belongs to.';
    const wrongName = fieldMessages(FieldInput.shape.name, name)[''];
    if (wrongName) found.name = wrongName;
    return found;
  };
  const onSubmit = async (event: FormEvent) => {
    event.preventDefault();
    const found = check();
    setMessages(found);
    const place = boundary ? middleOf(boundary) : pin;
    if (Object.keys(found).length > 0 || !chosenFarm || !place) return;
    try {
      const field = await create.mutateAsync({
        input: { farmId: chosenFarm, name: name.trim(), pin: place, boundary },
        idempotencyKey: key,
      });
      draft.clear({ ...EMPTY_FORM, farmId: chosenFarm });
      notifications.show({ message: `${field.name} is added.` });
      onSaved();
      await navigate(`/fields/${field.id}`);
    } catch (error) {
      setKey(newIdempotencyKey());
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
    }
  };

  return (
    <form className={classes.form} onSubmit={(event) => void onSubmit(event)} noValidate>
      <ErrorSummary messages={messages} idOf={idOf} />
      {create.isError && Object.keys(messages).length === 0 && <ErrorPanel error={create.error} />}
      <TextInput
        id={idOf('name')}
        label="Field name"
        value={name}
        onChange={(event) => draft.set({ ...draft.value, name: event.currentTarget.value })}
        error={messages.name}
      />
      <Select
        id={idOf('farmId')}
        label="Farm"
        searchable
        data={(farms.data ?? []).map((farm) => ({ value: farm.id, label: farm.name }))}
        value={chosenFarm}
        onChange={(id) => draft.set({ ...draft.value, farmId: id })}
        error={messages.farmId}
        nothingFoundMessage="No farm has that name"
      />
      {farms.data?.length === 0 && (
        <p className={classes.hint}>
          There is no farm yet.{' '}
          <Anchor component={Link} to="/farms?add=1">
            Add one first
          </Anchor>
          ; what you drew stays here.
        </p>
      )}
      <div className={classes.foot}>
        <Button type="submit" loading={create.isPending}>
          Save the field
        </Button>
        <Button variant="subtle" onClick={onClose}>
          Cancel
        </Button>
      </div>
    </form>
  );
}
