import type { Field, FieldPatch } from '@furrowlight/shared/contract/fields';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiProblem } from '../../../lib/api';
import { collide } from '../../../lib/merge';
import type { Base } from '../../../lib/use-based-draft';
import { changeField, fieldQuery } from '../../../queries/fields';

export interface FieldSave {
  /**
   * True when the write was accepted. Changes by others to other parts of the field stand; a change
   * to the same part becomes a conflict.
   */
  save: (patch: FieldPatch, base: Base<Partial<Field>>) => Promise<boolean>;
  saving: boolean;
  /** Per-field messages of the last refusal. */
  messages: Record<string, string>;
  setMessages: (messages: Record<string, string>) => void;
  problem: unknown;
  /** Someone else wrote the same part in between. */
  conflict: { keepMine: () => Promise<boolean>; takeTheirs: () => void } | null;
}

const isStale = (error: unknown) => error instanceof ApiProblem && error.status === 412;

/** Writes to a field under the version they were begun from, with the answers a form shows. */
export function useFieldSave(field: Field): FieldSave {
  const client = useQueryClient();
  const change = useMutation(changeField(client));
  const [messages, setMessages] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<unknown>(null);
  const [refused, setRefused] = useState<{ patch: FieldPatch; theirs: Field } | null>(null);
  const write = (patch: FieldPatch, version: number) =>
    change.mutateAsync({ id: field.id, version, patch });

  const attempt = async (work: () => Promise<boolean>): Promise<boolean> => {
    setProblem(null);
    setMessages({});
    setRefused(null);
    try {
      return await work();
    } catch (error) {
      if (error instanceof ApiProblem) setMessages(error.fieldErrors);
      setProblem(error);
      return false;
    }
  };
  const save: FieldSave['save'] = (patch, base) =>
    attempt(async () => {
      try {
        await write(patch, base.version);
        return true;
      } catch (error) {
        if (!isStale(error)) throw error;
      }
      const theirs = await client.fetchQuery({ ...fieldQuery(field.id), staleTime: 0 });
      if (collide(patch, base.value, theirs)) {
        setRefused({ patch, theirs });
        return false;
      }
      await write(patch, theirs.version);
      return true;
    });

  return {
    save,
    saving: change.isPending,
    messages,
    setMessages,
    problem,
    conflict: refused && {
      keepMine: () =>
        attempt(async () => {
          await write(refused.patch, refused.theirs.version);
          return true;
        }),
      takeTheirs: () => setRefused(null),
    },
  };
}
