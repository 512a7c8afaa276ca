import type { Field } from '@furrowlight/shared/contract/fields';
import type { Layout } from '@furrowlight/shared/contract/layout';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiProblem, newIdempotencyKey } from '../../lib/api';
import { useDraft } from '../../lib/use-draft';
import { changeScenario, createScenario, scenarioQuery } from '../../queries/scenarios';
import {
  designMessages,
  designOf,
  isSameDesign,
  soundLayout,
  type Design,
  type LayoutDraft,
} from './design';
import { presetOf } from './presets';

const OPEN_STATES = ['queued', 'running', 'done'];

function startOf(field: Field, scenario: Scenario | null, weatherId: string | null): Design {
  if (scenario) return designOf(scenario);
  const layout = presetOf('overhead-fixed', field.pin[1]);
  return { name: '', notes: '', weatherId, layout };
}

/** The design under work: draft, last rows that could stand, messages, saving. */
export function useDesign(field: Field, scenario: Scenario | null, weatherId: string | null) {
  const client = useQueryClient();
  const create = useMutation(createScenario(client));
  const change = useMutation(changeScenario(client));
  const [key, setKey] = useState(newIdempotencyKey);
  const [start] = useState(() => startOf(field, scenario, weatherId));
  const draft = useDraft<Design>(`scenario:${scenario?.id ?? `new:${field.id}`}`, start);
  const [shown, setShown] = useState<Layout>(
    () => soundLayout(draft.value.layout) ?? presetOf('overhead-fixed', field.pin[1]),
  );
  const [asked, setAsked] = useState(false);
  const [problem, setProblem] = useState<unknown>(null);
  const design = draft.value;
  const saved = scenario ? designOf(scenario) : null;
  const locked = OPEN_STATES.includes(scenario?.latestRun?.status ?? '');
  const live = designMessages(design);
  const refused = problem instanceof ApiProblem ? problem.fieldErrors : {};
  // A name may stay empty until someone saves; numbers answer at once, for rows stand or collide now.
  const messages = asked
    ? { ...refused, ...live }
    : Object.fromEntries(Object.entries(live).filter(([path]) => path !== 'name'));

  const set = (next: Design) => {
    draft.set(next);
    setProblem(null);
    const sound = soundLayout(next.layout);
    if (sound) setShown(sound);
  };
  const back = (next: Design) => {
    draft.clear(next);
    setProblem(null);
    setShown(soundLayout(next.layout) ?? shown);
  };

  const write = async (version: number | undefined): Promise<Scenario | null> => {
    setAsked(true);
    setProblem(null);
    const layout = soundLayout(design.layout);
    if (!layout || Object.keys(live).length > 0) return null;
    const { name, notes } = design;
    const frozen = locked ? {} : { layout, weatherId: design.weatherId };
    try {
      const made =
        scenario && version
          ? await change.mutateAsync({
              id: scenario.id,
              version,
              patch: { name, notes, ...frozen },
            })
          : await create.mutateAsync({
              input: { fieldId: field.id, name, notes, layout, weatherId: design.weatherId },
              idempotencyKey: key,
            });
      setKey(newIdempotencyKey());
      draft.clear(designOf(made));
      setAsked(false);
      return made;
    } catch (error) {
      setProblem(error);
      return null;
    }
  };
  const theirs = async (): Promise<Scenario | null> =>
    scenario
      ? client.fetchQuery({ ...scenarioQuery(scenario.id), staleTime: 0 })
      : Promise.resolve(null);

  return {
    design,
    shown,
    messages,
    locked,
    problem,
    asked,
    draft,
    dirty: saved === null || !isSameDesign(saved, design),
    saving: create.isPending || change.isPending,
    set,
    setLayout: (patch: Partial<LayoutDraft>) =>
      set({ ...design, layout: { ...design.layout, ...patch } }),
    save: () => write(scenario?.version),
    dropDraft: () => back(saved ?? start),
    takeTheirs: async () => {
      const found = await theirs();
      if (found) back(designOf(found));
    },
    keepMine: async () => write((await theirs())?.version),
  };
}

export type DesignWork = ReturnType<typeof useDesign>;
