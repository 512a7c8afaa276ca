import type { Field, FieldPatch } from '@furrowlight/shared/contract/fields';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiProblem } from '../../../lib/api';
import { changeField, fieldQuery } from '../../../queries/fields';

export interface FieldSave {
  /** True when the write was accepted. */
  save: (patch: FieldPatch) => Promise<boolean>;
  saving: boolean;
  /** Per-field messages of the last refusal. */
  messages: Record<string, string>;
  setMessages: (messages: Record<string, string>) => void;
  problem: unknown;
  /** Someone else wrote in between; `keepMine` sends the refused patch again over their version. */
  conflict: { keepMine: () => Promise<boolean>; takeTheirs: () => Promise<Field> } | null;
}

/** Writes to a field under its version, with the answers a form shows. */
export function useFieldSave(field: Field): FieldSave {
  const client = useQueryClient();
  const change = useMutation(changeField(client));
  const [messages, setMessages] = useState<Record<string, string>>({});
  const [problem, setProblem] = useState<unknown>(null);
  const [refused, setRefused] = useState<FieldPatch | null>(null);

  const send = async (patch: FieldPatch, version: number): Promise<boolean> => {
    setProblem(null);
    setMessages({});
    try {
      await change.mutateAsync({ id: field.id, version, patch });
      setRefused(null);
      return true;
    } catch (error) {
      const stale = error instanceof ApiProblem && error.status === 412;
      setRefused(stale ? patch : null);
      if (error instanceof ApiProblem && !stale) setMessages(error.fieldErrors);
      setProblem(error);
      return false;
    }
  };
  const theirs = () => client.fetchQuery({ ...fieldQuery(field.id), staleTime: 0 });

  return {
    save: (patch) => send(patch, field.version),
    saving: change.isPending,
    messages,
    setMessages,
    problem,
    conflict: refused && {
      keepMine: async () => send(refused, (await theirs()).version),
      takeTheirs: async () => {
        setRefused(null);
        setProblem(null);
        return theirs();
      },
    },
  };
}
