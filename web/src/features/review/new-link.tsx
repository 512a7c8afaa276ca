import { ReviewInput } from '@furrowlight/shared/contract/reviews';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { Button, Checkbox, CopyButton, Group, TextInput, Textarea } from '@mantine/core';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ErrorPanel } from '../../components/error-panel';
import { ErrorSummary } from '../../components/error-summary';
import { NumberField } from '../../components/number-field';
import { ApiProblem, newIdempotencyKey } from '../../lib/api';
import { fieldMessages } from '../../lib/field-messages';
import { createReview } from '../../queries/reviews';
import classes from './review-links.module.css';

interface Props {
  fieldId: string;
  /** Scenarios with a finished run. */
  ready: readonly Scenario[];
  onDone: () => void;
}

const MOST = 4;
const idOf = (path: string) => `review-${path}`;

/** Chooses what is shown, writes the greeting, makes the link and tells it once. */
export function NewLink({ fieldId, ready, onDone }: Props) {
  const client = useQueryClient();
  const create = useMutation(createReview(client));
  const [key] = useState(newIdempotencyKey);
  const [scenarioIds, setScenarioIds] = useState<string[]>(ready.length === 1 ? [ready[0].id] : []);
  const [message, setMessage] = useState('');
  const [days, setDays] = useState<number | null>(30);
  const [messages, setMessages] = useState<Record<string, string>>({});

  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const input = { fieldId, scenarioIds, message, expiresInDays: days };
    const found = fieldMessages(ReviewInput, input);
    setMessages(found);
    if (Object.keys(found).length > 0 || days === null) return;
    try {
      await create.mutateAsync({ input: { ...input, expiresInDays: days }, idempotencyKey: key });
    } catch (error) {
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
    }
  };

  if (create.data) {
    const { url } = create.data;
    return (
      <div className={classes.form} role="status">
        <p className={classes.made}>
          <strong>The link is ready.</strong> Send it to the farmer yourself. It is shown only now;
          if it gets lost, make another.
        </p>
        <div className={classes.url}>
          <TextInput
            aria-label="Review link"
            value={url}
            readOnly
            onFocus={(event) => event.currentTarget.select()}
          />
          <CopyButton value={url} timeout={4000}>
            {({ copied, copy }) => <Button onClick={copy}>{copied ? 'Copied' : 'Copy'}</Button>}
          </CopyButton>
        </div>
        <Button variant="subtle" onClick={onDone}>
          Done
        </Button>
      </div>
    );
  }
  return (
    <form className={classes.form} onSubmit={(event) => void submit(event)} noValidate>
      <ErrorSummary messages={messages} idOf={idOf} />
      {create.error && Object.keys(messages).length === 0 && <ErrorPanel error={create.error} />}
      <Checkbox.Group
        id={idOf('scenarioIds')}
        tabIndex={-1}
        label={`What is shown, up to ${MOST} scenarios`}
        value={scenarioIds}
        onChange={setScenarioIds}
        error={messages.scenarioIds}
      >
        <div className={classes.choices}>
          {ready.map(({ id, name }) => (
            <Checkbox
              key={id}
              value={id}
              label={name}
              disabled={scenarioIds.length >= MOST && !scenarioIds.includes(id)}
            />
          ))}
        </div>
      </Checkbox.Group>
      <Textarea
        id={idOf('message')}
        label="Greeting"
        description="Stands on top of the page."
        autosize
        minRows={2}
        value={message}
        onChange={(event) => setMessage(event.currentTarget.value)}
        error={messages.message}
      />
      <NumberField
        id={idOf('expiresInDays')}
        label="Open for"
        unit="days"
        min={1}
        max={180}
        value={days}
        onChange={setDays}
        error={messages.expiresInDays}
        className={classes.days}
      />
      <Group gap="xs">
        <Button type="submit" loading={create.isPending}>
          Make the link
        </Button>
        <Button variant="subtle" onClick={onDone}>
          Close
        </Button>
      </Group>
    </form>
  );
}
