import type { Field } from '@furrowlight/shared/contract/fields';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';

export interface NextStep {
  text: string;
  label: string;
  to: string;
}

/** The one thing that brings this field forward. */
export function nextStep(
  field: Field,
  seasonCount: number,
  scenarios: readonly Scenario[],
): NextStep {
  const here = `/fields/${field.id}`;
  if (!field.boundary) {
    return {
      text: 'Rows are laid inside a boundary, and this field has none yet.',
      label: 'Draw the boundary',
      to: `${here}?edit=boundary`,
    };
  }
  if (seasonCount === 0) {
    return {
      text: 'Light is judged against a crop: say what grows here, from sowing to harvest.',
      label: 'Add a season',
      to: `${here}?season=new`,
    };
  }
  const alive = scenarios.filter((scenario) => !scenario.archived);
  if (alive.length === 0) {
    return {
      text: 'Boundary and crop are recorded. Lay rows over the field and see what light is left.',
      label: 'Lay rows',
      to: `${here}/scenarios/new`,
    };
  }
  const done = alive.filter((scenario) => scenario.latestRun?.status === 'done');
  if (done.length === 0) {
    return {
      text: 'No light budget has been worked out yet. Choose a weather year and run a scenario.',
      label: `Open ${alive[0].name}`,
      to: `${here}/scenarios/${alive[0].id}`,
    };
  }
  if (done.length >= 2) {
    return {
      text: `${done.length} scenarios have a result. Set them beside the open field, season by season.`,
      label: 'Compare them',
      to: `${here}/compare?ids=${done
        .slice(0, 4)
        .map(({ id }) => id)
        .join(',')}`,
    };
  }
  return {
    text: `${done[0].name} has a result. Show it to the farmer with a review link, or lay a second scenario beside it.`,
    label: 'Read the result',
    to: `${here}/scenarios/${done[0].id}/result`,
  };
}
