import { readFileSync } from 'node:fs';

/** One line of a reference table by column name. */
export type TableRow = Record<string, string>;

/** Cells of one line; a cell in double quotes may hold the separator. */
function cellsOf(line: string): string[] {
  return [...line.matchAll(/(?:^|,)(?:"([^"]*)"|([^,]*))/g)].map(
    ([, quoted, plain]) => quoted ?? plain,
  );
}

/**
 * Read a reference CSV: `#` lines are notes, the first other line names the columns.
 *
 * @throws SyntaxError when a line has another number of cells than the header
 */
export function readTable(path: string): TableRow[] {
  const lines = readFileSync(path, 'utf8')
    .split(/\r?\n/)
    .filter((line) => line !== '' && !line.startsWith('#'));
  const names = cellsOf(lines[0] ?? '');
  return lines.slice(1).map((line, i) => {
    const cells = cellsOf(line);
    if (cells.length !== names.length) {
      throw new SyntaxError(`${path}: row ${i + 1} has ${cells.length} cells, not ${names.length}`);
    }
    return Object.fromEntries(names.map((name, at) => [name, cells[at]]));
  });
}

/** @throws SyntaxError naming the column when the cell is not a number */
export function numberOf(row: TableRow, name: string): number {
  const text = row[name];
  const value = Number(text);
  if (text === undefined || text.trim() === '' || !Number.isFinite(value)) {
    throw new SyntaxError(`${name} is not a number: "${text ?? ''}"`);
  }
  return value;
}
