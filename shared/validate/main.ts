// Compare the engine with a folder of reference numbers. The functions called are the product's own.
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import { GROUPS } from './groups.js';
import type { Group, Quantity } from './quantity.js';

interface Report {
  quantities: (Quantity & { source: string })[];
  unreadable: { group: string; problem: string }[];
  notRead: string[];
}

function filesBelow(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    return entry.isDirectory() ? filesBelow(path) : [path];
  });
}

function compareAll(folder: string): Report {
  const report: Report = { quantities: [], unreadable: [], notRead: [] };
  const read = new Set<string>();
  for (const group of GROUPS) {
    if (!group.files.every((file) => existsSync(join(folder, file)))) continue;
    group.files.forEach((file) => read.add(file));
    readGroup(group, folder, report);
  }
  const all = filesBelow(folder).map((path) => relative(folder, path));
  report.notRead = all.filter((file) => !read.has(file) && !/README|^measured\//.test(file));
  return report;
}

function readGroup(group: Group, folder: string, report: Report): void {
  try {
    for (const quantity of group.compare(folder)) {
      report.quantities.push({ ...quantity, source: group.source });
    }
  } catch (error) {
    const problem = error instanceof Error ? error.message : String(error);
    report.unreadable.push({ group: group.name, problem });
  }
}

/** Two significant digits, so that a page of errors reads at a glance. */
const short = (value: number): string => (value === 0 ? '0' : value.toPrecision(2));

function printLines(report: Report): void {
  for (const q of report.quantities) {
    const name = `${q.group}: ${q.name}`.padEnd(66);
    const errors = `n ${q.n}  max ${short(q.max)}  p95 ${short(q.p95)}  rms ${short(q.rms)} ${q.unit}`;
    console.log(`${q.pass ? 'PASS' : 'FAIL'}  ${name}  ${errors}  limit ${q.limit}`);
  }
  for (const { group, problem } of report.unreadable) console.log(`FAIL  ${group}: ${problem}`);
  for (const file of report.notRead) console.log(`not read: ${file}`);
}

function printMarkdown(report: Report): void {
  console.log('# Validation');
  console.log('');
  console.log('Made by `npm run generate`; do not edit. Worst error of each quantity against');
  console.log(
    'published or independently computed references, through the functions the product runs.',
  );
  console.log('');
  console.log('| group | quantity | n | worst | 95 % | rms | unit | limit | |');
  console.log('| --- | --- | --- | --- | --- | --- | --- | --- | --- |');
  for (const q of report.quantities) {
    const cells = [q.group, q.name, q.n, short(q.max), short(q.p95), short(q.rms), q.unit, q.limit];
    console.log(`| ${cells.join(' | ')} | ${q.pass ? 'pass' : 'FAIL'} |`);
  }
  console.log('');
  console.log('Sources:');
  console.log('');
  for (const group of GROUPS) console.log(`- ${group.name}: ${group.source}`);
  console.log('');
}

const args = process.argv.slice(2);
const folder = resolve(args.find((arg) => !arg.startsWith('--')) ?? '');
if (!existsSync(folder) || !statSync(folder).isDirectory()) {
  console.error(`No folder ${folder}: give one laid out like the reference data.`);
  process.exit(1);
}
const report = compareAll(folder);
if (args.includes('--json')) {
  const quantities = report.quantities.map((q) => ({
    ...q,
    max: Number(short(q.max)),
    p95: Number(short(q.p95)),
    rms: Number(short(q.rms)),
  }));
  console.log(JSON.stringify({ ...report, quantities }, null, 2));
} else if (args.includes('--markdown')) printMarkdown(report);
else printLines(report);
const failed = report.quantities.some(({ pass }) => !pass) || report.unreadable.length > 0;
if (report.quantities.length === 0) console.error('Nothing was read.');
process.exit(failed || report.quantities.length === 0 ? 1 : 0);
