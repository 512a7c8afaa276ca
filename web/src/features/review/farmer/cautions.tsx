import type { Layout } from '@furrowlight/shared/contract/layout';
import { cautionsFor } from '@furrowlight/shared/rules/cautions';
import classes from './farmer.module.css';

/** What must always be said. Irrigation and livestock are named, for nobody has said there are none. */
export function Cautions({ layout, slopePercent }: { layout: Layout; slopePercent: number }) {
  const cautions = cautionsFor({ layout, slopePercent, irrigated: true, livestock: true });
  return (
    <section className={classes.part} aria-labelledby="cautions-title">
      <h2 id="cautions-title">What must be said</h2>
      <dl className={classes.cautions}>
        {cautions.map(({ key, title, text }) => (
          <div key={key}>
            <dt>{title}</dt>
            <dd>{text}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
