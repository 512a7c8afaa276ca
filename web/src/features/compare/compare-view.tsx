import { Table } from '@mantine/core';
import { LightLines, type LightLine } from '../../charts/light-lines';
import { Picture } from '../../charts/picture';
import { SunSplitBar } from '../../charts/sun-split-bar';
import { monthTicks, weekStart } from '../../charts/weave-geometry';
import { Section } from '../../components/section';
import { formatNumber, percent } from '../../lib/format';
import { usePalette } from '../../map/use-palette';
import classes from './compare.module.css';
import { light, parameterRows, periodsOf, type Compared, type Measure } from './compared';

interface Props {
  compared: readonly Compared[];
  measure: Measure;
}

const DASHES = [undefined, '8 4', '2 3', '10 3 2 3'];

/** Lines, ledger of differences, sun splits, energy and parameters of the compared layouts. */
export function CompareView({ compared, measure }: Props) {
  return (
    <>
      <Picture
        title="Daily light over the year"
        intro={measure === 'mean' ? 'Mean of the field.' : 'Mean of the darkest tenth.'}
        fileName="compared light"
        table={<Ledger compared={compared} measure={measure} name="Daily light as a table" />}
      >
        <Lines compared={compared} measure={measure} />
      </Picture>
      <Section
        title="Ledger of differences"
        intro="Daily light in mol m⁻² d⁻¹ with its share of open field; under it the difference to the first layout."
      >
        <Ledger compared={compared} measure={measure} />
      </Section>
      <Section title="Sun split" intro="Where 100 units of the year's sunlight go, modelled.">
        <div className={classes.splits}>
          {compared.map(({ scenario, result }) => (
            <div key={scenario.id}>
              <h3 className={classes.name}>{scenario.name}</h3>
              <SunSplitBar split={result.sunSplit.year} />
            </div>
          ))}
        </div>
      </Section>
      <Section title="Layouts and energy" intro="Cells that differ are marked.">
        <Parameters compared={compared} />
      </Section>
    </>
  );
}

function Lines({ compared, measure }: Props) {
  const palette = usePalette();
  const colours = [palette.leaf, palette.dusk, palette.soil, palette.danger];
  const weeks = compared[0].result.planes[0].weeks;
  const lines: LightLine[] = [
    {
      id: 'Open field',
      colour: palette.edge,
      dash: '2 4',
      points: weeks.map(({ openDli }, x) => ({ x, y: openDli })),
    },
    ...compared.map(({ scenario, result }, i) => ({
      id: scenario.name,
      colour: colours[i],
      dash: DASHES[i],
      points: result.planes[0].weeks.map((week, x) => ({ x, y: light(week, measure).dli })),
    })),
  ];
  return (
    <LightLines
      lines={lines}
      ticks={monthTicks(weeks.length).map(({ label, at }) => ({
        label,
        at: Math.round(at * weeks.length),
      }))}
      yLabel="DLI, mol m⁻² d⁻¹"
      label="Daily light over the year for the open field and each layout; the table holds the numbers."
      nameOf={(x) => `Week of ${weekStart(x)}`}
    />
  );
}

function Ledger({ compared, measure, name = 'Differences' }: Props & { name?: string }) {
  return (
    <div className={classes.scroll} tabIndex={0} role="region" aria-label={name}>
      <Table className={classes.ledger}>
        <Table.Caption>
          {measure === 'mean' ? 'Mean of the field' : 'Darkest strip'}, mol m⁻² d⁻¹, modelled.
        </Table.Caption>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Period</Table.Th>
            <Table.Th scope="col">Open field</Table.Th>
            {compared.map(({ scenario }) => (
              <Table.Th scope="col" key={scenario.id}>
                {scenario.name}
              </Table.Th>
            ))}
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {periodsOf(compared).map(({ label, budgets }) => {
            const first = budgets[0];
            const open = budgets.find((budget) => budget)?.openDli;
            return (
              <Table.Tr key={label}>
                <Table.Th scope="row">{label}</Table.Th>
                <Table.Td>{open === undefined ? '–' : formatNumber(open, 1)}</Table.Td>
                {budgets.map((budget, i) => (
                  <Table.Td key={compared[i].scenario.id}>
                    {budget ? (
                      <>
                        {formatNumber(light(budget, measure).dli, 1)}{' '}
                        <span className={classes.share}>
                          {percent(light(budget, measure).share)}
                        </span>
                        {i > 0 && first && (
                          <span className={classes.difference}>
                            {difference(light(budget, measure).dli, light(first, measure).dli)}
                          </span>
                        )}
                      </>
                    ) : (
                      '–'
                    )}
                  </Table.Td>
                ))}
              </Table.Tr>
            );
          })}
        </Table.Tbody>
      </Table>
    </div>
  );
}

const difference = (value: number, first: number): string => {
  const by = value - first;
  return `${by >= 0 ? '+' : ''}${formatNumber(by, 1)}`;
};

function Parameters({ compared }: { compared: readonly Compared[] }) {
  const energy: { label: string; values: string[] }[] = [
    {
      label: 'Energy, kWh per kWp',
      values: compared.map(({ result }) => formatNumber(result.energy.kwhPerKwp)),
    },
    {
      label: 'Energy on this field, MWh a year',
      values: compared.map(({ scenario, result }) =>
        scenario.figures
          ? formatNumber((result.energy.kwhPerKwp * scenario.figures.kwp) / 1000)
          : '–',
      ),
    },
    {
      label: 'Land lost',
      values: compared.map(({ scenario }) =>
        scenario.figures ? percent(scenario.figures.landLostShare, 1) : '–',
      ),
    },
  ];
  const rows = [
    ...parameterRows(compared),
    ...energy.map((row) => ({ ...row, differs: new Set(row.values).size > 1 })),
  ];
  return (
    <div className={classes.scroll} tabIndex={0} role="region" aria-label="Parameters">
      <Table className={classes.ledger}>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Parameter</Table.Th>
            {compared.map(({ scenario }) => (
              <Table.Th scope="col" key={scenario.id}>
                {scenario.name}
              </Table.Th>
            ))}
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {rows.map(({ label, values, differs }) => (
            <Table.Tr key={label} data-differs={differs || undefined}>
              <Table.Th scope="row">{label}</Table.Th>
              {values.map((value, i) => (
                <Table.Td key={compared[i].scenario.id}>{value}</Table.Td>
              ))}
            </Table.Tr>
          ))}
        </Table.Tbody>
      </Table>
    </div>
  );
}
