// What both commands need of the machine, checked and installed in one place.
import { spawnSync } from 'node:child_process';
import { existsSync, statSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..');
export const CHROMIUM = process.env.CHROMIUM_PATH ?? '/usr/bin/chromium';

function has(command) {
  return spawnSync('sh', ['-c', `command -v ${command}`]).status === 0;
}

/** Stop with one plain sentence per missing tool. */
export function requireTools() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  const missing = [];
  if (major < 20 || (major === 20 && minor < 19)) {
    missing.push(`Node.js 20.19 or newer is needed; this is ${process.versions.node}.`);
  }
  for (const tool of ['python3', 'make', 'g++']) {
    if (!has(tool)) {
      missing.push(
        `${tool} is missing: it compiles the database driver (Debian: apt-get install ${tool}).`,
      );
    }
  }
  if (missing.length > 0) {
    console.error(missing.join('\n'));
    process.exit(1);
  }
}

/** Run a command in the repository; returns its exit status. */
export function run(command, args, options = {}) {
  const result = spawnSync(command, args, { cwd: root, stdio: 'inherit', ...options });
  if (result.error) console.error(`${command}: ${result.error.message}`);
  return result.status ?? 1;
}

/** Run a command and stop with its status if it fails. */
export function must(what, command, args, options) {
  const status = run(command, args, options);
  if (status !== 0) {
    console.error(`${what} failed (exit ${status}).`);
    process.exit(status);
  }
}

/** Install the npm packages the lock file names, unless exactly these are there already. */
export function installPackages() {
  const stamp = path.join(root, 'node_modules/.package-lock.json');
  const lock = path.join(root, 'package-lock.json');
  if (existsSync(stamp) && statSync(stamp).mtimeMs >= statSync(lock).mtimeMs) return;
  must('Installing the packages', 'npm', ['ci', '--no-audit', '--no-fund']);
}

/** Debian's Chromium, for the browser tests. */
export function installChromium() {
  if (existsSync(CHROMIUM)) return;
  const sudo = process.getuid?.() === 0 ? '' : 'sudo ';
  if (!has('apt-get') || (sudo && !has('sudo'))) {
    console.error(`Chromium is missing: install it and set CHROMIUM_PATH (now ${CHROMIUM}).`);
    process.exit(1);
  }
  console.log("Chromium is missing: installing Debian's.");
  const install = `${sudo}apt-get update -q && ${sudo}apt-get install -y -q chromium`;
  must('Installing Chromium', 'sh', ['-c', install], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  });
}
