import type { RunResult } from '@furrowlight/shared/contract/result';
import { SegmentedControl } from '@mantine/core';
import { useState } from 'react';
import { LightLines, type LightLine } from '../../charts/light-lines';
import { monthTicks, weekStart } from '../../charts/weave-geometry';
import { usePalette } from '../../map/use-palette';

type Step = 'weeks' | 'months';

/** Daily light over the year: open field, mean, darkest and brightest strip. */
export function LightCourse({ result }: { result: RunResult }) {
  const palette = usePalette();
  const [step, setStep] = useState<Step>('weeks');
  const periods = result.planes[0][step];
  const line = (
    id: string,
    colour: string,
    pick: (period: (typeof periods)[number]) => number,
    dash?: string,
  ): LightLine => ({
    id,
    colour,
    dash,
    points: periods.map((period, x) => ({ x, y: pick(period) })),
  });
  const lines = [
    line('Open field', palette.edge, (period) => period.openDli, '2 4'),
    line('Brightest strip', palette.straw, (period) => period.brightestDli, '9 4'),
    line('Mean', palette.leaf, (period) => period.meanDli),
    line('Darkest strip', palette.dusk, (period) => period.darkestDli, '5 3'),
  ];
  const ticks =
    step === 'weeks'
      ? monthTicks(periods.length).map(({ label, at }) => ({
          label,
          at: Math.round(at * periods.length),
        }))
      : periods.map(({ label }, at) => ({ label: label.slice(0, 3), at }));
  return (
    <>
      <SegmentedControl
        size="xs"
        mb="xs"
        value={step}
        onChange={(value) => setStep(value === 'months' ? 'months' : 'weeks')}
        data={[
          { value: 'weeks', label: 'By week' },
          { value: 'months', label: 'By month' },
        ]}
        aria-label="Step of the line"
      />
      <LightLines
        lines={lines}
        ticks={ticks}
        yLabel="DLI, mol m⁻² d⁻¹"
        label="Daily light over the year for open field, brightest strip, mean and darkest strip; the table holds the numbers."
        nameOf={(x) => (step === 'weeks' ? `Week of ${weekStart(x)}` : (periods[x]?.label ?? ''))}
      />
    </>
  );
}
