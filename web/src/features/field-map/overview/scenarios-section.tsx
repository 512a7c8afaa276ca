import type { Field } from '@furrowlight/shared/contract/fields';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { Button, Group, Skeleton, Switch } from '@mantine/core';
import { IconPlus, IconTimeline } from '@tabler/icons-react';
import type { UseQueryResult } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { ErrorPanel } from '../../../components/error-panel';
import { Section } from '../../../components/section';
import { useMay } from '../../../lib/use-may';
import { ScenarioCard } from './scenario-card';
import classes from './scenarios.module.css';

const MOST = 4;

interface Props {
  field: Field;
  scenarios: UseQueryResult<Scenario[]>;
}

/** The layouts tried on this field; up to four of them go on to the comparison. */
export function ScenariosSection({ field, scenarios }: Props) {
  const [chosen, setChosen] = useState<readonly string[]>([]);
  const [withArchived, setWithArchived] = useState(false);
  const mayWrite = useMay('scenarios:write');
  const all = scenarios.data ?? [];
  const archived = all.filter((scenario) => scenario.archived).length;
  const shown = all.filter((scenario) => withArchived || !scenario.archived);
  const toggle = (id: string) =>
    setChosen((before) =>
      before.includes(id) ? before.filter((other) => other !== id) : [...before, id],
    );
  return (
    <Section
      title="Scenarios"
      intro={
        scenarios.isSuccess && all.length === 0
          ? 'A scenario is one way of laying panel rows over this field. Try several: what you record here stays, and each result keeps the inputs it was worked out from.'
          : undefined
      }
      actions={
        <>
          {archived > 0 && (
            <Switch
              size="sm"
              label={`Archived (${archived})`}
              checked={withArchived}
              onChange={(event) => setWithArchived(event.currentTarget.checked)}
            />
          )}
          {field.boundary && mayWrite && (
            <Button
              component={Link}
              to={`/fields/${field.id}/scenarios/new`}
              leftSection={<IconPlus size={16} />}
            >
              Lay rows
            </Button>
          )}
        </>
      }
    >
      {scenarios.isPending && (
        <div className={classes.cards} aria-hidden>
          <Skeleton height={176} />
          <Skeleton height={176} />
        </div>
      )}
      {scenarios.isError && (
        <ErrorPanel error={scenarios.error} onRetry={() => void scenarios.refetch()} />
      )}
      {!field.boundary && scenarios.isSuccess && (
        <p className={classes.quiet}>Draw the boundary first; rows are laid inside it.</p>
      )}
      {shown.length > 0 && (
        <ul className={classes.cards}>
          {shown.map((scenario) => (
            <ScenarioCard
              key={scenario.id}
              scenario={scenario}
              mayChange={mayWrite}
              chosen={chosen.includes(scenario.id)}
              full={chosen.length >= MOST}
              onChoose={() => toggle(scenario.id)}
            />
          ))}
        </ul>
      )}
      {chosen.length > 0 && (
        <Group className={classes.compare} role="status">
          <span>
            {chosen.length === 1
              ? 'One chosen: compare it with the open field, or choose up to three more.'
              : `${chosen.length} chosen${chosen.length === MOST ? ', the most that fit side by side' : ''}.`}
          </span>
          <Button
            component={Link}
            to={`/fields/${field.id}/compare?ids=${chosen.join(',')}`}
            leftSection={<IconTimeline size={16} stroke={1.6} />}
          >
            Compare
          </Button>
          <Button variant="subtle" onClick={() => setChosen([])}>
            Choose none
          </Button>
        </Group>
      )}
    </Section>
  );
}
