import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { GROUPS } from '../../validate/groups.js';

const folder =
  process.env.FURROWLIGHT_REFERENCE ??
  join(import.meta.dirname, '..', '..', '..', '..', 'shared', 'reference');

/** The rows and ray-traced groups have their own test. */
const light = GROUPS.filter(({ files }) => files.every((file) => !/rows2d|raytraced/.test(file)));

describe.each(light)('$name', (group) => {
  const there = group.files.every((file) => existsSync(join(folder, file)));
  it.skipIf(!there)(`keeps its limits (needs the reference folder: ${folder})`, () => {
    const quantities = group.compare(folder);
    expect(quantities.length).toBeGreaterThan(0);
    for (const quantity of quantities) {
      expect(quantity, `${quantity.name}: ${quantity.max} over ${quantity.limit}`).toMatchObject({
        pass: true,
      });
    }
  });
});
