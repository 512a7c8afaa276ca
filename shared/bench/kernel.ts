/** Two arrays of this many doubles are larger than the caches of common machines (2 x 32 MB). */
const LENGTH = 4_000_000;

/** Passes over the arrays in one measurement. */
const PASSES = 2;

/** Prepare the calibration kernel: multiply-adds and exponentials over arrays beyond the cache. */
export function prepareKernel(): () => number {
  const a = Float64Array.from({ length: LENGTH }, (_, i) => (i % 1000) / 1000);
  const b = new Float64Array(LENGTH);
  return () => {
    for (let pass = 0; pass < PASSES; pass += 1) {
      for (let i = 0; i < LENGTH; i += 1) {
        b[i] = b[i] * 0.5 + a[i] * 1.25 + 0.125;
        b[i] += Math.exp(-a[i]);
      }
    }
    return b[LENGTH - 1];
  };
}
