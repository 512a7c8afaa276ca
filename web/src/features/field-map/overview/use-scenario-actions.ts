import type { Scenario, ScenarioPatch } from '@furrowlight/shared/contract/scenarios';
import { notifications } from '@mantine/notifications';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { showUndo } from '../../../components/undo-notice';
import { newIdempotencyKey } from '../../../lib/api';
import { showRefusal } from '../../../lib/show-refusal';
import { changeScenario, copyScenario } from '../../../queries/scenarios';

/** Copy, rename and archive, each answered by a notice; archiving can be taken back. */
export function useScenarioActions(scenario: Scenario) {
  const client = useQueryClient();
  const change = useMutation(changeScenario(client));
  const duplicate = useMutation(copyScenario(client));
  const { id } = scenario;

  const refused = (error: unknown) => showRefusal('Nothing was changed', error);
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
      showUndo(
        `${scenario.name} is archived.`,
        () => void write({ archived: false }, written.version),
      );
    },
  };
}
