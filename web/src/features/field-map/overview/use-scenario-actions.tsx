import type { Scenario, ScenarioPatch } from '@furrowlight/shared/contract/scenarios';
import { Button, Group } from '@mantine/core';
import { notifications } from '@mantine/notifications';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { ApiProblem, newIdempotencyKey } from '../../../lib/api';
import { changeScenario, copyScenario } from '../../../queries/scenarios';

/** Copy, rename and archive, each answered by a notice; archiving can be taken back. */
export function useScenarioActions(scenario: Scenario) {
  const client = useQueryClient();
  const change = useMutation(changeScenario(client));
  const duplicate = useMutation(copyScenario(client));
  const { id } = scenario;

  const refused = (error: unknown) =>
    notifications.show({
      color: 'danger',
      title: 'Nothing was changed',
      message: error instanceof ApiProblem ? error.detail : 'Something went wrong. Try again.',
    });
  const write = async (patch: ScenarioPatch, version: number): Promise<Scenario | null> => {
    try {
      return await change.mutateAsync({ id, version, patch });
    } catch (error) {
      refused(error);
      return null;
    }
  };

  return {
    copy: async () => {
      try {
        const made = await duplicate.mutateAsync({
          id,
          name: `${scenario.name}, copy`.slice(0, 120),
          idempotencyKey: newIdempotencyKey(),
        });
        notifications.show({ message: `${made.name} is ready to be changed.` });
      } catch (error) {
        refused(error);
      }
    },
    rename: async (name: string) => (await write({ name }, scenario.version)) !== null,
    archive: async (archived: boolean) => {
      const written = await write({ archived }, scenario.version);
      if (!written || !archived) return;
      const notice = notifications.show({
        message: (
          <Group justify="space-between" wrap="nowrap">
            {scenario.name} is archived.
            <Button
              size="compact-sm"
              variant="default"
              onClick={() => {
                notifications.hide(notice);
                void write({ archived: false }, written.version);
              }}
            >
              Undo
            </Button>
          </Group>
        ),
      });
    },
  };
}
