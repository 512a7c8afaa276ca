import type { Energy, RunResult, SunSplit } from '@furrowlight/shared/contract/result';
import { Table } from '@mantine/core';
import { SPLIT_PARTS } from '../../charts/sun-split-bar';
import { weekStart } from '../../charts/weave-geometry';
import { formatNumber, percent } from '../../lib/format';
import classes from './results.module.css';

/** Strips shown in the table of the weave; the CSV holds them all. */
const SHOWN_STRIPS = 10;

/** The weave as numbers: every tenth strip, share of open field by week. */
export function WeaveTable({ result }: { result: RunResult }) {
  const stride = Math.ceil(result.positionsM.length / SHOWN_STRIPS);
  const strips = result.positionsM
    .map((metres, i) => ({ metres, i }))
    .filter(({ i }) => i % stride === 0);
  return (
    <div className={classes.scroll} tabIndex={0} role="region" aria-label="Light weave as a table">
      <Table className={classes.ledger}>
        <Table.Caption>
          Share of open field by week and distance from the row, modelled. The CSV holds every
          strip.
        </Table.Caption>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Week of</Table.Th>
            {strips.map(({ metres, i }) => (
              <Table.Th scope="col" key={i}>
                {formatNumber(metres, 1)} m
              </Table.Th>
            ))}
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {result.planes[0].weekly.map((week, w) => (
            <Table.Tr key={w}>
              <Table.Th scope="row">{weekStart(w)}</Table.Th>
              {strips.map(({ i }) => (
                <Table.Td key={i}>
                  {result.openWeekly[w] > 0 ? percent(week[i] / result.openWeekly[w]) : '–'}
                </Table.Td>
              ))}
            </Table.Tr>
          ))}
        </Table.Tbody>
      </Table>
    </div>
  );
}

export function SplitTable({ split }: { split: RunResult['sunSplit'] }) {
  const rows: SunSplit[] = [...split.months, split.year];
  return (
    <div className={classes.scroll} tabIndex={0} role="region" aria-label="Sun split as a table">
      <Table className={classes.ledger}>
        <Table.Caption>Of 100 units of sunlight on the land, modelled.</Table.Caption>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Period</Table.Th>
            <Table.Th scope="col">Sunlight, MJ m⁻²</Table.Th>
            {SPLIT_PARTS.map(({ key, label }) => (
              <Table.Th scope="col" key={key}>
                {label}
              </Table.Th>
            ))}
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {rows.map((row) => (
            <Table.Tr key={row.label} data-strong={row.label === 'Year' || undefined}>
              <Table.Th scope="row">{row.label}</Table.Th>
              <Table.Td>{formatNumber(row.incomingMjM2)}</Table.Td>
              {SPLIT_PARTS.map(({ key }) => (
                <Table.Td key={key}>{formatNumber(row[key], 1)}</Table.Td>
              ))}
            </Table.Tr>
          ))}
        </Table.Tbody>
      </Table>
    </div>
  );
}

export function EnergyTable({ energy }: { energy: Energy }) {
  return (
    <Table className={classes.ledger}>
      <Table.Caption>AC energy by month, modelled.</Table.Caption>
      <Table.Thead>
        <Table.Tr>
          <Table.Th scope="col">Month</Table.Th>
          <Table.Th scope="col">kWh per kWp</Table.Th>
        </Table.Tr>
      </Table.Thead>
      <Table.Tbody>
        {energy.monthly.map(({ month, kwhPerKwp }) => (
          <Table.Tr key={month}>
            <Table.Th scope="row">{month}</Table.Th>
            <Table.Td>{formatNumber(kwhPerKwp, 1)}</Table.Td>
          </Table.Tr>
        ))}
      </Table.Tbody>
    </Table>
  );
}
