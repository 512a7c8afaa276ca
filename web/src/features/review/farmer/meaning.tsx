import type { CropBudget } from '@furrowlight/shared/contract/result';
import type { ReviewPage } from '@furrowlight/shared/contract/reviews';
import { bayClearWidthM, passOf, type Implement } from '@furrowlight/shared/layout/machine-passes';
import { formatNumber, percent, withUnit } from '../../../lib/format';
import classes from './farmer.module.css';

/** Sizes on many farms (common practice); the farm's own machines decide. */
const MACHINES: Implement[] = [
  {
    name: 'Tractor, 2.5 m wide, 3 m high',
    workingWidthM: 2.5,
    workingHeightM: 3,
    foldedWidthM: 2.5,
    foldedHeightM: 3,
  },
  {
    name: 'Combine, 6 m header, 4 m high',
    workingWidthM: 6.2,
    workingHeightM: 4,
    foldedWidthM: 3.5,
    foldedHeightM: 4,
  },
  {
    name: 'Sprayer, 18 m boom, 3.6 m high folded',
    workingWidthM: 18,
    workingHeightM: 1.8,
    foldedWidthM: 2.6,
    foldedHeightM: 3.6,
  },
];

const WAYS = { working: 'passes at work', folded: 'passes only folded', blocked: 'does not pass' };

function yieldWords({ yield: range }: CropBudget): string {
  if (range.low === null || range.high === null) return `No figure is given. ${range.basis}`;
  const low = Math.round(range.low * 100);
  const high = Math.round(range.high * 100);
  const span = low === high ? `about ${low} %` : `${low} to ${high} %`;
  return `${span} of the open field's yield, from light alone, where it is cropped. ${range.basis}`;
}

/** What the light means: yield, water, machines, power. */
export function Meaning({ scenario }: { scenario: ReviewPage['scenarios'][number] }) {
  const { layout, result, figures } = scenario;
  return (
    <section className={classes.part} aria-labelledby="meaning-title">
      <h2 id="meaning-title">What it means</h2>
      {result.crops.map((crop) => (
        <div key={crop.seasonId} className={classes.answer}>
          <h3>Yield of {crop.cropName.toLowerCase()}</h3>
          <p>{yieldWords(crop)}</p>
          {crop.et0OpenMm !== null && crop.et0ShadedMm !== null && (
            <p>
              The air asks the crop for about {withUnit(crop.et0ShadedMm, 'mm')} of water in its
              season instead of {withUnit(crop.et0OpenMm, 'mm')} in the open. Modelled.
            </p>
          )}
        </div>
      ))}
      <div className={classes.answer}>
        <h3>Do my machines pass?</h3>
        <p>
          {withUnit(layout.clearHeightM, 'm', 1)} of clear height under the lowest edge,{' '}
          {withUnit(bayClearWidthM(layout), 'm', 1)} between the panels of two rows.
        </p>
        <ul className={classes.machines}>
          {MACHINES.map((machine) => {
            const pass = passOf(layout, machine);
            return (
              <li key={machine.name} data-way={pass.way}>
                <strong>{machine.name}</strong> {WAYS[pass.way]}
                <span className={classes.small}>{pass.reason}</span>
              </li>
            );
          })}
        </ul>
        <p className={classes.small}>
          With 0.5 m of room on each side and above. Your own machines decide: tell your advisor
          their widths and heights.
        </p>
      </div>
      <div className={classes.answer}>
        <h3>Electricity</h3>
        <p>
          {figures
            ? `About ${withUnit((result.energy.kwhPerKwp * figures.kwp) / 1000, 'MWh')} a year from ${withUnit(figures.kwp, 'kWp')}`
            : `About ${withUnit(result.energy.kwhPerKwp, 'kWh')} a year from every kWp`}
          , which takes {formatNumber(result.sunSplit.year.electricity, 1)} of every 100 units of
          sunlight. {percent(result.sunSplit.year.cropPar / 100)} of the sunlight reaches the crop
          as light it can use. Modelled.
        </p>
      </div>
    </section>
  );
}
