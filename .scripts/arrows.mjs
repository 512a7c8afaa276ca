// Which room may import which. The rules are made from the folder listing, so that a new room is
// held to them from its first file.
import { readdirSync } from 'node:fs';
import path from 'node:path';
import { cruise } from 'dependency-cruiser';
import extractTsConfig from 'dependency-cruiser/config-utl/extract-ts-config';
import { root } from './machine.mjs';

process.chdir(root);
const folders = (dir) =>
  readdirSync(path.join(root, dir), { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name);

const forbid = (name, from, to, extra = {}) => ({
  name,
  severity: 'error',
  from: { path: from },
  to: { path: to, ...extra },
});

const rules = [
  {
    name: 'no-circles',
    severity: 'error',
    from: {},
    to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
  },
  forbid('shared stands alone', '^shared/src', '^(api|web)/'),
  forbid('web and api meet only in shared', '^web/', '^api/'),
  forbid('api does not know the web', '^api/', '^web/'),
  forbid(
    'the contract knows only types of the rest',
    '^shared/src/contract',
    '^shared/src/(?!contract)',
    {
      dependencyTypesNot: ['type-only'],
    },
  ),
  forbid(
    'light is below power, crops and run',
    '^shared/src/light',
    '^shared/src/(power|run|rules)/',
  ),
  forbid('angles are the ground floor', '^shared/src/light/angles', '^shared/src/'),
  forbid('nobody but the edges calls the conductor', '^shared/src/(?!run/)', '^shared/src/run/', {
    dependencyTypesNot: ['type-only'],
  }),
  ...folders('web/src/features').map((feature) =>
    forbid(
      `feature ${feature} stands alone`,
      `^web/src/features/${feature}/`,
      `^web/src/features/(?!${feature}/)`,
    ),
  ),
  forbid(
    'components and charts know no feature',
    '^web/src/(components|charts|lib|map|queries)/',
    '^web/src/features/',
  ),
  ...folders('api/src')
    .filter((resource) => !['database', 'cli'].includes(resource))
    .map((resource) =>
      forbid(
        `${resource} keeps off foreign entities`,
        `^api/src/${resource}/`,
        `^api/src/(?!${resource}/|common/|database/)[^/]+/[^/]*\\.entity\\.ts$`,
        { dependencyTypesNot: ['type-only'] },
      ),
    ),
];

const result = await cruise(
  ['shared/src', 'api/src', 'web/src'],
  {
    ruleSet: { forbidden: rules },
    validate: true,
    tsPreCompilationDeps: 'specify',
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)dist/' },
    tsConfig: { fileName: 'web/tsconfig.json' },
    outputType: 'err',
  },
  undefined,
  { tsConfig: extractTsConfig(path.join(root, 'web/tsconfig.json')) },
);
console.log(result.output);
process.exit(result.exitCode);
