// Developers' loop: shared and api rebuilt on change, the API restarted, Vite in front.
import { spawn } from 'node:child_process';
import { installPackages, must, requireTools, root } from './machine.mjs';

requireTools();
installPackages();
must('Building shared', 'npm', ['run', 'build', '-w', 'shared', '--silent']);
must('Building the API', 'npm', ['run', 'build', '-w', 'api', '--silent']);

const children = [
  ['npx', ['tsc', '-p', 'shared/tsconfig.build.json', '--watch', '--preserveWatchOutput']],
  ['npx', ['tsc', '-p', 'api/tsconfig.build.json', '--watch', '--preserveWatchOutput']],
  ['node', ['--watch-path=api/dist', '--watch-path=shared/dist', 'api/dist/main.js']],
  ['npm', ['run', 'dev', '-w', 'web']],
].map(([command, args]) => spawn(command, args, { cwd: root, stdio: 'inherit' }));

for (const child of children) {
  child.on('exit', (code) => {
    for (const other of children) other.kill();
    process.exit(code ?? 1);
  });
}
