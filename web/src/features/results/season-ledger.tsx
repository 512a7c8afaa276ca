import type { Plane, RunResult } from '@furrowlight/shared/contract/result';
import { BudgetTable, type BudgetRow } from './budget-table';

function cropRows(result: RunResult): BudgetRow[] {
  return result.crops.flatMap((crop) => [
    {
      key: crop.seasonId,
      label: `${crop.cropName}, whole season`,
      budget: crop.season,
      strong: true,
    },
    ...crop.stages.map((stage, i) => ({
      key: `${crop.seasonId}-${i}`,
      label: `${stage.critical ? '◆ ' : ''}${stage.budget.label}`,
      budget: stage.budget,
    })),
  ]);
}

function seasonRows(plane: Plane): BudgetRow[] {
  return [...plane.seasons, plane.year].map((budget) => ({
    key: budget.label,
    label: budget.label,
    budget,
    strong: budget.label === 'Year',
  }));
}

/** The ledger: light by crop and stage, and by season of the year. */
export function SeasonLedger({ result }: { result: RunResult }) {
  return (
    <>
      {result.crops.length > 0 && (
        <BudgetTable
          caption="By crop and stage, mol m⁻² d⁻¹ at canopy top, modelled. ◆ marks the stage in which light decides most."
          rows={cropRows(result)}
        />
      )}
      <BudgetTable
        caption={`By season, mol m⁻² d⁻¹ at ${result.planes[0].heightM.toFixed(1)} m above ground, modelled.`}
        rows={seasonRows(result.planes[0])}
      />
    </>
  );
}
