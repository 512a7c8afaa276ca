// JavaScript a first visit downloads, against the budgets of the product (kB gzip).
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { root } from './machine.mjs';

const dist = path.join(root, 'web/dist');
const BUDGETS = [
  { page: 'index.html', what: 'app shell', limitKb: 350 },
  { page: 'review.html', what: "farmer's page", limitKb: 200 },
];

let failed = false;
for (const { page, what, limitKb } of BUDGETS) {
  const html = readFileSync(path.join(dist, page), 'utf8');
  const scripts = [...html.matchAll(/(?:src|href)="([^"]+\.js)"/g)].map((match) => match[1]);
  const bytes = scripts.reduce(
    (sum, script) => sum + gzipSync(readFileSync(path.join(dist, script))).length,
    0,
  );
  const kb = bytes / 1000;
  const ok = scripts.length > 0 && kb <= limitKb;
  failed ||= !ok;
  console.log(`${ok ? 'ok  ' : 'OVER'} ${what}: ${kb.toFixed(0)} kB gzip of ${limitKb} (${scripts.length} files)`);
}
process.exit(failed ? 1 : 0);
