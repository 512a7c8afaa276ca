import { Table } from '@mantine/core';
import { Section } from '../../components/section';
import classes from './knowledge.module.css';
import report from './validation.json';

/** What each group of references is, in plain words. */
const GROUP_WORDS: Record<string, string> = {
  sun: 'Where the sun stands, and when it rises and sets',
  blackbody: 'The glowing body the spectrum starts from',
  'AM1.5': 'The reference spectrum of the solar trade',
  'clear-sky spectra': 'Light through clear air, by band',
  sky: 'Beam, diffuse and tilted planes',
  rows2d: 'Long rows, against an independent computation',
  'raytraced endless': 'Long rows, against two ray tracers',
  'raytraced gaps': 'Rows with gaps, against two ray tracers',
  'raytraced whole days': 'Whole days under rows, against two ray tracers',
  'raytraced finite': 'Short rows and edges, against two ray tracers',
  tracker: 'How trackers turn',
  faiman: 'How warm modules get',
  fao56: 'Water use, against the worked examples of the handbook',
  measured: 'Against instruments in the field',
};

const number = (value: number): string =>
  value !== 0 && (Math.abs(value) < 0.001 || Math.abs(value) >= 10_000)
    ? value.toExponential(1).replace('e', ' × 10^')
    : String(value);

/** Worst error of the engine in each quantity, beside the limit it is held to. */
export function ValidationTable() {
  const groups = [...new Set(report.quantities.map(({ group }) => group))];
  const passed = report.quantities.filter(({ pass }) => pass).length;
  const values = report.quantities.reduce((sum, { n }) => sum + n, 0);
  return (
    <Section
      title="Checked against the world"
      intro={`${passed} of ${report.quantities.length} quantities are within their limits, over ${values.toLocaleString('en-GB')} compared values. The worst error counts, not the mean.`}
    >
      <div className={classes.scroll} tabIndex={0} role="region" aria-label="Validation table">
        {groups.map((group) => {
          const rows = report.quantities.filter((quantity) => quantity.group === group);
          return (
            <Table key={group} className={classes.table}>
              <Table.Caption>
                <strong>{GROUP_WORDS[group] ?? group}</strong>
                <span className={classes.source}>{rows[0].source}</span>
              </Table.Caption>
              <Table.Thead>
                <Table.Tr>
                  <Table.Th scope="col">Quantity</Table.Th>
                  <Table.Th scope="col">Compared</Table.Th>
                  <Table.Th scope="col">Worst error</Table.Th>
                  <Table.Th scope="col">Limit</Table.Th>
                  <Table.Th scope="col">Unit</Table.Th>
                  <Table.Th scope="col">Kept</Table.Th>
                </Table.Tr>
              </Table.Thead>
              <Table.Tbody>
                {rows.map((row) => (
                  <Table.Tr key={row.name}>
                    <Table.Th scope="row">{row.name}</Table.Th>
                    <Table.Td>{row.n}</Table.Td>
                    <Table.Td>{number(row.max)}</Table.Td>
                    <Table.Td>{number(row.limit)}</Table.Td>
                    <Table.Td>{row.unit || 'share'}</Table.Td>
                    <Table.Td>{row.pass ? 'yes' : 'no'}</Table.Td>
                  </Table.Tr>
                ))}
              </Table.Tbody>
            </Table>
          );
        })}
      </div>
    </Section>
  );
}
