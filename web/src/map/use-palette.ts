import { useComputedColorScheme } from '@mantine/core';
import { dark, light, type Palette } from '../app/theme/palette';

/** The colours of the current theme as plain values, for canvases that know no CSS variables. */
export function usePalette(): Palette {
  return useComputedColorScheme('light') === 'dark' ? dark : light;
}
