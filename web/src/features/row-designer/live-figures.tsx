import type { Layout } from '@furrowlight/shared/contract/layout';
import { bayClearWidthM } from '@furrowlight/shared/layout/machine-passes';
import type { LaidRows } from '@furrowlight/shared/layout/rows-over-field';
import { Figure, FigureRow } from '../../components/figure';
import { Term } from '../../components/term';
import { formatNumber } from '../../lib/format';

/** What stands on the field with the present rows. */
export function LiveFigures({ layout, laid }: { layout: Layout; laid: LaidRows | null }) {
  const gcr = layout.collectorWidthM / layout.pitchM;
  const f = laid?.figures;
  return (
    <FigureRow>
      <Figure label={<Term of="GCR" />} value={formatNumber(gcr, 2)} />
      <Figure
        label="Clear bay"
        value={formatNumber(bayClearWidthM(layout), 1)}
        unit="m"
        note="between panels"
      />
      {f && (
        <>
          <Figure label="Power" value={formatNumber(f.kwp)} unit="kWp" />
          <Figure
            label="Rows"
            value={formatNumber(f.rowCount)}
            note={`${formatNumber(f.posts)} posts`}
          />
          <Figure
            label="Land lost"
            value={formatNumber(f.landLostShare * 100, 1)}
            unit="%"
            note="uncropped strips"
          />
        </>
      )}
    </FigureRow>
  );
}
