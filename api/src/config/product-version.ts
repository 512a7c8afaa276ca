import { readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';

const file = path.resolve(import.meta.dirname, '../../package.json');

/** Version of the product, as released. */
export const PRODUCT_VERSION = z
  .object({ version: z.string() })
  .parse(JSON.parse(readFileSync(file, 'utf8'))).version;
