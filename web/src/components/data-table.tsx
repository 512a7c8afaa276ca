import { UnstyledButton, VisuallyHidden } from '@mantine/core';
import { IconArrowDown, IconArrowUp } from '@tabler/icons-react';
import { useMemo, useState, type ReactNode } from 'react';
import classes from './data-table.module.css';

export interface Column<Row> {
  id: string;
  head: string;
  /** The head is spoken, not shown: its cells say what they are. */
  headHidden?: boolean;
  cell: (row: Row) => ReactNode;
  /** What the column sorts by; without it the column does not sort. */
  sortBy?: (row: Row) => string | number;
  numeric?: boolean;
}

interface Props<Row> {
  caption: string;
  rows: readonly Row[];
  columns: readonly Column<Row>[];
  rowKey: (row: Row) => string;
  initialSort: string;
}

/** A table that sorts by its heads and folds into cards on narrow screens. */
export function DataTable<Row>({ caption, rows, columns, rowKey, initialSort }: Props<Row>) {
  const [sort, setSort] = useState({ id: initialSort, down: false });
  const sorted = useMemo(() => {
    const by = columns.find(({ id }) => id === sort.id)?.sortBy;
    if (!by) return rows;
    const order = [...rows].sort((a, b) => {
      const [x, y] = [by(a), by(b)];
      return typeof x === 'string' ? x.localeCompare(String(y)) : x - Number(y);
    });
    return sort.down ? order.reverse() : order;
  }, [rows, columns, sort]);
  const current = columns.find(({ id }) => id === sort.id);

  return (
    <>
      <table className={classes.table}>
        <caption className={classes.caption}>{caption}</caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <th
                key={column.id}
                scope="col"
                data-numeric={column.numeric || undefined}
                aria-sort={
                  column.id !== sort.id ? undefined : sort.down ? 'descending' : 'ascending'
                }
              >
                {column.sortBy ? (
                  <UnstyledButton
                    className={classes.sort}
                    onClick={() =>
                      setSort({ id: column.id, down: column.id === sort.id && !sort.down })
                    }
                  >
                    {column.head}
                    {column.id === sort.id &&
                      (sort.down ? (
                        <IconArrowDown size={14} stroke={1.8} aria-hidden />
                      ) : (
                        <IconArrowUp size={14} stroke={1.8} aria-hidden />
                      ))}
                  </UnstyledButton>
                ) : (
                  <HeadText column={column} />
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {sorted.map((row) => (
            <tr key={rowKey(row)}>
              {columns.map((column) => (
                <td
                  key={column.id}
                  data-head={column.headHidden ? '' : column.head}
                  data-numeric={column.numeric || undefined}
                >
                  {column.cell(row)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <VisuallyHidden role="status">
        {rows.length} rows, sorted by {current?.head} {sort.down ? 'downwards' : 'upwards'}
      </VisuallyHidden>
    </>
  );
}

function HeadText<Row>({ column }: { column: Column<Row> }) {
  return column.headHidden ? <VisuallyHidden>{column.head}</VisuallyHidden> : column.head;
}
