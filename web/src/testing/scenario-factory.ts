import type { Layout } from '@furrowlight/shared/contract/layout';
import type { RunStatus } from '@furrowlight/shared/contract/run';
import type { Scenario } from '@furrowlight/shared/contract/scenarios';

export function aLayout(change: Partial<Layout> = {}): Layout {
  return {
    kind: 'overhead-fixed',
    pitchM: 9,
    collectorWidthM: 3.2,
    tiltDeg: 20,
    azimuthDeg: 180,
    clearHeightM: 5,
    headlandM: 12,
    sideMarginM: 4,
    stripWidthM: 0.6,
    offsetM: 0,
    postSpacingM: 8,
    structureShade: 0.03,
    module: {
      powerWm2: 210,
      lengthM: 2.2,
      transmittance: 0,
      frontReflectance: 0.05,
      rearReflectance: 0.1,
      bifaciality: 0.7,
      temperaturePercentPerK: -0.35,
    },
    gaps: null,
    tracker: null,
    dcAcRatio: 1.2,
    lossesPercent: 10,
    ...change,
  };
}

/** A scenario whose latest run has this status; null for one never run. */
export function aScenario(change: Partial<Scenario>, status: RunStatus | null): Scenario {
  const id = change.id ?? 'scenario-1';
  const at = '2026-11-20T10:00:00.000Z';
  return {
    id,
    version: 1,
    fieldId: 'field-0001',
    name: 'South rows',
    notes: '',
    weatherId: null,
    weatherName: null,
    layout: aLayout(),
    archived: false,
    figures: null,
    frozen: null,
    inputHash: null,
    modelVersion: null,
    latestRun: status && {
      id: 'run-000001',
      scenarioId: id,
      status,
      progress: status === 'done' ? 1 : 0.4,
      problem: null,
      modelVersion: '0.1.0',
      inputHash: 'hash',
      createdAt: at,
      startedAt: at,
      finishedAt: status === 'done' ? at : null,
    },
    createdAt: at,
    updatedAt: at,
    ...change,
  };
}
