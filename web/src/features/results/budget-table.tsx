import type { PeriodBudget } from '@furrowlight/shared/contract/result';
import { Table } from '@mantine/core';
import type { ReactNode } from 'react';
import { Term } from '../../components/term';
import { formatNumber, percent } from '../../lib/format';
import classes from './results.module.css';

export interface BudgetRow {
  key: string;
  label: ReactNode;
  budget: PeriodBudget;
  /** Marks the row, such as a critical stage. */
  strong?: boolean;
}

/** Light by period: open field, mean, darkest and brightest strip, with shares and evenness. */
export function BudgetTable({ caption, rows }: { caption: string; rows: readonly BudgetRow[] }) {
  return (
    <div className={classes.scroll} tabIndex={0} role="region" aria-label={caption}>
      <Table className={classes.ledger} withRowBorders>
        <Table.Caption>{caption}</Table.Caption>
        <Table.Thead>
          <Table.Tr>
            <Table.Th scope="col">Period</Table.Th>
            <Table.Th scope="col">Open field</Table.Th>
            <Table.Th scope="col">Mean</Table.Th>
            <Table.Th scope="col">Darkest strip</Table.Th>
            <Table.Th scope="col">Brightest strip</Table.Th>
            <Table.Th scope="col">Evenness</Table.Th>
            <Table.Th scope="col">
              <Term of="R:FR" />
            </Table.Th>
          </Table.Tr>
        </Table.Thead>
        <Table.Tbody>
          {rows.map(({ key, label, budget, strong }) => (
            <Table.Tr key={key} data-strong={strong || undefined}>
              <Table.Th scope="row">
                {label}
                <span className={classes.days}>{budget.days} d</span>
              </Table.Th>
              <Table.Td>{formatNumber(budget.openDli, 1)}</Table.Td>
              <Cell dli={budget.meanDli} share={budget.meanShare} />
              <Cell dli={budget.darkestDli} share={budget.darkestShare} />
              <Cell dli={budget.brightestDli} share={budget.brightestShare} />
              <Table.Td>{formatNumber(budget.evenness, 2)}</Table.Td>
              <Table.Td>{formatNumber(budget.redFarRed, 2)}</Table.Td>
            </Table.Tr>
          ))}
        </Table.Tbody>
      </Table>
    </div>
  );
}

function Cell({ dli, share }: { dli: number; share: number }) {
  return (
    <Table.Td>
      {formatNumber(dli, 1)} <span className={classes.share}>{percent(share)}</span>
    </Table.Td>
  );
}
