import { defineConfig } from 'vitest/config';

// One browser, one server, one spec at a time: the specs share two cores with the product.
export default defineConfig({
  test: {
    root: import.meta.dirname,
    include: ['specs/**/*.spec.ts'],
    fileParallelism: false,
    testTimeout: 180_000,
    hookTimeout: 180_000,
  },
});
