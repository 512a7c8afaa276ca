// Writes the generated pages; with --check it compares instead and fails on a difference.
// The validation page is made from the reference folder and is left alone where that is absent.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { root } from './machine.mjs';

const checking = process.argv.includes('--check');
const reference = path.resolve(
  process.env.FURROWLIGHT_REFERENCE ?? path.join(root, '../shared/reference'),
);

function output(args) {
  const result = spawnSync('node', args, { cwd: root, encoding: 'utf8', maxBuffer: 64e6 });
  if (!result.stdout) throw new Error(`node ${args.join(' ')} printed nothing: ${result.stderr}`);
  return result.stdout;
}

const generated = [{ file: 'docs/openapi.json', make: () => output(['api/dist/cli/openapi.js']) }];
if (existsSync(reference)) {
  const validate = 'shared/dist-cli/validate/main.js';
  generated.push(
    { file: 'docs/validation.md', make: () => output([validate, reference, '--markdown']) },
    {
      file: 'web/src/features/knowledge/validation.json',
      make: () => output([validate, reference, '--json']),
    },
  );
} else {
  console.log('validation page: no reference folder here, not compared');
}

let stale = 0;
for (const { file, make } of generated) {
  const target = path.join(root, file);
  const fresh = make();
  const current = existsSync(target) ? readFileSync(target, 'utf8') : '';
  if (fresh === current) console.log(`current: ${file}`);
  else if (checking) {
    stale += 1;
    console.log(`stale: ${file} (run npm run generate)`);
  } else {
    writeFileSync(target, fresh);
    console.log(`written: ${file}`);
  }
}
process.exit(stale > 0 ? 1 : 0);
