// JavaScript a first visit downloads, against the budgets of the product (kB gzip). A page's root
// is counted with everything it imports at once; what comes later on demand is not.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { gzipSync } from 'node:zlib';
import { root } from './machine.mjs';

const dist = path.join(root, 'web/dist');
const manifest = JSON.parse(readFileSync(path.join(dist, '.vite/manifest.json'), 'utf8'));
const BUDGETS = [
  { roots: ['index.html', 'src/app-root.tsx'], what: 'app shell', limitKb: 350 },
  { roots: ['index.html', 'src/review-root.tsx'], what: "farmer's page", limitKb: 200 },
];

/** Files a manifest entry needs before it can run. */
function filesOf(key, seen = new Set()) {
  const entry = manifest[key];
  if (!entry) throw new Error(`${key} is not in the build's manifest.`);
  if (seen.has(key)) return [];
  seen.add(key);
  return [entry.file, ...(entry.imports ?? []).flatMap((next) => filesOf(next, seen))];
}

let failed = false;
for (const { roots, what, limitKb } of BUDGETS) {
  const files = new Set(
    roots.flatMap((key) => filesOf(key)).filter((file) => file.endsWith('.js')),
  );
  const bytes = [...files].reduce(
    (sum, file) => sum + gzipSync(readFileSync(path.join(dist, file))).length,
    0,
  );
  const kb = bytes / 1000;
  const ok = kb <= limitKb;
  failed ||= !ok;
  console.log(
    `${ok ? 'ok  ' : 'OVER'} ${what}: ${kb.toFixed(0)} kB gzip of ${limitKb} (${files.size} files)`,
  );
}
process.exit(failed ? 1 : 0);
