import type { Run } from '@furrowlight/shared/contract/run';
import { Button, Progress } from '@mantine/core';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link } from 'react-router-dom';
import { cancelRun, runQuery } from '../../queries/runs';
import classes from './designer.module.css';

interface Props {
  run: Run;
  /** Address of the result. */
  resultTo: string;
  onCopy: () => void;
  copying: boolean;
}

/** How far the light budget of this scenario is. */
export function RunPanel({ run: first, resultTo, onCopy, copying }: Props) {
  const client = useQueryClient();
  const followed = useQuery({ ...runQuery(first.id), initialData: first });
  const stop = useMutation(cancelRun(client));
  const run = followed.data;
  const { status } = run;

  useEffect(() => {
    if (status === first.status) return;
    void client.invalidateQueries({ queryKey: ['scenarios'] });
    void client.invalidateQueries({ queryKey: ['results', run.scenarioId] });
  }, [client, status, first.status, run.scenarioId]);

  const share = Math.round(run.progress * 100);
  if (status === 'queued' || status === 'running') {
    return (
      <div className={classes.run} role="status">
        <span>
          {status === 'queued' ? 'Waiting for its turn' : `Working out a year of light: ${share} %`}
        </span>
        <Progress value={share} aria-label="Progress of the run" className={classes.progress} />
        <Button
          variant="default"
          size="compact-sm"
          loading={stop.isPending}
          onClick={() => stop.mutate(run.id)}
        >
          Stop
        </Button>
      </div>
    );
  }
  if (status === 'done') {
    return (
      <div className={classes.run} data-state="done" role="status">
        <span>
          The light budget is worked out. Layout and weather are frozen with it; copy the scenario
          to change them.
        </span>
        <Button component={Link} to={resultTo} size="compact-md">
          Read the result
        </Button>
        <Button variant="default" size="compact-md" loading={copying} onClick={onCopy}>
          Copy to change
        </Button>
      </div>
    );
  }
  return (
    <div className={classes.run} data-state="failed" role="alert">
      {status === 'failed'
        ? (run.problem ?? 'The run failed.')
        : 'The run was stopped. Nothing was kept of it.'}
    </div>
  );
}
