import { WeatherInput } from '@furrowlight/shared/contract/weather';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiProblem, newIdempotencyKey } from '../../lib/api';
import { fieldMessages } from '../../lib/field-messages';
import { createWeather } from '../../queries/weather';

/** Check a weather year by the contract, store it, and keep what refuses it. */
export function useStoreWeather(onDone: () => void) {
  const client = useQueryClient();
  const create = useMutation(createWeather(client));
  const [key, setKey] = useState(newIdempotencyKey);
  const [messages, setMessages] = useState<Record<string, string>>({});

  const store = (candidate: unknown) => {
    const found = fieldMessages(WeatherInput, candidate);
    setMessages(found);
    if (Object.keys(found).length > 0) return;
    create.mutate(
      { input: WeatherInput.parse(candidate), idempotencyKey: key },
      {
        onSuccess: onDone,
        onError: (error) => {
          setKey(newIdempotencyKey());
          if (error instanceof ApiProblem) setMessages(error.fieldErrors);
        },
      },
    );
  };
  const unplaced =
    create.error instanceof ApiProblem && create.error.errors.length > 0 ? null : create.error;
  return { store, messages, pending: create.isPending, problem: unplaced };
}
