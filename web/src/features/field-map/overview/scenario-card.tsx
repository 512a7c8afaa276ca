import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { ActionIcon, Button, Checkbox, Menu } from '@mantine/core';
import { IconArchive, IconCopy, IconDots, IconPencil, IconRestore } from '@tabler/icons-react';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { LayoutGlyph } from '../../../components/layout-glyph';
import { Term } from '../../../components/term';
import { formatNumber, percent, withUnit } from '../../../lib/format';
import { LAYOUT_KINDS } from '../../../lib/layout-kinds';
import { RenameScenario } from './rename-scenario';
import classes from './scenarios.module.css';
import { useScenarioActions } from './use-scenario-actions';

interface Props {
  scenario: Scenario;
  mayChange: boolean;
  chosen: boolean;
  /** No further scenario fits into the comparison. */
  full: boolean;
  onChoose: () => void;
}

/** One layout on this field: what it is, how far its light budget is, what to do with it. */
export function ScenarioCard({ scenario, mayChange, chosen, full, onChoose }: Props) {
  const [renaming, setRenaming] = useState(false);
  const actions = useScenarioActions(scenario);
  const here = `/fields/${scenario.fieldId}/scenarios/${scenario.id}`;
  const done = scenario.latestRun?.status === 'done';
  const { figures } = scenario;
  return (
    <li
      className={classes.card}
      data-chosen={chosen || undefined}
      data-archived={scenario.archived || undefined}
    >
      <div className={classes.head}>
        <LayoutGlyph kind={scenario.layout.kind} />
        <div>
          <Link to={here} className={classes.name}>
            {scenario.name}
          </Link>
          <span className={classes.kind}>{LAYOUT_KINDS[scenario.layout.kind].name}</span>
        </div>
        {mayChange && (
          <Menu position="bottom-end" shadow="md" width={200}>
            <Menu.Target>
              <ActionIcon variant="subtle" color="ink" aria-label={`More for ${scenario.name}`}>
                <IconDots size={18} stroke={1.6} />
              </ActionIcon>
            </Menu.Target>
            <Menu.Dropdown>
              <Menu.Item
                leftSection={<IconCopy size={16} stroke={1.6} />}
                onClick={() => void actions.copy()}
              >
                Copy
              </Menu.Item>
              <Menu.Item
                leftSection={<IconPencil size={16} stroke={1.6} />}
                onClick={() => setRenaming(true)}
              >
                Rename
              </Menu.Item>
              <Menu.Item
                leftSection={
                  scenario.archived ? (
                    <IconRestore size={16} stroke={1.6} />
                  ) : (
                    <IconArchive size={16} stroke={1.6} />
                  )
                }
                onClick={() => void actions.archive(!scenario.archived)}
              >
                {scenario.archived ? 'Take back from archive' : 'Archive'}
              </Menu.Item>
            </Menu.Dropdown>
          </Menu>
        )}
      </div>
      <dl className={classes.figures}>
        <div>
          <dt>
            <Term of="GCR" />
          </dt>
          <dd>{figures ? formatNumber(figures.groundCoverRatio, 2) : '–'}</dd>
        </div>
        <div>
          <dt>Power</dt>
          <dd>{figures ? withUnit(figures.kwp, 'kWp') : '–'}</dd>
        </div>
        <div>
          <dt>Land lost</dt>
          <dd>{figures ? percent(figures.landLostShare, 1) : '–'}</dd>
        </div>
      </dl>
      <RunState scenario={scenario} />
      <div className={classes.foot}>
        <Checkbox
          label="Compare"
          aria-label={`Compare ${scenario.name}`}
          checked={chosen}
          disabled={!chosen && (full || !done)}
          onChange={onChoose}
        />
        <Button
          component={Link}
          to={done ? `${here}/result` : here}
          size="compact-md"
          variant="default"
        >
          {done ? 'Read the result' : 'Open'}
        </Button>
      </div>
      {renaming && (
        <RenameScenario
          name={scenario.name}
          onClose={() => setRenaming(false)}
          onRename={actions.rename}
        />
      )}
    </li>
  );
}

function RunState({ scenario }: { scenario: Scenario }) {
  const run = scenario.latestRun;
  if (!run) {
    return (
      <div className={classes.run} data-state="none">
        Not worked out yet
      </div>
    );
  }
  const share = Math.round(run.progress * 100);
  const words = {
    queued: 'Waiting for its turn',
    running: `Working out the light, ${share} %`,
    done: 'Light budget worked out',
    failed: run.problem ?? 'The run failed.',
    cancelled: 'The run was stopped',
  }[run.status];
  return (
    <div className={classes.run} data-state={run.status}>
      {words}
      {(run.status === 'running' || run.status === 'queued') && (
        <div
          className={classes.bar}
          role="progressbar"
          aria-valuenow={share}
          aria-valuemin={0}
          aria-valuemax={100}
          aria-label={`Run of ${scenario.name}`}
        >
          <span style={{ width: `${share}%` }} />
        </div>
      )}
    </div>
  );
}
