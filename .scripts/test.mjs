// Everything that must hold, from lint to the browser, and one closing line that counts it.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { installChromium, installPackages, requireTools, root, run } from './machine.mjs';

requireTools();
installPackages();
installChromium();

const scratch = mkdtempSync(path.join(os.tmpdir(), 'furrowlight-test-'));
const totals = { passed: 0, failed: 0, skipped: 0 };
const failures = [];

function step(name, command, args) {
  const began = Date.now();
  console.log(`\n== ${name}`);
  const status = run(command, args);
  const seconds = ((Date.now() - began) / 1000).toFixed(0);
  console.log(`== ${name}: ${status === 0 ? 'passed' : 'FAILED'} (${seconds} s)`);
  return status;
}

/** A check that passes or fails as one. */
function check(name, command, args) {
  if (step(name, command, args) === 0) totals.passed += 1;
  else {
    totals.failed += 1;
    failures.push(name);
  }
}

/** A vitest suite, counted test by test. */
function suite(name, workspace, config) {
  const report = path.join(scratch, `${name.replaceAll(' ', '-')}.json`);
  const args = [
    'vitest',
    'run',
    '--root',
    workspace,
    '--reporter=dot',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ];
  if (config) args.push('--config', config);
  const status = step(name, 'npx', args);
  if (!existsSync(report)) {
    totals.failed += 1;
    failures.push(`${name} (no report)`);
    return;
  }
  const { numPassedTests, numFailedTests, numPendingTests } = JSON.parse(
    readFileSync(report, 'utf8'),
  );
  totals.passed += numPassedTests;
  totals.failed += numFailedTests;
  totals.skipped += numPendingTests;
  if (numFailedTests > 0) failures.push(`${name}: ${numFailedTests} tests`);
  // A suite that could not be loaded fails without a failed test.
  if (status !== 0 && numFailedTests === 0) {
    totals.failed += 1;
    failures.push(name);
  }
}

check('build shared', 'npm', ['run', 'build', '-w', 'shared', '--silent']);
check('lint and format', 'npm', ['run', 'lint', '--silent']);
check('types', 'npm', ['run', 'typecheck', '--silent']);
check('arrows between rooms', 'npm', ['run', 'arrows', '--silent']);
check('unused code and packages', 'npm', ['run', 'unused', '--silent']);
check('build api', 'npm', ['run', 'build', '-w', 'api', '--silent']);
check('build web', 'npm', ['run', 'build', '-w', 'web', '--silent']);
check('bundle sizes', 'node', ['.scripts/bundle-sizes.mjs']);
suite('engine', 'shared');
suite('api', 'api');
suite('web', 'web');
suite('browser', 'web', 'e2e/vitest.config.ts');
check('generated files are current', 'node', ['.scripts/generate.mjs', '--check']);

const reference = path.resolve(
  process.env.FURROWLIGHT_REFERENCE ?? path.join(root, '../shared/reference'),
);
if (existsSync(reference))
  check('validation against reference data', 'npm', [
    'run',
    'validate',
    '--silent',
    '--',
    reference,
  ]);
else
  console.log(
    `\n== validation against reference data: not run, no folder ${path.relative(root, reference)}`,
  );

rmSync(scratch, { recursive: true, force: true });
for (const failure of failures) console.log(`failed: ${failure}`);
console.log(`\n${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
process.exit(totals.failed === 0 ? 0 : 1);
