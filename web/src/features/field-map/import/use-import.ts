import { notifications } from '@mantine/notifications';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiProblem, newIdempotencyKey } from '../../../lib/api';
import { createField } from '../../../queries/fields';
import { middleOf } from '../add/middle-of';
import type { ReadPolygon } from './parse-geojson';

/** Saves read polygons one after the other; those refused stay in the list with the reason. */
export function useImport(onDone: () => void) {
  const client = useQueryClient();
  const create = useMutation(createField(client));
  const [busy, setBusy] = useState(false);
  const [outcomes, setOutcomes] = useState<ReadonlyMap<number, string>>(new Map());
  const [saved, setSaved] = useState<ReadonlySet<ReadPolygon>>(new Set());

  const run = async (farmId: string, polygons: readonly ReadPolygon[]) => {
    setBusy(true);
    const refused = new Map<number, string>();
    const done = new Set(saved);
    for (const [i, polygon] of polygons.entries()) {
      if (done.has(polygon)) continue;
      try {
        await create.mutateAsync({
          input: {
            farmId,
            name: polygon.name || `Field ${i + 1}`,
            pin: middleOf(polygon.boundary),
            boundary: polygon.boundary,
          },
          idempotencyKey: newIdempotencyKey(),
        });
        done.add(polygon);
      } catch (error) {
        const problem = error instanceof ApiProblem ? error : null;
        refused.set(i, problem?.errors[0]?.message ?? problem?.detail ?? 'It could not be saved.');
      }
    }
    setSaved(done);
    setOutcomes(refused);
    setBusy(false);
    const count = polygons.length - refused.size;
    notifications.show({
      message:
        refused.size === 0
          ? `${count} ${count === 1 ? 'field is' : 'fields are'} added.`
          : `${count} added, ${refused.size} refused; the reasons stand in the list.`,
    });
    if (refused.size === 0) onDone();
  };
  return { run, busy, outcomes };
}
