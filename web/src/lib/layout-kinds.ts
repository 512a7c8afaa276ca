import type { LayoutKind } from '@furrowlight/shared/contract/layout';

/** How the panels stand, in words an advisor uses to a farmer. */
export const LAYOUT_KINDS: Record<LayoutKind, { name: string; short: string }> = {
  'overhead-fixed': { name: 'Overhead, fixed tilt', short: 'Overhead' },
  'between-fixed': { name: 'Between crop strips, fixed tilt', short: 'Between strips' },
  'vertical-bifacial': { name: 'Vertical, two-sided', short: 'Vertical' },
  'single-axis-tracker': { name: 'Single-axis tracker', short: 'Tracker' },
};
