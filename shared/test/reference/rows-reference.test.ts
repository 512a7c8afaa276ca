import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { raytracedDays } from '../../validate/groups/raytraced-days.js';
import { raytracedEndless } from '../../validate/groups/raytraced-endless.js';
import { raytracedFinite } from '../../validate/groups/raytraced-finite.js';
import { raytracedGaps } from '../../validate/groups/raytraced-gaps.js';
import { rows2d } from '../../validate/groups/rows2d.js';

const folder =
  process.env.FURROWLIGHT_REFERENCE ??
  join(import.meta.dirname, '..', '..', '..', '..', 'shared', 'reference');

describe.each([rows2d, raytracedEndless, raytracedGaps, raytracedFinite, raytracedDays])(
  '$name',
  (group) => {
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
  },
);
