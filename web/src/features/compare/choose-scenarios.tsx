import type { Scenario } from '@furrowlight/shared/contract/scenarios';
import { Chip, Group } from '@mantine/core';

interface Props {
  all: readonly Scenario[];
  chosen: readonly string[];
  most: number;
  onChange: (ids: string[]) => void;
}

/** Which scenarios stand side by side; the choice lives in the address. */
export function ChooseScenarios({ all, chosen, most, onChange }: Props) {
  return (
    <Group gap="xs" mb="xl" role="group" aria-label="Scenarios compared">
      {all.map(({ id, name }) => {
        const checked = chosen.includes(id);
        return (
          <Chip
            key={id}
            variant="outline"
            checked={checked}
            disabled={!checked && chosen.length >= most}
            onChange={() =>
              onChange(checked ? chosen.filter((other) => other !== id) : [...chosen, id])
            }
          >
            {name}
          </Chip>
        );
      })}
    </Group>
  );
}
